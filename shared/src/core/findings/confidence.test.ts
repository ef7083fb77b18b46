import { describe, expect, it } from 'vitest';
import { normalCumulative } from '../statistics/normal.js';
import { confidenceOf, isBeyond, severityOf } from './confidence.js';
import { type Chapters, type Measure } from './finding-rule.js';

const aMeasure: Measure = {
  x: 0.2,
  standardError: null,
  raise: 0.1,
  actNow: 0.5,
  rule: 'rule',
  holds: true,
  severityFactor: 1,
  rests: { onPosition: true, onPressures: true },
  evidence: {},
};

function chapters(periods: number, days: number, source: Partial<Chapters> = {}): Chapters {
  return {
    window: { periods, runningPeriods: 12 * days, runningDays: days },
    travelSource: 'position',
    pressureDrop: 'measured',
    ...source,
  } as Chapters;
}

describe('severity', () => {
  it('runs from 0.2 at the threshold to 1 at “act now”, rising or falling', () => {
    const at = (x: number, raise: number, actNow: number) =>
      severityOf({ x, raise, actNow, severityFactor: 1 });
    expect(at(0.05, 0.05, 0.4)).toBeCloseTo(0.2, 12);
    expect(at(0.4, 0.05, 0.4)).toBeCloseTo(1, 12);
    expect(at(9, 0.05, 0.4)).toBe(1);
    expect(at(20, 30, 10)).toBeCloseTo(0.6, 12);
    expect(isBeyond(20, 30, 10)).toBe(true);
    expect(isBeyond(31, 30, 10)).toBe(false);
  });
});

describe('confidence', () => {
  it('is whole with enough data from measured signals', () => {
    expect(confidenceOf(aMeasure, chapters(30, 14))).toBe(1);
  });

  it('grows with the root of periods and of days', () => {
    expect(confidenceOf(aMeasure, chapters(7.5, 14))).toBeCloseTo(0.5, 12);
    expect(confidenceOf(aMeasure, chapters(30, 3.5))).toBeCloseTo(0.5, 12);
  });

  it('is worth less from demand, modelled drops and installed curves, by the weakest of them', () => {
    expect(confidenceOf(aMeasure, chapters(30, 14, { travelSource: 'demand' }))).toBeCloseTo(0.8, 12);
    expect(
      confidenceOf(aMeasure, chapters(30, 14, { travelSource: 'demand', pressureDrop: 'modelled' })),
    ).toBeCloseTo(0.7, 12);
    expect(confidenceOf(aMeasure, chapters(30, 14, { pressureDrop: 'none' }))).toBeCloseTo(0.6, 12);
  });

  it('is one half where a figure with an error stands exactly at its threshold', () => {
    expect(confidenceOf({ ...aMeasure, x: 0.1, standardError: 0.03 }, chapters(30, 14))).toBeCloseTo(0.5, 12);
    expect(
      confidenceOf({ ...aMeasure, x: 29, raise: 30, actNow: 10, standardError: 1 }, chapters(30, 14)),
    ).toBeCloseTo(normalCumulative(1), 12);
  });

  it('of a plain fact does not vanish in a short record', () => {
    expect(confidenceOf({ ...aMeasure, ofRecord: true }, chapters(0, 0.01))).toBeGreaterThan(0.5);
  });
});
