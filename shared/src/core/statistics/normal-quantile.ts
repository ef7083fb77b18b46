import { normalCumulative } from './normal.js';

/**
 * Quantile of the standard normal distribution, by Newton steps on its cumulative from a logistic start.
 *
 * @param p 0 to 1, both excluded
 * @returns NaN outside; good to about 1e-12 for 1e-10 < p < 1 − 1e-10
 * @example normalQuantile(0.975) // 1.959964
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) return NaN;
  if (p > 0.5) return -normalQuantile(1 - p);
  let z = Math.max(-8, Math.log(p / (1 - p)) / 1.702);
  for (let turn = 0; turn < 60; turn++) {
    const density = Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
    // never more than one unit at once: far out the slope is too small to be trusted
    const step = Math.min(1, Math.max(-1, (normalCumulative(z) - p) / density));
    z -= step;
    if (Math.abs(step) < 1e-14) break;
  }
  return z;
}
