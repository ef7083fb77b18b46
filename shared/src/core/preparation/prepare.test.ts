import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.js';
import { aRecord, aSeries, aSheet, aStart, daysFromStart } from '../sample-record.js';
import { type History, type Series } from '../series.js';
import { prepare } from './prepare.js';
import { type Prepared, valveState } from './prepared.js';

function prepared(history: History, days = 6, sheet = aSheet()): Prepared {
  const result = prepare(history, sheet, daysFromStart(days), defaultLimits);
  if ('judged' in result) throw new Error(result.reason);
  return result;
}

/** A copy of a series with some samples changed. */
function changed(series: Series | undefined, change: (i: number, value: number) => number): Series {
  if (series === undefined) throw new Error('no series');
  return { ...series, value: series.value.map((v, i) => change(i, v)) };
}

describe('prepare', () => {
  it('refuses a record without samples, and one without travel', () => {
    const none = prepare({}, aSheet(), daysFromStart(1), defaultLimits);
    expect(none).toMatchObject({ judged: false, reason: 'no-samples' });
    const { flow } = aRecord();
    const noTravel = prepare({ flow }, aSheet(), daysFromStart(6), defaultLimits);
    expect(noTravel).toMatchObject({ reason: 'no-travel-signal' });
  });

  it('takes only samples inside the window, its end excluded', () => {
    const inside = prepared(aRecord({ days: 6 }), 2);
    expect(inside.samplesSeen).toBe(5 * 2 * 2_880);
    expect(inside.start + (inside.count - 1) * inside.step).toBeLessThan(aStart + 2 * 86_400);
  });

  it('lets demand stand in where position is not recorded, and says so', () => {
    const { demand, flow } = aRecord();
    expect(prepared({ demand, flow }).travelSource).toBe('demand');
  });

  it('falls back on demand where the position is bad for more than a fifth of the time', () => {
    const record = aRecord();
    const position = record.position as Series;
    const good = position.good.map((g, i) => (i % 3 === 0 ? 0 : g));
    const result = prepared({ ...record, position: { ...position, good } });
    expect(result.travelSource).toBe('demand');
    expect(result.warnings.map((w) => w.code)).toContain('position-quality');
  });

  it('refuses on quality where no travel is good enough', () => {
    const { position, flow } = aRecord();
    const good = (position as Series).good.map(() => 0);
    const result = prepare(
      { position: { ...(position as Series), good }, flow: flow },
      aSheet(),
      daysFromStart(6),
      defaultLimits,
    );
    expect(result).toMatchObject({ judged: false, reason: 'signal-quality' });
  });

  it('counts each sample it leaves out by its reason', () => {
    const record = aRecord();
    const flow = changed(record.flow, (i, v) => (i === 100 ? 999 : i === 200 ? NaN : v));
    const position = changed(record.position, (i, v) => (i === 300 ? 150 : v));
    const result = prepared({ ...record, flow, position });
    expect(result.leftOut).toMatchObject({ bad: 1, 'out of range': 2 });
    expect(result.samplesUsed + (result.leftOut.outlier ?? 0)).toBe(result.samplesSeen - 3);
  });

  it('takes a spike of the flow out and joins its neighbours', () => {
    const record = aRecord({ noise: 0.001 });
    const spiked = changed(record.flow, (i, v) => (i % 2_000 === 1_000 ? 1.5 * v : v));
    const result = prepared({ ...record, flow: spiked });
    const plain = prepared(record);
    expect(result.leftOut.outlier).toBeGreaterThanOrEqual(8);
    expect(result.flow?.[1_000]).toBeCloseTo(plain.flow?.[1_000] as number, 0);
  });

  it('gives the same grid whatever the order samples were handed over in', () => {
    const record = aRecord({ days: 1 });
    const { time, value, good } = record.flow as Series;
    const backwards = {
      time: time.slice().reverse(),
      value: value.slice().reverse(),
      good: good.slice().reverse(),
    };
    const one = prepared(record, 1);
    const other = prepared({ ...record, flow: backwards }, 1);
    expect(other.flow).toEqual(one.flow);
    expect(other.warnings.map((w) => w.code)).toContain('backward-times');
  });

  it('keeps the last received of samples with one time, unless that one is bad', () => {
    const time = [aStart, aStart + 60, aStart + 60, aStart + 120, aStart + 120, aStart + 180];
    const position = aSeries(time, [10, 20, 30, 40, 50, 60], [1, 1, 1, 1, 0, 1]);
    const result = prepared({ position }, 1);
    expect([...result.travel.slice(0, 4)]).toEqual([10, 30, 40, 60]);
    expect(result.leftOut.duplicate).toBe(2);
  });

  it('runs its grid at the pace of the signals, not at a fixed one', () => {
    expect(prepared(aRecord({ scan: 1, days: 0.02 }), 1).step).toBe(1);
    expect(prepared(aRecord({ scan: 180, days: 2 }), 2).step).toBe(180);
  });

  it('finds the scan behind a compressed archive', () => {
    const full = aRecord({ days: 3, scan: 10 });
    const position = full.position as Series;
    const keep = position.value.map((v, i) =>
      i === 0 || Math.abs(v - (position.value[i - 1] ?? v)) > 0.06 ? 1 : 0,
    );
    const kept = [...keep.keys()].filter((i) => keep[i] === 1);
    const compressed = aSeries(
      kept.map((i) => position.time[i] as number),
      kept.map((i) => position.value[i] as number),
    );
    expect(prepared({ position: compressed }, 3).step).toBe(10);
  });

  it('warns and cuts where the downstream pressure stands above the upstream one', () => {
    const record = aRecord();
    const downstreamPressure = changed(record.downstreamPressure, (i, v) =>
      i >= 1_000 && i < 2_000 ? v + 900 : v,
    );
    const result = prepared({ ...record, downstreamPressure });
    expect(result.upstreamPressure?.[1_500]).toBeNaN();
    expect(result.leftOut['pressures crossed']).toBeGreaterThanOrEqual(1_000);
    expect(result.warnings.map((w) => w.code)).toContain('pressures-crossed');
  });
});

