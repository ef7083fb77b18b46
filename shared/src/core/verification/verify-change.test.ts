import { describe, expect, it } from 'vitest';
import { normalQuantile } from '../statistics/normal-quantile.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { type DailyValue, matchDuty } from './match-duty.js';
import { type ChangeEvidence, verifyChange } from './verify-change.js';

const installedDay = 100;
const whole = { low: 10, high: 80 };

/** A stationary first-order autoregression of unit spread. */
function dailies(n: number, r: number, mean: number, random: () => number): number[] {
  const normal = () => normalQuantile(1e-9 + (1 - 2e-9) * random());
  let x = normal();
  return Array.from({ length: n }, () => {
    const value = x;
    x = r * x + Math.sqrt(1 - r * r) * normal();
    return mean + value;
  });
}

const rows = (values: readonly number[], firstDay: number, band = 0): DailyValue[] =>
  values.map((value, i) => ({ day: firstDay + i, band, value, seconds: 3600 }));

function evidence(over: Partial<ChangeEvidence> = {}): ChangeEvidence {
  return {
    declared: { metric: 'value', change: 1.5 },
    before: [],
    after: [],
    installedAt: installedDay * 86_400,
    travelBefore: whole,
    travelAfter: whole,
    findingStillTrue: false,
    newFindings: [],
    conditions: [],
    ...over,
  };
}

const settled = installedDay + 2;

