import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import reference from '../../../reference/statistics.json' with { type: 'json' };
import { huberMean, huberWeight, weightedQuantile } from './huber.js';
import { isotonic } from './isotonic.js';
import { mad } from './mad.js';
import { pchip } from './pchip.js';
import { median, medianInPlace, quantile } from './quantile.js';
import { weightedLine, weightedPolynomial } from './regression.js';

const find = <T>(id: string) => reference.cases.find((c) => c.id === id) as unknown as T;
const close = (found: ArrayLike<number>, wanted: readonly number[], digits = 9) => {
  expect(found.length).toBe(wanted.length);
  wanted.forEach((value, i) => {
    expect(found[i]).toBeCloseTo(value, digits);
  });
};

describe('isotonic regression', () => {
  const { data, expected } = find<{
    data: { y: number[]; w: number[] };
    expected: Record<'increasing_unweighted' | 'increasing_weighted' | 'decreasing_weighted', number[]>;
  }>('isotonic');

  it('agrees with R isoreg and Iso::pava to 1e-9, plain, weighted and falling', () => {
    const even = data.y.map(() => 1);
    close(isotonic(data.y, even), expected.increasing_unweighted);
    close(isotonic(data.y, data.w), expected.increasing_weighted);
    const falling = isotonic(
      data.y.map((v) => -v),
      data.w,
    );
    close(
      falling.map((v) => -v),
      expected.decreasing_weighted,
    );
  });

  it('never falls, keeps the weighted mean, and leaves a rising series alone', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.integer({ min: -50, max: 50 }), fc.integer({ min: 1, max: 9 })), {
          minLength: 1,
        }),
        (pairs) => {
          const y = pairs.map(([v]) => v);
          const w = pairs.map(([, weight]) => weight);
          const fitted = isotonic(y, w);
          for (let i = 1; i < y.length; i++)
            expect(fitted[i]).toBeGreaterThanOrEqual((fitted[i - 1] as number) - 1e-9);
          const total = (values: ArrayLike<number>) =>
            w.reduce((sum, weight, i) => sum + weight * (values[i] as number), 0);
          expect(total(fitted)).toBeCloseTo(total(y), 6);
          const sorted = [...y].sort((a, b) => a - b);
          close(isotonic(sorted, w), sorted);
        },
      ),
    );
  });
});

describe('quantiles', () => {
  const { data, expected } = find<{
    data: { v: number[]; w: number[] };
    expected: {
      probs: number[];
      quantiles: { type7: number[] };
      repeated_type7: number[];
      statsmodels_quantile: number[];
    };
  }>('weighted');

  it('agree with R’s type 7 to 1e-9', () => {
    close(
      expected.probs.map((p) => quantile(data.v, p)),
      expected.quantiles.type7,
    );
    const repeated = data.v.flatMap((v, i) => Array.from({ length: data.w[i] as number }, () => v));
    close(
      expected.probs.map((p) => quantile(repeated, p)),
      expected.repeated_type7,
    );
  });

  it('with weights are the inverse of the weighted distribution function, as in statsmodels', () => {
    close(
      expected.probs.map((p) => weightedQuantile(data.v, data.w, p)),
      expected.statsmodels_quantile,
    );
  });

  it('leave NaN out, and the quick median equals the sorted one', () => {
    expect(quantile([NaN, 1, 3, NaN], 0.5)).toBe(2);
    expect(median([])).toBeNaN();
    fc.assert(
      fc.property(fc.array(fc.integer(), { minLength: 1 }), (values) => {
        expect(medianInPlace(Float64Array.from(values), 0, values.length)).toBe(median(values));
      }),
    );
  });

  it('give R’s scaled median absolute deviation', () => {
    const two = find<{ data: { a: number[] }; expected: { mad_a: number } }>('two_samples');
    expect(mad(two.data.a)).toBeCloseTo(two.expected.mad_a, 9);
  });
});

describe('robust regression', () => {
  const { data, expected } = find<{
    data: { x: number[]; y: number[] };
    expected: {
      ols: number[];
      'huber_k1.345_mad': { intercept: number; slope: number; scale: number };
    };
  }>('outliers');

  it('by Huber’s weights and the MAD of residuals ends where R MASS::rlm does, to 1e-5', () => {
    let weights = data.x.map(() => 1);
    let line = weightedLine(data.x, data.y, weights);
    expect(line.intercept).toBeCloseTo(expected.ols[0] as number, 9);
    expect(line.slope).toBeCloseTo(expected.ols[1] as number, 9);
    for (let turn = 0; turn < 200; turn++) {
      const residual = data.y.map((y, i) => y - line.intercept - line.slope * (data.x[i] as number));
      const scale = mad(residual, 0);
      weights = residual.map((r) => huberWeight(r / scale, 1.345));
      line = weightedLine(data.x, data.y, weights);
    }
    const wanted = expected['huber_k1.345_mad'];
    expect(Math.abs(line.slope / wanted.slope - 1)).toBeLessThan(1e-5);
    // rlm divides by 0.6745 where we multiply by 1.4826
    expect(Math.abs(line.intercept / wanted.intercept - 1)).toBeLessThan(3e-5);
  });

  it('a mean by Huber’s weights stays with the many', () => {
    const values = [1, 1.1, 0.9, 1.05, 0.95, 40];
    const mean = huberMean(values, [1, 1, 1, 1, 1, 1], { k: 1.345, floor: 0.001, turns: 50 });
    expect(mean).toBeGreaterThan(0.9);
    expect(mean).toBeLessThan(1.1);
    expect(huberMean([1], [0], { k: 1.345, floor: 0.001, turns: 5 })).toBeNaN();
  });

  it('a polynomial comes back from its own points', () => {
    const x = [0, 10, 20, 30, 40, 50];
    const cubic = weightedPolynomial(
      x,
      x.map((v) => 2 - 0.5 * v + 0.01 * v ** 3),
      x.map(() => 1),
      3,
    );
    const at = (v: number) => {
      const { coefficients, centre, scale } = cubic as NonNullable<typeof cubic>;
      return coefficients.reduce((sum, c, k) => sum + c * ((v - centre) / scale) ** k, 0);
    };
    expect(at(25)).toBeCloseTo(2 - 12.5 + 156.25, 6);
    expect(weightedPolynomial([1, 1], [1, 2], [1, 1], 1)).toBeNull();
  });
});

describe('the shape-preserving cubic', () => {
  it('passes through its points, rises where they rise, and holds its ends', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.integer({ min: 1, max: 9 }), fc.integer({ min: 0, max: 9 })), {
          minLength: 1,
          maxLength: 12,
        }),
        (steps) => {
          let [x, y] = [0, 0];
          const points = steps.map(([dx, dy]) => [(x += dx), (y += dy)] as const);
          const curve = pchip(
            points.map(([px]) => px),
            points.map(([, py]) => py),
          );
          for (const [px, py] of points) expect(curve(px)).toBeCloseTo(py, 9);
          let last = -Infinity;
          for (let at = -1; at <= x + 1; at += 0.37) {
            expect(curve(at)).toBeGreaterThanOrEqual(last - 1e-9);
            last = curve(at);
          }
          expect(curve(x + 100)).toBe(y);
        },
      ),
    );
  });
});
