import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { assess } from './assess.js';
import { type Assessment } from './assessment.js';
import { aSeries, aSheet } from './sample-record.js';
import { type Series } from './series.js';

/**
 * Open data written by nobody here, with what their makers say of them (shared/reference/README.md):
 * a laboratory gas-lift rig (Matias et al., NTNU, CC BY 4.0) and two runs of the Tennessee Eastman process
 * (Downs & Vogel 1993; Russell, Chiang & Braatz 1998, University of Illinois licence).
 */
const columnsOf = (file: string): Map<string, Series> => {
  const text = readFileSync(new URL(`../../reference/open-datasets/${file}`, import.meta.url), 'utf8');
  const [head = '', ...rows] = text.trim().split('\n');
  const cells = rows.map((row) => row.split(','));
  const time = cells.map((row) => Date.parse(row[0] ?? '') / 1_000);
  return new Map(
    head
      .trim()
      .split(',')
      .slice(1)
      .map(
        (tag, k) =>
          [
            tag,
            aSeries(
              time,
              cells.map((row) => Number(row[k + 1])),
            ),
          ] as const,
      ),
  );
};
const files = {
  rig: columnsOf('rig_gaslift_ssrto_1.csv'),
  tep1: columnsOf('tep_idv01_ac_ratio.csv'),
  tep2: columnsOf('tep_idv02_b_composition.csv'),
};

function assessed(file: keyof typeof files, valve: string, flow: string): Assessment {
  const demand = files[file].get(valve);
  const measured = files[file].get(flow);
  if (demand === undefined || measured === undefined)
    throw new Error(`${valve} or ${flow} is not in the file`);
  const sheet = aSheet({ characteristic: null, ratedCoefficient: null, fluid: null, flowSpan: null });
  const span = { from: demand.time[0] as number, to: (demand.time.at(-1) as number) + 1 };
  return assess({ tag: valve, dataSheet: sheet }, { demand, flow: measured }, span);
}

interface Point {
  readonly travel: number;
  readonly value: number;
}

/** Slope of the least-squares line through points of a range of travel. */
function slope(points: readonly Point[], from: number, to: number): number {
  const inside = points.filter((p) => p.travel >= from && p.travel <= to);
  const mx = inside.reduce((a, p) => a + p.travel, 0) / inside.length;
  const my = inside.reduce((a, p) => a + p.value, 0) / inside.length;
  const sxy = inside.reduce((a, p) => a + (p.travel - mx) * (p.value - my), 0);
  return sxy / inside.reduce((a, p) => a + (p.travel - mx) ** 2, 0);
}

const unrelated = [
  'Sticking',
  'Lost motion',
  'Hunting',
  'Lost capacity',
  'Gained capacity',
  'Off characteristic',
];
const expectNoFault = (a: Assessment) => {
  for (const kind of unrelated) expect(a.findings.map((f) => f.kind)).not.toContain(kind);
};

describe('the gas-lift rig: twenty minutes at one second', () => {
  it.each([
    ['CV101.POS', 'FI101.PV', 30, 80],
    ['CV103.POS', 'FI103.PV', 25, 60],
  ])('%s has a concave installed curve and no fault', (valve, flow, from, to) => {
    const a = assessed('rig', valve, flow);
    expect(a.judged).toBe(true);
    expect(a.basis).toBe('installed');
    expect(a.travelSource).toBe('demand');
    const curve = a.characteristic?.curve ?? [];
    expect(a.characteristic?.kind).toBe('undecided');
    expect(slope(curve, from, 45)).toBeGreaterThanOrEqual(5 * slope(curve, 52, to));
    expectNoFault(a);
  });

  it('CV102 stood at 40 % for the record: nothing can be inferred', () => {
    const a = assessed('rig', 'CV102.POS', 'FI102.PV');
    expect(a.judged).toBe(false);
    expect(a.reason?.reason).toBe('travel-constant');
    expect(a.findings).toEqual([]);
  });

  it.each(['107', '108', '109'])('CV%s is pinned wide open all the time, without a characteristic', (n) => {
    const a = assessed('rig', `CV${n}.POS`, `FI10${Number(n) - 106}.PV`);
    expect(a.findings.map((f) => f.kind)).toEqual(['Pinned at limit']);
    expect(a.findings[0]?.x).toBeCloseTo(1, 6);
    expect(a.characteristic).toBeNull();
  });
});

describe('the Tennessee Eastman process: two days at three minutes', () => {
  it.each([
    ['tep1', 'XMV03', 'XMEAS01', 0.01015, 0.001068, 0.02],
    ['tep1', 'XMV09', 'XMEAS19', 3.25, 77.03, 0.02],
    ['tep2', 'XMV06', 'XMEAS10', 0.008332, 0.005544, 0.02],
    ['tep2', 'XMV09', 'XMEAS19', 4.46, 19.54, 0.04],
  ] as const)(
    '%s %s follows its published straight line and has no fault',
    (file, valve, flow, k, zero, within) => {
      const a = assessed(file, valve, flow);
      expect(a.judged).toBe(true);
      expect(a.characteristic?.points.length).toBeGreaterThanOrEqual(8);
      for (const { travel, value } of a.characteristic?.points ?? [])
        expect(Math.abs(value / (zero + k * travel) - 1)).toBeLessThan(within);
      expectNoFault(a);
    },
  );

  it('counts the time near and at the open limit', () => {
    // 4.2 % and 8.4 % of the samples after the 160th of 960
    expect(assessed('tep1', 'XMV03', 'XMEAS01').range?.aboveHigh).toBeCloseTo((0.042 * 800) / 960, 2);
    expect(assessed('tep1', 'XMV09', 'XMEAS19').range?.atOpen).toBeCloseTo((0.042 * 800) / 960, 2);
    expect(assessed('tep2', 'XMV06', 'XMEAS10').range?.aboveHigh).toBeCloseTo((0.084 * 800) / 960, 2);
  });

  it('does not identify a valve whose flow does not follow it, or that hardly moved', () => {
    const xmv07 = assessed('tep1', 'XMV07', 'XMEAS14');
    expect(xmv07.characteristic).toBeNull();
    expect(xmv07.reason?.reason).toBe('flow-does-not-follow');
    const xmv04 = assessed('tep2', 'XMV04', 'XMEAS04');
    expect(xmv04.characteristic).toBeNull();
    expect(xmv04.reason?.reason).toBe('span-too-small');
  });
});
