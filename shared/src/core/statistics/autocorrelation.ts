/**
 * Autocorrelation at one lag: mean removed, both sums over the whole series (the usual estimate, biased to zero).
 *
 * @param y equally spaced, without NaN
 * @param lag whole number, 0 or more
 * @returns NaN where the series does not vary or is not longer than the lag
 * @example lagAutocorrelation([1, 2, 3, 4], 1) // 0.25
 */
export function lagAutocorrelation(y: ArrayLike<number>, lag: number): number {
  const n = y.length;
  if (n <= lag) return NaN;
  let mean = 0;
  for (let i = 0; i < n; i++) mean += ((y[i] as number) - mean) / (i + 1);
  let own = 0;
  let shifted = 0;
  for (let i = 0; i < n; i++) {
    const d = (y[i] as number) - mean;
    own += d * d;
    if (i + lag < n) shifted += d * ((y[i + lag] as number) - mean);
  }
  return own > 0 ? shifted / own : NaN;
}

/**
 * Number of independent points a first-order autoregressive series of n is worth: n(1 − r1)/(1 + r1).
 *
 * @param r1 lag-1 autocorrelation, above −1
 * @example effectiveCount(60, 0.8018) // 6.6
 */
export function effectiveCount(n: number, r1: number): number {
  return (n * (1 - r1)) / (1 + r1);
}
