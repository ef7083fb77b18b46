import { median } from './quantile.js';

/** Makes the median absolute deviation estimate the standard deviation of normal data. */
export const madFactor = 1.4826;

/**
 * Median absolute deviation, scaled to the standard deviation of normal data (Rousseeuw & Croux 1993).
 * NaN entries are left out; NaN where none is left.
 */
export function mad(values: ArrayLike<number>, centre: number = median(values)): number {
  const away = new Float64Array(values.length);
  for (let i = 0; i < values.length; i++) away[i] = Math.abs((values[i] as number) - centre);
  return madFactor * median(away);
}
