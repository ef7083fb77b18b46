/**
 * Cumulative standard normal distribution, by the series Φ(z) = ½ + φ(z)·(z + z³/3 + z⁵/(3·5) + …), which is
 * good to rounding where it matters (Marsaglia 2004).
 *
 * @returns 0 to 1; NaN for NaN
 * @example normalCumulative(1.959963984540054) // 0.975
 */
export function normalCumulative(z: number): number {
  if (z > 8) return 1;
  if (z < -8) return 0;
  let term = z;
  let sum = z;
  for (let k = 3; Math.abs(term) > 1e-17 * Math.abs(sum); k += 2) {
    term *= (z * z) / k;
    sum += term;
  }
  return 0.5 + (sum * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI);
}
