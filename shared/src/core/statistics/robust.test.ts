import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawBlocks, numberBlocks } from './block-bootstrap.js';
import { huberMean, huberWeight, weightedMedian, weightedQuantile } from './huber.js';
import { isotonic } from './isotonic.js';
import { mad } from './mad.js';
import { normalCumulative } from './normal.js';
import { pchip } from './pchip.js';
import { median, medianInPlace, quantile, selectInPlace, sortedQuantile } from './quantile.js';
import { weightedLine, weightedPolynomial } from './regression.js';
import { seededRandom, seedFrom } from './seeded-random.js';

const numbers = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 60 });

describe('quantiles', () => {
  it('interpolate between order statistics', () => {
    expect(sortedQuantile([1, 2, 4], 0.75)).toBe(3);
    expect(quantile([4, NaN, 1, 2], 0.5)).toBe(2);
    expect(quantile([], 0.5)).toBeNaN();
  });

  it('by quickselect are those of sorting', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        const sorted = Float64Array.from(values).sort();
        const k = Math.floor(values.length / 3);
        expect(selectInPlace(Float64Array.from(values), 0, values.length, k)).toBe(sorted[k]);
        // the mean of two middle values may round in its last digit
        expect(medianInPlace(Float64Array.from(values), 0, values.length)).toBeCloseTo(
          sortedQuantile(sorted, 0.5),
          9,
        );
      }),
    );
  });

  it('in place touch only their own part of the buffer', () => {
    const buffer = Float64Array.of(9, 3, 1, 2, 8);
    expect(medianInPlace(buffer, 1, 4)).toBe(2);
    expect([buffer[0], buffer[4]]).toEqual([9, 8]);
  });
});

describe('robust location and scale', () => {
  it('ignore one wild value', () => {
    expect(mad([1, 2, 3, 4, 1_000])).toBeCloseTo(1.4826, 12);
    const huber = { k: 1.345, floor: 0.01, turns: 30 };
    expect(huberMean([1, 1.1, 0.9, 1, 50], [1, 1, 1, 1, 1], huber)).toBeLessThan(1.2);
  });

  it('weigh by Huber’s function', () => {
    expect(huberWeight(1, 1.345)).toBe(1);
    expect(huberWeight(-2.69, 1.345)).toBeCloseTo(0.5, 12);
  });

  it('follow the weights', () => {
    expect(weightedMedian([1, 2, 3], [1, 1, 5])).toBe(3);
    expect(weightedQuantile([3, 1, 2], [1, 1, 1], 0.3)).toBe(1);
    expect(weightedMedian([1, 2], [0, 0])).toBeNaN();
  });
});

describe('regression', () => {
  it('finds a line and a cubic through exact points', () => {
    const x = [1e9, 1e9 + 1, 1e9 + 2, 1e9 + 5];
    expect(
      weightedLine(
        x,
        x.map((v) => 3 + 2 * (v - 1e9)),
        [1, 2, 3, 4],
      ).slope,
    ).toBeCloseTo(2, 9);
    const at = [0, 1, 2, 3, 4, 5];
    const fit = weightedPolynomial(
      at,
      at.map((v) => v ** 3 - v),
      at.map(() => 1),
      3,
    );
    const t = (4.5 - (fit?.centre ?? 0)) / (fit?.scale ?? 1);
    const y = fit?.coefficients.reduce((sum, c, k) => sum + c * t ** k, 0);
    expect(y).toBeCloseTo(4.5 ** 3 - 4.5, 9);
  });

  it('knows no slope at one place', () => {
    expect(weightedLine([1, 1], [1, 2], [1, 1]).slope).toBeNaN();
    expect(weightedPolynomial([1, 1], [1, 2], [1, 1], 1)).toBeNull();
    expect(weightedPolynomial([1, 2], [1, 2], [1, 1], 3)).toBeNull();
  });
});

