import { lagAutocorrelation } from '../statistics/autocorrelation.js';
import { drawBlocks } from '../statistics/block-bootstrap.js';
import { moments } from '../statistics/moments.js';
import { sortedQuantile } from '../statistics/quantile.js';
import { welch } from '../statistics/welch.js';

/** The difference between the days after and the days before a change. */
export interface DayDifference {
  readonly value: number;
  /** 95 % interval */
  readonly low: number;
  readonly high: number;
  /** two-sided */
  readonly p: number;
  /** standard deviation of daily values within a side */
  readonly spread: number;
  /** lag-1 autocorrelation of daily values, 0 to 0.9 */
  readonly r1: number;
}

const resamples = 2_000;

/**
 * How much the daily values changed, allowing for days that resemble their neighbours.
 *
 * Values: Welch's test with n(1 − r1)/(1 + r1) days. Shares of time: resampled days (2 000), the resampled differences
 * spread by √((1 + r1)/(1 − r1)), since single days are drawn. r1 is pooled over both sides about their own means and
 * mended for its bias towards zero, which with 14 days is half of its size.
 *
 * @param before at least two values
 * @param after at least two values
 * @param random uniform numbers in [0, 1), seeded by the caller; used for shares only
 * @returns NaN throughout where a side has fewer than two days
 * Source: methods.md §10.4
 */
export function compareDays(
  before: Float64Array,
  after: Float64Array,
  metric: 'value' | 'share',
  random: () => number,
): DayDifference {
  const one = moments(before);
  const other = moments(after);
  const spread = Math.sqrt(
    (one.deviation ** 2 * (before.length - 1) + other.deviation ** 2 * (after.length - 1)) /
      (before.length + after.length - 2),
  );
  const r1 = pooledAutocorrelation(before, after);
  const worth = (1 - r1) / (1 + r1);
  if (metric === 'value' || !(before.length > 1 && after.length > 1)) {
    const counts = [Math.max(1.5, before.length * worth), Math.max(1.5, after.length * worth)] as const;
    const { difference, low, high, p } = welch(before, after, [...counts]);
    return { value: difference, low, high, p, spread, r1 };
  }
  return { ...resampled(before, after, 1 / Math.sqrt(worth), random), spread, r1 };
}

/**
 * Lag-1 autocorrelation within both sides together, mended for bias and clipped to 0…0.9.
 *
 * The usual estimate is short by about (1 + 4r)/n (Marriott & Pope 1954, from memory); the handbook's 1/n is that of
 * independent days.
 */
function pooledAutocorrelation(before: Float64Array, after: Float64Array): number {
  let sum = 0;
  let days = 0;
  for (const side of [before, after]) {
    const r = lagAutocorrelation(side, 1);
    if (Number.isNaN(r)) continue;
    const n = side.length;
    sum += n * ((r + 1 / n) / Math.max(0.2, 1 - 4 / n));
    days += n;
  }
  return days === 0 ? 0 : Math.min(0.9, Math.max(0, sum / days));
}

function resampled(before: Float64Array, after: Float64Array, widening: number, random: () => number) {
  const value = moments(after).mean - moments(before).mean;
  const counts = [new Int32Array(before.length), new Int32Array(after.length)] as const;
  const drawn = new Float64Array(resamples);
  let below = 0;
  for (let k = 0; k < resamples; k++) {
    const difference = drawnMean(after, counts[1], random) - drawnMean(before, counts[0], random);
    drawn[k] = value + widening * (difference - value);
    if ((drawn[k] as number) <= 0) below++;
  }
  drawn.sort();
  const tail = Math.min(below, resamples - below) / resamples;
  return {
    value,
    low: sortedQuantile(drawn, 0.025),
    high: sortedQuantile(drawn, 0.975),
    p: Math.min(1, 2 * Math.max(tail, 1 / resamples)),
  };
}

function drawnMean(values: Float64Array, counts: Int32Array, random: () => number): number {
  drawBlocks(values.length, random, counts);
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += (counts[i] as number) * (values[i] as number);
  return sum / values.length;
}
