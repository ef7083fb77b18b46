import { describe, expect, it } from 'vitest';
import { type DataSheet } from '../data-sheet.js';
import { defaultLimits } from '../limits.js';
import { prepare } from '../preparation/prepare.js';
import { steadyWindows } from '../preparation/steady-windows.js';
import { aRecord, aSheet, daysFromStart, type RecordPlan } from '../sample-record.js';
import { type History } from '../series.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { fitCharacteristic } from './fit-characteristic.js';

function fitOf(
  plan: Partial<RecordPlan> = {},
  sheet: DataSheet = aSheet(),
  signals: (record: History) => History = (record) => record,
) {
  const prepared = prepare(signals(aRecord(plan)), sheet, daysFromStart(plan.days ?? 6), defaultLimits);
  if ('judged' in prepared) throw new Error(prepared.reason);
  return fitCharacteristic(steadyWindows(prepared, sheet, defaultLimits), {
    sheet,
    travelSource: prepared.travelSource,
    deadBand: null,
    random: seededRandom(1),
    limits: defaultLimits,
  });
}

const lawOf: Record<string, (h: number) => number> = {
  linear: (h) => 0.02 + 0.98 * h,
  'equal percentage': (h) => 40 ** (h - 1),
  'quick opening': Math.sqrt,
  'modified parabolic': (h) => 0.3 * h + 0.7 * h * h,
};

describe('the effective characteristic', () => {
  it.each(Object.keys(lawOf))('of a trim of kind “%s” is named so over most of its travel', (kind) => {
    const law = lawOf[kind] as (h: number) => number;
    const { characteristic } = fitOf({ law }, aSheet({ characteristic: null }));
    expect(characteristic?.kind).toBe(kind);
    expect(characteristic?.agreement).toBeGreaterThanOrEqual(0.9);
    expect(characteristic?.fits[0]?.kind).toBe(kind);
  });

  it('gives rangeability, per-cent step and rated coefficient with intervals that hold the truth', () => {
    const found = fitOf().characteristic;
    expect(found?.rangeability?.low).toBeLessThan(40);
    expect(found?.rangeability?.high).toBeGreaterThan(40);
    expect(found?.rangeability?.value).toBeCloseTo(40, -1);
    expect(found?.ratedCoefficient?.low).toBeLessThan(50);
    expect(found?.ratedCoefficient?.high).toBeGreaterThan(50);
    expect(found?.percentStep?.value).toBeCloseTo(100 * (40 ** 0.01 - 1), 1);
  });

  it('draws its curve over the travel visited and nothing beyond, inside its own band', () => {
    const found = fitOf().characteristic;
    const curve = found?.curve ?? [];
    expect(curve[0]?.travel).toBeCloseTo(found?.span.from ?? NaN, 9);
    expect(curve.at(-1)?.travel).toBeCloseTo(found?.span.to ?? NaN, 9);
    for (const point of curve) {
      expect(point.low).toBeLessThanOrEqual(point.value);
      expect(point.high).toBeGreaterThanOrEqual(point.value);
      expect(point.value).toBeCloseTo(50 * 40 ** (point.travel / 100 - 1), 0);
    }
  });

  it('names no kind below 20 % of travel, however good the fit', () => {
    const found = fitOf({ from: 45, to: 58 }).characteristic;
    expect(found?.kind).toBe('undecided');
    expect(found?.undecided?.reason).toBe('span-too-small');
    expect(found?.ratedCoefficient).toBeNull();
  });

  it('is installed without pressures, monotone, and never named', () => {
    const found = fitOf({}, aSheet(), ({ position, flow }) => ({ position, flow })).characteristic;
    expect(found).toMatchObject({ basis: 'installed', pressureDrop: 'none', kind: 'undecided' });
    expect(found?.undecided?.reason).toBe('no-pressures');
    const flows = found?.curve.map((p) => p.value) ?? [];
    flows.slice(1).forEach((q, i) => expect(q).toBeGreaterThanOrEqual(flows[i] ?? NaN));
  });

  it('gives the per-cent step of an exponential as a description only where one fits', () => {
    const without = ({ position, flow }: History) => ({ position, flow }) as History;
    expect(fitOf({}, aSheet(), without).characteristic?.percentStep?.value).toBeCloseTo(3.76, 0);
    const straight = fitOf({ law: lawOf.linear as (h: number) => number }, aSheet(), without);
    expect(straight.characteristic?.percentStep).toBeNull();
  });

  it('refuses a curve that falls as the valve opens', () => {
    const found = fitOf({ law: (h) => 40 ** -h });
    expect(found.characteristic).toBeNull();
    expect(found.refusal?.reason).toBe('flow-falls-as-valve-opens');
  });

  it('refuses an installed curve whose flow does not follow the valve', () => {
    const found = fitOf({ law: () => 0.5, noise: 0.05 }, aSheet(), ({ position, flow }) => {
      return { position, flow };
    });
    expect(found.refusal?.reason).toBe('flow-does-not-follow');
  });

  it('needs a dead band or 40 % of travel before it names a kind from demand alone', () => {
    const demandOnly = (record: History): History => {
      const { demand, flow, upstreamPressure, downstreamPressure } = record;
      return { demand, flow, upstreamPressure, downstreamPressure };
    };
    expect(fitOf({ from: 40, to: 70 }, aSheet(), demandOnly).characteristic?.undecided?.reason).toBe(
      'demand-only',
    );
    expect(fitOf({ from: 25, to: 80 }, aSheet(), demandOnly).characteristic?.kind).toBe('equal percentage');
  });

  it('keeps a verdict from modelled pressures only where all neighbouring models agree', () => {
    const designCases = [
      { name: 'minimum', flow: 5, upstreamPressure: 1_000, downstreamPressure: 590 },
      { name: 'maximum', flow: 80, upstreamPressure: 1_000, downstreamPressure: 620 },
    ];
    const without = ({ position, flow }: History) => ({ position, flow }) as History;
    const found = fitOf({}, aSheet({ designCases }), without).characteristic;
    expect(found).toMatchObject({ pressureDrop: 'modelled', kind: 'equal percentage' });
  });

  it('is the same to the bit for the same data', () => {
    expect(fitOf().characteristic).toEqual(fitOf().characteristic);
  });

  it('shows wide bins where a short record passes each travel once', () => {
    const found = fitOf({ scan: 1, days: 0.02, hold: 60, noise: 0.002 });
    expect(found.characteristic?.points.length).toBeGreaterThanOrEqual(3);
  });
});