describe('isotonic regression', () => {
  it('pools what goes down', () => {
    expect([...isotonic([1, 3, 2], [1, 1, 1])]).toEqual([1, 2.5, 2.5]);
    expect([...isotonic([3, 2, 1], [1, 1, 2])]).toEqual([1.75, 1.75, 1.75]);
  });

  it('never falls, keeps the weighted mean and leaves a rising sequence alone', () => {
    fc.assert(
      fc.property(numbers, (y) => {
        const weights = y.map((_, i) => 1 + (i % 3));
        const fitted = isotonic(y, weights);
        for (let i = 1; i < fitted.length; i++)
          expect((fitted[i] as number) >= (fitted[i - 1] as number) - 1e-9).toBe(true);
        const total = (v: ArrayLike<number>) => weights.reduce((s, w, i) => s + w * (v[i] as number), 0);
        expect(total(fitted)).toBeCloseTo(total(y), 3);
        const rising = [...y].sort((a, b) => a - b);
        expect([...isotonic(rising, weights)]).toEqual(rising);
      }),
    );
  });
});

describe('shape-preserving cubic', () => {
  it('meets its points, holds beyond them, and is a line between two', () => {
    const curve = pchip([0, 1, 3], [0, 2, 2.5]);
    expect([curve(0), curve(1), curve(3), curve(-1), curve(9)]).toEqual([0, 2, 2.5, 0, 2.5]);
    expect(pchip([0, 2], [1, 5])(0.5)).toBeCloseTo(2, 12);
    expect(pchip([4], [7])(0)).toBe(7);
  });

  it('rises wherever its points rise', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.01, max: 10, noNaN: true }), { minLength: 2, maxLength: 12 }),
        (steps) => {
          const y = steps.reduce<number[]>((all, s) => [...all, (all.at(-1) ?? 0) + s], []);
          const curve = pchip(
            y.map((_, i) => i),
            y,
          );
          let last = -Infinity;
          for (let t = 0; t <= y.length - 1; t += 0.05) {
            expect(curve(t)).toBeGreaterThanOrEqual(last - 1e-9);
            last = curve(t);
          }
        },
      ),
    );
  });
});

describe('random draws', () => {
  it('repeat from one seed and differ between seeds', () => {
    const take = (seed: number) => Array.from({ length: 4 }, seededRandom(seed));
    expect(take(5)).toEqual(take(5));
    expect(take(5)).not.toEqual(take(6));
    expect(seedFrom('FV-1', 3)).not.toBe(seedFrom('FV-13'));
  });

  it('are uniform: mean a half, variance a twelfth', () => {
    const random = seededRandom(3);
    const drawn = Array.from({ length: 100_000 }, random);
    const mean = drawn.reduce((a, b) => a + b, 0) / drawn.length;
    const variance = drawn.reduce((a, b) => a + (b - mean) ** 2, 0) / drawn.length;
    expect(mean).toBeCloseTo(0.5, 2);
    expect(variance).toBeCloseTo(1 / 12, 2);
    expect(Math.min(...drawn.slice(0, 50_000))).toBeGreaterThanOrEqual(0);
  });

  it('of blocks add up to the number of blocks', () => {
    const counts = drawBlocks(20, seededRandom(1), new Int32Array(20));
    expect(counts.reduce((a, b) => a + b, 0)).toBe(20);
    expect(numberBlocks([7, 7, 9, 7]).blocks).toBe(2);
  });
});

describe('normal distribution', () => {
  it('has its published quantiles (Abramowitz & Stegun, table 26.1, from memory)', () => {
    expect(normalCumulative(0)).toBe(0.5);
    expect(normalCumulative(1.959963984540054)).toBeCloseTo(0.975, 12);
    expect(normalCumulative(-2.3263478740408408)).toBeCloseTo(0.01, 12);
    expect(normalCumulative(9)).toBe(1);
    expect(median([normalCumulative(-40), normalCumulative(NaN)])).toBe(0);
  });
});
