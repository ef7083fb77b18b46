/**
 * Probability that Student's t is at least |t| away from zero, on either side.
 *
 * @param degrees of freedom, above 0, need not be whole
 * @returns 0 to 1; NaN outside the domain
 * @example studentTwoSided(2.306, 8) // 0.05
 */
export function studentTwoSided(t: number, degrees: number): number {
  if (!(degrees > 0)) return NaN;
  return incompleteBeta(degrees / (degrees + t * t), degrees / 2, 0.5);
}

/**
 * The t that is passed on the upper side with probability 1 − p, by bisection.
 *
 * @param p 0.5 to 1, 1 excluded
 * @param degrees of freedom, above 0
 * @example studentQuantile(0.975, 8) // 2.306
 */
export function studentQuantile(p: number, degrees: number): number {
  if (!(p >= 0.5 && p < 1 && degrees > 0)) return NaN;
  const tail = 2 * (1 - p);
  let low = 0;
  let high = 2;
  while (studentTwoSided(high, degrees) > tail && high < 1e12) high *= 2;
  for (let turn = 0; turn < 200 && high - low > 1e-13 * high; turn++) {
    const middle = (low + high) / 2;
    if (studentTwoSided(middle, degrees) > tail) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Regularised incomplete beta function I_x(a, b), by its continued fraction (Abramowitz & Stegun 26.5.8). */
function incompleteBeta(x: number, a: number, b: number): number {
  if (!(x > 0)) return Number.isNaN(x) ? NaN : 0;
  if (x >= 1) return 1;
  // the fraction is quick only on this side of the peak
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front =
    Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x)) / a;
  const tiny = 1e-300;
  const away = (v: number) => (Math.abs(v) < tiny ? tiny : v);
  let c = 1;
  let d = 1 / away(1 - ((a + b) * x) / (a + 1));
  let fraction = d;
  for (let m = 1; m <= 500; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    for (const numerator of [even, odd]) {
      d = 1 / away(1 + numerator * d);
      c = away(1 + numerator / c);
      fraction *= d * c;
    }
    if (Math.abs(d * c - 1) < 1e-15) break;
  }
  return front * fraction;
}

/** ln Γ(x) for x > 0: Stirling's series after moving x above 10. */
function logGamma(x: number): number {
  let shift = 0;
  let z = x;
  while (z < 10) {
    shift += Math.log(z);
    z += 1;
  }
  const r = 1 / (z * z);
  const series = (1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r / 1188)))) / z;
  return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series - shift;
}