describe('what is rebuilt between samples', () => {
  const hours = (...at: number[]) => at.map((h) => aStart + 3_600 * h);
  const minutes = Array.from({ length: 240 }, (_, i) => aStart + 60 * i);
  const everyMinute = aSeries(
    minutes,
    minutes.map((_, i) => 40 + (i % 3)),
  );

  it('is a straight line over a short silence', () => {
    const position = aSeries(hours(0, 1, 2), [10, 20, 40]);
    const result = prepared({ position, demand: everyMinute }, 1);
    const half = Math.round(1_800 / result.step);
    expect(result.travel[half]).toBeCloseTo(15, 6);
  });

  it('is nothing over a long gap across which the value changed', () => {
    const time = Array.from({ length: 200 }, (_, i) => aStart + (i < 100 ? i * 60 : 40_000 + i * 60));
    const value = time.map((_, i) => (i < 100 ? 40 : 60) + (i % 2) * 0.1);
    const result = prepared({ position: aSeries(time, value) }, 1);
    expect(result.travel[Math.round(20_000 / result.step)]).toBeNaN();
  });

  it('bridges a long silence of a value that did not change', () => {
    const time = Array.from({ length: 200 }, (_, i) => aStart + (i < 100 ? i * 60 : 40_000 + i * 60));
    const value = time.map((_, i) => 40 + (i % 2) * 0.1);
    const result = prepared({ position: aSeries(time, value) }, 1);
    expect(result.travel[Math.round(20_000 / result.step)]).toBeCloseTo(40, 0);
  });

  it('is nothing from a bad value to the next good one', () => {
    const time = Array.from({ length: 100 }, (_, i) => aStart + i * 60);
    const good = time.map((_, i) => (i === 50 ? 0 : 1));
    const result = prepared(
      {
        position: aSeries(
          time,
          time.map((_, i) => i),
          good,
        ),
      },
      1,
    );
    expect(result.travel[49]).toBe(49);
    expect(result.travel[50]).toBeNaN();
    expect(result.travel[51]).toBe(51);
  });

  it('holds a set point until the next one', () => {
    const position = aSeries(hours(0, 1, 2, 3), [10, 20, 30, 40]);
    const setPoint = aSeries(hours(0, 2), [5, 9]);
    const result = prepared({ position, demand: everyMinute, setPoint }, 1);
    const at = (h: number) => result.setPoint?.[Math.round((3_600 * h) / result.step)];
    expect([at(0.5), at(1.9), at(2.5)]).toEqual([5, 5, 9]);
  });
});

