import { weightedLine } from '../statistics/regression.js';

/** What a window's own trend says of its steadiness. */
export interface SlopeTest {
  /** per second */
  readonly slope: number;
  /** slope over its standard error, correlated neighbours counted as fewer samples */
  readonly t: number;
  /** change over the window */
  readonly change: number;
  /** neither significant nor beyond the practical limit */
  readonly steady: boolean;
}

/**
 * Trend of one window, for showing its evidence: steady only where |t| < 2 and the change over the window stays
 * below the practical limit. The practical limit decides; with enough samples every window has a "significant" slope.
 *
 * @param time s
 * @param value same length, without NaN
 * @param practical largest change over the window that does not matter, unit of the values
 * @returns NaN figures and not steady with fewer than four samples
 * Source: methods.md §1.9
 */
export function slopeTest(time: Float64Array, value: Float64Array, practical: number): SlopeTest {
  const n = time.length;
  if (n < 4) return { slope: NaN, t: NaN, change: NaN, steady: false };
  const origin = time[0] as number;
  const x = time.map((t) => t - origin);
  const { slope, intercept } = weightedLine(x, value, new Float64Array(n).fill(1));
  const residual = value.map((v, i) => v - intercept - slope * (x[i] as number));
  let squares = 0;
  let neighbours = 0;
  for (let i = 0; i < n; i++) {
    squares += (residual[i] as number) ** 2;
    if (i > 0) neighbours += (residual[i] as number) * (residual[i - 1] as number);
  }
  const r1 = squares > 0 ? Math.max(0, Math.min(0.99, neighbours / squares)) : 0;
  const effective = Math.max(3, (n * (1 - r1)) / (1 + r1));
  const mean = x.reduce((a, b) => a + b, 0) / n;
  const spread = x.reduce((a, b) => a + (b - mean) ** 2, 0);
  const error = Math.sqrt(squares / (effective - 2) / ((spread * effective) / n));
  const change = slope * ((x[n - 1] as number) - (x[0] as number));
  const t = error > 0 ? slope / error : slope === 0 ? 0 : Infinity * Math.sign(slope);
  return { slope, t, change, steady: Math.abs(t) < 2 && Math.abs(change) < practical };
}
