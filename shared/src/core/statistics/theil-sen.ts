import { normalQuantile } from './normal-quantile.js';
import { median, sortedQuantile } from './quantile.js';

/** A robust straight line: slope with its interval, and the intercept at t = 0. */
export interface TheilSen {
  readonly slope: number;
  readonly low: number;
  readonly high: number;
  /** median y less slope times median t (Conover); NaN with fewer than two different times */
  readonly intercept: number;
}

/**
 * Median of the slopes between all pairs of points (Theil 1950, Sen 1968), with Sen's interval from the ranks of the
 * slopes: nearly a third of the points may be wild without moving it.
 *
 * Takes n²/2 slopes: for monthly, weekly or daily points, not for samples.
 *
 * @param t times or abscissae, any order; pairs at equal t are left out
 * @param y same length
 * @param level of the interval, 0.95 by default; ties in y are allowed for in its width
 * @returns NaN where no two times differ
 * @example theilSen([1, 2, 3], [1, 2, 30]).slope // 14.5
 */
export function theilSen(t: ArrayLike<number>, y: ArrayLike<number>, level = 0.95): TheilSen {
  const n = t.length;
  if (y.length !== n) throw new RangeError('t and y differ in length');
  const all = new Float64Array((n * (n - 1)) / 2);
  let pairs = 0;
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) {
      const run = (t[j] as number) - (t[i] as number);
      if (run !== 0) all[pairs++] = ((y[j] as number) - (y[i] as number)) / run;
    }
  const slopes = all.subarray(0, pairs).sort();
  const slope = sortedQuantile(slopes, 0.5);
  const half = normalQuantile((1 + level) / 2) * Math.sqrt(scoreVariance(y, t));
  const at = (rank: number) => slopes[Math.min(Math.max(rank, 0), pairs - 1)] ?? NaN;
  return {
    slope,
    low: at(Math.round((pairs - half) / 2) - 1),
    high: at(Math.round((pairs + half) / 2)),
    intercept: median(y) - slope * median(t),
  };
}

/** Variance of the sum of signs of all pairs where there is no trend, with the corrections for ties in either column. */
function scoreVariance(y: ArrayLike<number>, t: ArrayLike<number>): number {
  const n = y.length;
  let variance = n * (n - 1) * (2 * n + 5);
  for (const column of [y, t]) for (const k of tieSizes(column)) variance -= k * (k - 1) * (2 * k + 5);
  return variance / 18;
}

/** Sizes of the groups of equal values. */
export function tieSizes(values: ArrayLike<number>): readonly number[] {
  const sizes = new Map<number, number>();
  for (let i = 0; i < values.length; i++) {
    const v = values[i] as number;
    sizes.set(v, (sizes.get(v) ?? 0) + 1);
  }
  return [...sizes.values()];
}