describe('state of the valve', () => {
  it('is shut at no demand and no travel, and settling for the first minutes of it', () => {
    const time = Array.from({ length: 2_000 }, (_, i) => aStart + i * 60);
    const travel = time.map((_, i) => (i < 500 || i >= 1_000 ? 50 + (i % 7) * 0.1 : 0));
    const flow = travel.map((x, i) => (x > 0 ? 40 + (i % 5) : 0));
    const result = prepared(
      { position: aSeries(time, travel), demand: aSeries(time, travel), flow: aSeries(time, flow) },
      2,
    );
    const at = (i: number) => result.state[i] as number;
    expect(at(100)).toBe(valveState.inService);
    expect(at(502)).toBe(valveState.shut | valveState.settling);
    expect(at(700)).toBe(valveState.shut);
    expect(at(1_010)).toBe(valveState.inService | valveState.settling);
    expect(at(1_500)).toBe(valveState.inService);
  });

  it('is manual where the mode says so', () => {
    const record = aRecord({ days: 1 });
    const { time } = record.position as Series;
    const mode = aSeries([time[0] as number, time[1_000] as number], [1, 0]);
    const result = prepared({ ...record, mode }, 1);
    expect((result.state[500] as number) & valveState.manual).toBe(0);
    expect((result.state[1_500] as number) & valveState.manual).toBe(valveState.manual);
  });
});

describe('frozen signals', () => {
  it('are found, cut out, and leave the valve out of service for the fit', () => {
    const record = aRecord();
    const from = 5_000;
    const flow = changed(record.flow, (i, v) => (i >= from && i < from + 2_880 ? 33.3 : v));
    const result = prepared({ ...record, flow });
    expect(result.frozen).toHaveLength(1);
    expect(result.frozen[0]).toMatchObject({ role: 'flow', from: aStart + from * 30 });
    expect(result.flow?.[from + 100]).toBeNaN();
    expect((result.state[from + 100] as number) & valveState.inService).toBe(0);
  });

  it('are an outage, not a finding, where more than half of the signals stop together', () => {
    const record = aRecord();
    const stop = (series: Series | undefined) =>
      changed(series, (i, v) => (i >= 5_000 && i < 7_000 ? 40 : v));
    const result = prepared({
      ...record,
      flow: stop(record.flow),
      position: stop(record.position),
      upstreamPressure: stop(record.upstreamPressure),
      downstreamPressure: changed(record.downstreamPressure, (i, v) => (i >= 5_000 && i < 7_000 ? 30 : v)),
    });
    expect(result.frozen).toEqual([]);
    expect((result.state[6_000] as number) & valveState.outage).toBe(valveState.outage);
  });

  it('do not include a flow at zero while the valve is shut', () => {
    const record = aRecord();
    const shut = (i: number) => i >= 5_000 && i < 7_000;
    const result = prepared({
      ...record,
      demand: changed(record.demand, (i, v) => (shut(i) ? (i % 900) / 400 - 1 : v)),
      position: changed(record.position, (i, v) => (shut(i) ? 0.02 * (i % 3) : v)),
      flow: changed(record.flow, (i, v) => (shut(i) ? 0 : v)),
    });
    expect(result.frozen).toEqual([]);
  });
});

describe('lag between travel and flow', () => {
  it('is found from differences and taken out', () => {
    const record = aRecord({ scan: 10, days: 4, hold: 600 });
    const flow = record.flow as Series;
    const late = { ...flow, value: flow.value.map((_, i) => flow.value[Math.max(0, i - 4)] as number) };
    const result = prepared({ ...record, flow: late }, 4);
    expect(result.lag).toEqual({ seconds: 40, identified: true });
    expect(result.flow?.[5_000]).toBeCloseTo(flow.value[5_000] as number, 6);
  });

  it('is not made up where the travel never moved', () => {
    const record = aRecord({ days: 1, from: 50, to: 50 });
    expect(prepared(record, 1).lag).toEqual({ seconds: 0, identified: false });
  });
});
