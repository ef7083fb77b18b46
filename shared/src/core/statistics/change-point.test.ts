import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { differenceSpread, levels, stepsOf } from './change-point.js';
import { seededRandom } from './seeded-random.js';

/** Cost of every division into levels, tried one after the other. */
function cheapest(y: readonly number[], penalty: number, least: number): number {
  const cost = (part: readonly number[]) => {
    const mean = part.reduce((a, b) => a + b, 0) / part.length;
    return part.reduce((sum, v) => sum + (v - mean) ** 2, 0);
  };
  let best = cost(y);
  for (let cut = least; cut <= y.length - least; cut++)
    best = Math.min(best, cheapest(y.slice(0, cut), penalty, least) + penalty + cost(y.slice(cut)));
  return best;
}

describe('levels of a series', () => {
  it('cost no more than any other division', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 20 }), { minLength: 1, maxLength: 12 }),
        fc.integer({ min: 1, max: 60 }),
        (y, penalty) => {
          const found = levels(y, penalty, 2);
          const total = found.reduce(
            (sum, { from, to, mean }) =>
              sum + y.slice(from, to).reduce((part, v) => part + (v - mean) ** 2, 0),
            penalty * (found.length - 1),
          );
          expect(total).toBeCloseTo(cheapest(y, penalty, 2), 6);
          expect(found[0]?.from).toBe(0);
          expect(found.at(-1)?.to).toBe(y.length);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('find a step of −6 % in a year of weekly points, at its week', () => {
    const random = seededRandom(5);
    const y = Array.from({ length: 52 }, (_, i) => (i < 30 ? 0 : -0.062) + 0.012 * (random() - 0.5));
    const steps = stepsOf(y, 0.04);
    expect(steps).toHaveLength(1);
    expect(steps[0]?.at).toBe(30);
    expect(steps[0]?.change).toBeCloseTo(-0.062, 2);
  });

  it('do not make steps of a slow ramp’s noise, nor of a step below 4 %', () => {
    const random = seededRandom(6);
    const noise = Array.from({ length: 52 }, () => 0.02 * (random() - 0.5));
    expect(stepsOf(noise, 0.04)).toEqual([]);
    expect(
      stepsOf(
        noise.map((v, i) => v + (i < 20 ? 0 : 0.03)),
        0.04,
      ),
    ).toEqual([]);
  });

  it('are none for an empty series and one for a short one', () => {
    expect(levels([], 1)).toEqual([]);
    expect(levels([1, 9], 1)).toEqual([{ from: 0, to: 2, mean: 5 }]);
    expect(stepsOf([1], 0.04)).toEqual([]);
    expect(differenceSpread([0, 1, 0, 1, 0])).toBeCloseTo(1.4826 / Math.SQRT2, 9);
  });
});