describe('verification of a change', () => {
  for (const r of [0, 0.3, 0.6])
    it(`verifies at most 5 % of unchanged valves at any nightly look, days resembling each other by ${r}`, () => {
      const random = seededRandom(20 + 10 * r);
      const trials = 400;
      let verified = 0;
      for (let k = 0; k < trials; k++) {
        const before = rows(dailies(30, r, 0, random), 0);
        const after = rows(dailies(90, r, 0, random), settled);
        // every third night keeps the test quick; neighbouring nights hardly differ
        for (let days = 14; days <= 90; days += 3) {
          const seen = evidence({ before, after: after.slice(0, days) });
          if (verifyChange(seen, random).verdict !== 'verified') continue;
          verified++;
          break;
        }
      }
      expect(verified / trials).toBeLessThanOrEqual(0.05);
    });

  it('verifies a shift of 1.5 daily spreads in 30 days nine times in ten', () => {
    const random = seededRandom(4);
    let verified = 0;
    for (let k = 0; k < 200; k++) {
      const before = rows(dailies(30, 0.3, 0, random), 0);
      const after = rows(dailies(30, 0.3, 1.5, random), settled);
      if (verifyChange(evidence({ before, after }), random).verdict === 'verified') verified++;
    }
    expect(verified).toBeGreaterThan(170);
  });

  it('verifies at most 5 % of unchanged shares of time', () => {
    const random = seededRandom(9);
    let verified = 0;
    for (let k = 0; k < 100; k++) {
      const share = (n: number) =>
        dailies(n, 0.3, 0, random).map((v) => Math.min(1, Math.max(0, 0.3 + 0.1 * v)));
      const seen = evidence({
        declared: { metric: 'share', change: -0.05 },
        before: rows(share(30), 0),
        after: rows(share(30), settled),
      });
      if (verifyChange(seen, random).verdict === 'verified') verified++;
    }
    expect(verified).toBeLessThanOrEqual(5);
  });

  const random = seededRandom(1);
  const quiet = (n: number, mean: number) => dailies(n, 0, mean, random).map((v) => mean + 0.1 * (v - mean));

  it('is not verified where half of the declared effect is excluded, or the effect went the other way', () => {
    const before = rows(quiet(30, 0), 0);
    for (const mean of [0, -1.5]) {
      const result = verifyChange(evidence({ before, after: rows(quiet(20, mean), settled) }), random);
      expect(result).toMatchObject({ verdict: 'not verified', reason: 'half of the effect is excluded' });
      expect(result.difference?.value).toBeCloseTo(mean, 0);
    }
    const down = evidence({
      declared: { metric: 'value', change: -1.5 },
      before,
      after: rows(quiet(20, -1.5), settled),
    });
    expect(verifyChange(down, random).verdict).toBe('verified');
  });

  it('is undecided while the finding is still true, days are few, or travel is not covered', () => {
    const before = rows(quiet(30, 0), 0);
    const after = rows(quiet(20, 1.5), settled);
    const reason = (over: Partial<ChangeEvidence>) => {
      const result = verifyChange(evidence({ before, after, ...over }), random);
      expect(result.verdict).toBe('undecided');
      return result.reason;
    };
    expect(reason({ findingStillTrue: true })).toBe('finding still true');
    expect(reason({ after: after.slice(0, 13) })).toBe('too few days');
    expect(reason({ after: [] })).toBe('too few days');
    expect(reason({ travelAfter: { low: 40, high: 60 } })).toBe('travel not covered');
    expect(reason({ after: after.map((row) => ({ ...row, band: 7 })) })).toBe('no duty in common');
  });

  it('leaves the first 48 hours out and closes after 90 days', () => {
    const before = rows(quiet(30, 0), 0);
    const wild = rows([50, 50], installedDay);
    const after = [...wild, ...rows(quiet(120, 1.5), settled)];
    const result = verifyChange(evidence({ before, after }), random);
    expect(result.days).toEqual({ before: 30, after: 90 });
    expect(result.closed).toBe(true);
    expect(result.difference?.value).toBeCloseTo(1.5, 0);
  });

  it('says how many days a side would decide', () => {
    const before = rows([0, 4, 0, 4, 0, 4, 0, 4, 0, 4], 0);
    const after = rows([0, 4, 0, 4, 0, 4, 0, 4, 0, 4, 0, 4, 0, 4], settled);
    const result = verifyChange(evidence({ before, after }), random);
    expect(result.verdict).toBe('undecided');
    // 16·(2.1/1.5)² days
    expect(result.daysNeeded).toBeGreaterThan(28);
    expect(result.daysNeeded).toBeLessThan(35);
  });

  it('names changed conditions and new findings next to the verdict', () => {
    const before = rows(quiet(30, 0), 0);
    const after = rows(quiet(20, 1.5), settled);
    const result = verifyChange(
      evidence({
        before,
        after,
        newFindings: [
          { kind: 'Hunting', severity: 0.5 },
          { kind: 'Uneven gain', severity: 0.3 },
        ],
        conditions: [
          { name: 'pressure drop', before: 100, after: 115 },
          { name: 'set point', before: 100, after: 105 },
        ],
      }),
      random,
    );
    expect(result).toMatchObject({
      verdict: 'verified',
      conditionsChanged: ['pressure drop'],
      newFindings: ['Hunting'],
    });
  });

  it('needs a declared effect', () => {
    expect(() => verifyChange(evidence({ declared: { metric: 'value', change: 0 } }), random)).toThrow(
      RangeError,
    );
  });
});

describe('matching of duty', () => {
  it('does not take another mix of loads for a change', () => {
    // the metric is 0 at low load and 10 at high; before mostly low, after mostly high
    const day = (first: number, highDays: number, n: number) =>
      Array.from({ length: n }, (_, i) => ({
        day: first + i,
        band: i < highDays ? 1 : 0,
        value: (i < highDays ? 10 : 0) + (i % 2),
        seconds: 3600,
      }));
    const { before, after, dutyShared } = matchDuty(day(0, 4, 20), day(50, 16, 20));
    const mean = (values: Float64Array) => values.reduce((a, b) => a + b, 0) / values.length;
    expect(mean(after) - mean(before)).toBeCloseTo(0, 9);
    expect(dutyShared).toBe(1);
  });

  it('keeps a change within the bands, and leaves out bands seen on one side only and bad values', () => {
    const before = [...rows([0, 0, NaN], 0, 1), ...rows([5, 5], 0, 2)];
    const after = [...rows([1, 1], 50, 1), ...rows([9, 9], 50, 3)];
    const matched = matchDuty(before, after);
    expect([...matched.before]).toEqual([-0.5, -0.5]);
    expect([...matched.after]).toEqual([0.5, 0.5]);
    expect(matched.dutyShared).toBe(0.5);
  });
});
