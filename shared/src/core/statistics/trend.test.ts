import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import reference from '../../../reference/statistics.json' with { type: 'json' };
import { correctedTrendTest, mannKendall, varianceInflation } from './mann-kendall.js';
import { seededRandom } from './seeded-random.js';
import { theilSen } from './theil-sen.js';

interface TrendCase {
  data: { x: number[]; y: number[] };
  expected: {
    theil_sen: { slope: number; intercept_separate: number; ci95: number[]; ci90: number[] };
    mann_kendall: {
      S: number;
      var_S_tie_corrected: number;
      z_continuity: number;
      p_two_sided_continuity: number;
    };
  };
}

const cases = reference.cases.filter((c) => c.id.includes('trend'));

describe('Theil–Sen and Mann–Kendall', () => {
  it.each(cases.map((c) => [c.id, c as unknown as TrendCase] as const))(
    '%s: slope, intercept, interval (scipy theilslopes) and trend test (R cor.test) are reproduced',
    (_, { data, expected }) => {
      const line = theilSen(data.x, data.y);
      const wanted = expected.theil_sen;
      const near = (found: number, value: number) => {
        expect(Math.abs(found / value - 1)).toBeLessThan(1e-9);
      };
      near(line.slope, wanted.slope);
      near(line.intercept, wanted.intercept_separate);
      near(line.low, wanted.ci95[0] as number);
      near(line.high, wanted.ci95[1] as number);
      const narrow = theilSen(data.x, data.y, 0.9);
      near(narrow.low, wanted.ci90[0] as number);
      near(narrow.high, wanted.ci90[1] as number);

      const test = mannKendall(data.y);
      expect(test.S).toBe(expected.mann_kendall.S);
      near(test.variance, expected.mann_kendall.var_S_tie_corrected);
      near(test.z, expected.mann_kendall.z_continuity);
      expect(Math.abs(test.p / expected.mann_kendall.p_two_sided_continuity - 1)).toBeLessThan(1e-6);
    },
  );

  it('a series without any difference has no trend', () => {
    expect(mannKendall([5, 5, 5, 5])).toMatchObject({ S: 0, z: 0, p: 1 });
    expect(mannKendall([])).toMatchObject({ z: 0, p: 1 });
    expect(theilSen([1, 1], [0, 1]).slope).toBeNaN();
  });

  it('the variance of three points with r1 0.5 is 1.8333 times that of independent ones', () => {
    expect(varianceInflation(3, 0.5)).toBeCloseTo(1 + 2 * ((2 / 3) * 0.5 + (1 / 3) * 0.25), 12);
  });

  it('a fifth of wild points does not move the slope far', () => {
    const random = seededRandom(3);
    const t = Array.from({ length: 30 }, (_, i) => i);
    const y = t.map((v) => 0.02 * v + 0.01 * (random() - 0.5) + (v % 5 === 0 ? 5 * random() : 0));
    expect(Math.abs(theilSen(t, y).slope - 0.02)).toBeLessThan(0.004);
  });

  it('scaling and shifting a series scales its slope and leaves its test alone', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 4, maxLength: 25 }), (y) => {
        const t = y.map((_, i) => i);
        const moved = y.map((v) => 3 * v + 7);
        expect(theilSen(t, moved).slope).toBeCloseTo(3 * theilSen(t, y).slope, 9);
        expect(correctedTrendTest(t, moved).p).toBeCloseTo(correctedTrendTest(t, y).p, 9);
      }),
    );
  });

  it('neighbours that resemble each other weaken the verdict', () => {
    const random = seededRandom(11);
    let level = 0;
    const y = Array.from({ length: 40 }, () => (level = 0.8 * level + random() - 0.5));
    const t = y.map((_, i) => i);
    const corrected = correctedTrendTest(t, y);
    expect(corrected.r1).toBeGreaterThan(0.3);
    expect(Math.abs(corrected.z)).toBeLessThan(Math.abs(mannKendall(y).z));
  });
});
