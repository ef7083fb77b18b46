import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.js';
import { aRecord, aSheet, daysFromStart } from '../sample-record.js';
import { type History, type Series } from '../series.js';
import { prepare } from './prepare.js';
import { steadyWindows } from './steady-windows.js';

function windowsOf(history: History, days = 6, sheet = aSheet()) {
  const prepared = prepare(history, sheet, daysFromStart(days), defaultLimits);
  if ('judged' in prepared) throw new Error(prepared.reason);
  return steadyWindows(prepared, sheet, defaultLimits);
}

const designCases = [
  { name: 'minimum', flow: 5, upstreamPressure: 1_000, downstreamPressure: 590 },
  { name: 'maximum', flow: 80, upstreamPressure: 1_000, downstreamPressure: 620 },
];

describe('steady windows', () => {
  it('carry the flow coefficient of the valve within the noise', () => {
    const windows = windowsOf(aRecord());
    expect(windows.source).toBe('measured');
    expect(windows.count).toBeGreaterThan(1_000);
    for (let i = 0; i < windows.count; i++) {
      const truth = 50 * 40 ** ((windows.h[i] as number) - 1);
      expect(windows.coefficient[i]).toBeGreaterThan(0.98 * truth);
      expect(windows.coefficient[i]).toBeLessThan(1.02 * truth);
    }
  });

  it('leave out those in which the valve moved', () => {
    const windows = windowsOf(aRecord({ hold: 700 }));
    expect(windows.leftOut['not steady']).toBeGreaterThan(300);
  });

  it('are 300 s at 30 s, 60 s where 300 s give too few, and follow a fast or slow scan', () => {
    expect(windowsOf(aRecord()).seconds).toBe(300);
    expect(windowsOf(aRecord({ scan: 1, days: 0.05, hold: 200 }), 1).seconds).toBe(60);
    expect(windowsOf(aRecord({ scan: 1, days: 0.012, hold: 40 }), 1).seconds).toBe(6);
    expect(windowsOf(aRecord({ scan: 180, days: 2, hold: 7_200 }), 2).seconds).toBe(540);
    expect(windowsOf(aRecord({ scan: 180, days: 2, hold: 360 }), 2).seconds).toBe(180);
  });

  it('fall back on the line model of the sheet without pressures', () => {
    const { position, flow } = aRecord();
    const windows = windowsOf({ position, flow }, 6, aSheet({ designCases }));
    expect(windows.source).toBe('modelled');
    expect(windows.line).not.toBeNull();
    const i = windows.coefficient.findIndex((C) => C > 0);
    expect(windows.coefficient[i]).toBeCloseTo(50 * 40 ** ((windows.h[i] as number) - 1), 0);
  });

  it('model the missing end where one pressure is measured', () => {
    const { position, flow, upstreamPressure } = aRecord();
    const windows = windowsOf({ position, flow, upstreamPressure }, 6, aSheet({ designCases }));
    expect(windows.source).toBe('modelled');
    expect(windows.upstreamPressure[10]).toBeCloseTo(1_000, -2);
  });

  it('know the flow alone without pressures and design cases', () => {
    const { position, flow } = aRecord();
    const windows = windowsOf({ position, flow });
    expect(windows.source).toBe('none');
    expect(windows.coefficient[0]).toBeNaN();
    expect(windows.L[0]).toBeCloseTo(Math.log(windows.flow[0] as number), 12);
  });

  it('know the flow alone where the sheet lacks the fluid', () => {
    expect(windowsOf(aRecord(), 6, aSheet({ fluid: null })).source).toBe('none');
  });

  it('do not exist without a flow', () => {
    const { position } = aRecord();
    expect(windowsOf({ position }).count).toBe(0);
  });

  it('keep choked windows apart', () => {
    const record = aRecord();
    const downstream = record.downstreamPressure as Series;
    const low = { ...downstream, value: downstream.value.map((p) => p - 550) };
    const windows = windowsOf({ ...record, downstreamPressure: low }, 6, aSheet({ FL: 0.7 }));
    expect(windows.choked.reduce((a, b) => a + b, 0)).toBe(windows.count);
  });

  it('use pressures recorded for part of the time, unless that part is next to nothing', () => {
    const record = aRecord();
    const upstream = record.upstreamPressure as Series;
    const first = (samples: number) => ({
      time: upstream.time.slice(0, samples),
      value: upstream.value.slice(0, samples),
      good: upstream.good.slice(0, samples),
    });
    expect(windowsOf({ ...record, upstreamPressure: first(6_000) }).source).toBe('measured');
    expect(windowsOf({ ...record, upstreamPressure: first(60) }).source).toBe('none');
  });
});
