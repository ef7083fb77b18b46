import { describe, expect, it } from 'vitest';
import { type DataSheet } from '../data-sheet.js';
import { defaultLimits } from '../limits.js';
import { prepare } from '../preparation/prepare.js';
import { steadyWindows } from '../preparation/steady-windows.js';
import { aRecord, aSheet, daysFromStart, type RecordPlan } from '../sample-record.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { compareWithSheet } from './compare-with-sheet.js';
import { regularBins, travelBins } from './travel-bins.js';

function compared(plan: Partial<RecordPlan>, sheet: DataSheet = aSheet()) {
  const prepared = prepare(aRecord(plan), sheet, daysFromStart(plan.days ?? 6), defaultLimits);
  if ('judged' in prepared) throw new Error(prepared.reason);
  const windows = steadyWindows(prepared, sheet, defaultLimits);
  const bins = travelBins(windows, windows.L, regularBins(false, defaultLimits), defaultLimits);
  return compareWithSheet(windows, bins, sheet, seededRandom(1), defaultLimits);
}

const linearSheet = aSheet({ characteristic: 'linear', rangeability: 50 });
const linearLaw = (shift: number) => (h: number) => 0.02 + 0.98 * Math.min(1, h + shift);

describe('comparison with the data sheet', () => {
  it('reads a lost sixth of capacity with an interval that holds it', () => {
    const { deviation } = compared({ capacity: 0.85 });
    expect(deviation?.capacityRatio?.value).toBeCloseTo(0.85, 2);
    expect(deviation?.capacityRatio?.low).toBeLessThan(0.85);
    expect(deviation?.capacityRatio?.high).toBeGreaterThan(0.85);
  });

  it('is far surer of the valve against itself than against its sheet', () => {
    const { deviation } = compared({});
    const width = (i: { low: number; high: number } | null | undefined) => (i ? i.high - i.low : NaN);
    expect(width(deviation?.capacityRatioRepeatability)).toBeLessThan(0.1 * width(deviation?.capacityRatio));
  });

  it('cannot tell a shift from capacity in an equal-percentage trim, and gives the shift that would do it', () => {
    // methods.md §12.5: shift +0.03 in equal percentage of R 40 is a capacity of 1.117022
    const { deviation } = compared({ law: (h) => 40 ** (h + 0.03 - 1) });
    expect(deviation?.capacityRatio?.value).toBeCloseTo(1.117022, 2);
    expect(deviation?.travelShift).toBeNull();
    expect(deviation?.notSeparable?.reason).toBe('not-separable');
    expect(deviation?.equivalentShift).toBeCloseTo(3, 1);
  });

  it('tells a shift from capacity in a linear trim that works at low travel', () => {
    const { deviation } = compared({ from: 8, to: 45, law: linearLaw(0.05), days: 8 }, linearSheet);
    expect(deviation?.offset).toBe(true);
    expect(deviation?.travelShift?.value).toBeCloseTo(5, 0);
    expect(deviation?.capacityRatio?.value).toBeCloseTo(1, 1);
  });

  it('does not claim a shift in a linear trim that never went low', () => {
    const { deviation } = compared({ from: 40, to: 70, law: linearLaw(0.05) }, linearSheet);
    expect(deviation?.travelShift).toBeNull();
    expect(deviation?.notSeparable?.reason).toBe('low-travel-not-visited');
    expect(deviation?.offset).toBe(false);
  });

  it('shows where the shape leaves the sheet’s, the capacity taken out', () => {
    const { deviation } = compared({}, linearSheet);
    expect(Math.abs(deviation?.worst?.percent ?? 0)).toBeGreaterThan(30);
    const shape = deviation?.byTravel ?? [];
    expect(Math.sign(shape[0]?.percent ?? 0)).toBe(-Math.sign(shape.at(-1)?.percent ?? 0));
    const fine = compared({}).deviation?.byTravel ?? [];
    for (const bin of fine) expect(Math.abs(bin.percent)).toBeLessThan(bin.tolerance);
  });

  it('suspects a Cv entered as Kv', () => {
    expect(compared({ capacity: 1 / 1.156 }).deviation?.suspectedUnitFactor).toBeCloseTo(1 / 1.156, 6);
    expect(compared({ capacity: 1 }).deviation?.suspectedUnitFactor).toBeNull();
  });

  it('refuses without a rated coefficient, a characteristic, or enough travel', () => {
    expect(compared({}, aSheet({ ratedCoefficient: null })).refusal?.reason).toBe('no-rated-coefficient');
    expect(compared({}, aSheet({ ratedCoefficient: -3 })).refusal?.reason).toBe('no-rated-coefficient');
    expect(compared({}, aSheet({ characteristic: null })).refusal?.reason).toBe(
      'no-characteristic-specified',
    );
    expect(compared({ from: 50, to: 53 }).refusal?.reason).toBe('too-few-bins');
    expect(compared({}, aSheet({ fluid: null })).refusal?.reason).toBe('no-pressures');
  });
});
