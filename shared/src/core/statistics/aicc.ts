/**
 * Akaike's criterion with the small-sample term (Akaike 1974; Hurvich & Tsai 1989), up to a constant:
 * n·ln(RSS/n + σ0²) + 2K + 2K(K + 1)/(n − K − 1).
 *
 * @param rss weighted sum of squared residuals
 * @param parameters K, the error variance counted
 * @param floor σ0 in the unit of the residuals, so that perfection in few points cannot decide
 * @returns Infinity where n leaves no room for the parameters
 * Source: methods.md §3.3
 */
export function aicc(n: number, rss: number, parameters: number, floor = 0): number {
  const room = n - parameters - 1;
  if (!(room > 0)) return Infinity;
  return n * Math.log(rss / n + floor ** 2) + 2 * parameters + (2 * parameters * (parameters + 1)) / room;
}
