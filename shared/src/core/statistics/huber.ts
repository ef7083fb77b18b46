import { mad } from './mad.js';

/**
 * Huber's weight of a residual given in units of scale: 1 inside ±k, k/|r| outside (Huber 1964).
 *
 * @example huberWeight(2.69, 1.345) // 0.5
 */
export function huberWeight(residual: number, k: number): number {
  const away = Math.abs(residual);
  return away <= k ? 1 : k / away;
}

/**
 * Weighted mean that a few far values cannot drag: iteratively reweighted, started at the weighted median.
 *
 * @param weights same length, not negative
 * @param k Huber's constant in scaled MADs
 * @param floor smallest scale, unit of the values
 * @returns NaN where no value has weight
 */
export function huberMean(
  values: ArrayLike<number>,
  weights: ArrayLike<number>,
  { k, floor, turns }: { readonly k: number; readonly floor: number; readonly turns: number },
): number {
  let mean = weightedMedian(values, weights);
  for (let turn = 0; turn < turns; turn++) {
    const scale = Math.max(mad(values, mean), floor);
    let sum = 0;
    let total = 0;
    for (let i = 0; i < values.length; i++) {
      const v = values[i] as number;
      const w = (weights[i] as number) * huberWeight((v - mean) / scale, k);
      if (!(w > 0)) continue;
      sum += w * v;
      total += w;
    }
    if (total === 0) return NaN;
    const moved = sum / total - mean;
    mean += moved;
    if (Math.abs(moved) < 1e-10 * scale) break;
  }
  return mean;
}

/** The value at which half of the weight is reached; NaN where no value has weight. */
export function weightedMedian(values: ArrayLike<number>, weights: ArrayLike<number>): number {
  return weightedQuantile(values, weights, 0.5);
}

/** The smallest value at which the share p of the weight is reached; NaN where no value has weight. */
export function weightedQuantile(values: ArrayLike<number>, weights: ArrayLike<number>, p: number): number {
  const order = Array.from({ length: values.length }, (_, i) => i)
    .filter((i) => (weights[i] as number) > 0 && Number.isFinite(values[i]))
    .sort((a, b) => (values[a] as number) - (values[b] as number));
  let total = 0;
  for (const i of order) total += weights[i] as number;
  let reached = 0;
  for (const i of order) {
    reached += weights[i] as number;
    if (reached >= p * total) return values[i] as number;
  }
  return NaN;
}
