import { lagAutocorrelation } from './autocorrelation.js';
import { normalCumulative } from './normal.js';
import { theilSen, tieSizes } from './theil-sen.js';

/** A test for a trend that asks only about the order of the points. */
export interface MannKendall {
  /** how many more pairs rise than fall */
  readonly S: number;
  readonly variance: number;
  readonly z: number;
  /** two-sided */
  readonly p: number;
}

/**
 * Mann–Kendall test for a monotone trend (Mann 1945, Kendall 1975), with the correction for ties and for continuity.
 *
 * @param y equally spaced, in time order
 * @param inflation factor on the variance for autocorrelation; 1: none
 * @returns z 0 and p 1 where all points are equal or there are fewer than two
 * @example mannKendall([1, 2, 3, 4]).S // 6
 * Source: methods.md §7.2
 */
export function mannKendall(y: ArrayLike<number>, inflation = 1): MannKendall {
  const n = y.length;
  let S = 0;
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) S += Math.sign((y[j] as number) - (y[i] as number));
  let variance = n * (n - 1) * (2 * n + 5);
  for (const k of tieSizes(y)) variance -= k * (k - 1) * (2 * k + 5);
  variance = (variance / 18) * inflation;
  const z = variance > 0 ? (S - Math.sign(S)) / Math.sqrt(variance) : 0;
  return { S, variance, z, p: 2 * normalCumulative(-Math.abs(z)) };
}

/**
 * Mann–Kendall for a series whose neighbours resemble each other: the variance is multiplied by
 * 1 + 2·Σ(1 − k/n)·r1^k, r1 from the series less its Theil–Sen slope, clipped to 0…0.9 (Yue & Wang 2004; Hamed & Rao 1998).
 *
 * With 8 to 24 points it still rejects 8–15 % of the time where it says 5 %: it never raises a finding by itself.
 *
 * @param t times of the points, ascending
 * @param y same length
 * Source: methods.md §7.2
 */
export function correctedTrendTest(
  t: ArrayLike<number>,
  y: ArrayLike<number>,
): MannKendall & { readonly r1: number } {
  const { slope } = theilSen(t, y);
  const rest = Float64Array.from(
    { length: y.length },
    (_, i) => (y[i] as number) - (Number.isNaN(slope) ? 0 : slope) * (t[i] as number),
  );
  const found = lagAutocorrelation(rest, 1);
  const r1 = Number.isNaN(found) ? 0 : Math.min(0.9, Math.max(0, found));
  return { ...mannKendall(y, varianceInflation(y.length, r1)), r1 };
}

/**
 * How much more a trend score varies where the points follow a first-order autoregression.
 *
 * @param r1 lag-1 autocorrelation, 0 to below 1
 * @example varianceInflation(3, 0.5) // 1.8333
 */
export function varianceInflation(n: number, r1: number): number {
  let sum = 0;
  for (let k = 1; k < n; k++) sum += (1 - k / n) * r1 ** k;
  return 1 + 2 * sum;
}
