/** A weighted straight line y = intercept + slope·x. */
export interface Line {
  readonly intercept: number;
  readonly slope: number;
}

/**
 * Weighted least-squares line, on centred x so that large x cost no digits.
 *
 * @param weights same length, not negative
 * @returns slope NaN where x does not vary; both NaN where no point has weight
 */
export function weightedLine(x: ArrayLike<number>, y: ArrayLike<number>, weights: ArrayLike<number>): Line {
  let total = 0;
  let sx = 0;
  let sy = 0;
  for (let i = 0; i < x.length; i++) {
    const w = weights[i] as number;
    total += w;
    sx += w * (x[i] as number);
    sy += w * (y[i] as number);
  }
  if (!(total > 0)) return { intercept: NaN, slope: NaN };
  const mx = sx / total;
  const my = sy / total;
  let sxx = 0;
  let sxy = 0;
  for (let i = 0; i < x.length; i++) {
    const w = weights[i] as number;
    const dx = (x[i] as number) - mx;
    sxx += w * dx * dx;
    sxy += w * dx * ((y[i] as number) - my);
  }
  const slope = sxx > 0 ? sxy / sxx : NaN;
  return { intercept: my - slope * mx, slope };
}

/**
 * Weighted least-squares polynomial by Gaussian elimination of the normal equations in centred, scaled x: good
 * for the low degrees used here (up to about four).
 *
 * @returns coefficients in (x − centre)/scale, lowest first; null where the points cannot fix them
 */
export function weightedPolynomial(
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  weights: ArrayLike<number>,
  degree: number,
): { readonly coefficients: Float64Array; readonly centre: number; readonly scale: number } | null {
  const m = degree + 1;
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < x.length; i++) {
    if (!((weights[i] as number) > 0)) continue;
    low = Math.min(low, x[i] as number);
    high = Math.max(high, x[i] as number);
  }
  if (!(high > low)) return null;
  const centre = (low + high) / 2;
  const scale = (high - low) / 2;
  const A = Array.from({ length: m }, () => new Float64Array(m + 1));
  const power = new Float64Array(m);
  for (let i = 0; i < x.length; i++) {
    const w = weights[i] as number;
    if (!(w > 0)) continue;
    power[0] = 1;
    for (let j = 1; j < m; j++) power[j] = ((power[j - 1] as number) * ((x[i] as number) - centre)) / scale;
    for (let r = 0; r < m; r++) {
      const row = A[r] as Float64Array;
      const wr = w * (power[r] as number);
      for (let c = 0; c < m; c++) row[c] = (row[c] as number) + wr * (power[c] as number);
      row[m] = (row[m] as number) + wr * (y[i] as number);
    }
  }
  const solution = solve(A, m);
  return solution === null ? null : { coefficients: solution, centre, scale };
}

/** Gaussian elimination with partial pivoting on an augmented matrix, which it uses up; null where it is singular. */
function solve(A: Float64Array[], m: number): Float64Array | null {
  const at = (r: number, c: number) => (A[r] as Float64Array)[c] as number;
  for (let p = 0; p < m; p++) {
    let best = p;
    for (let r = p + 1; r < m; r++) if (Math.abs(at(r, p)) > Math.abs(at(best, p))) best = r;
    [A[p], A[best]] = [A[best] as Float64Array, A[p] as Float64Array];
    if (!(Math.abs(at(p, p)) > 1e-12 * Math.max(1, Math.abs(at(0, 0))))) return null;
    for (let r = p + 1; r < m; r++) {
      const factor = at(r, p) / at(p, p);
      for (let c = p; c <= m; c++) (A[r] as Float64Array)[c] = at(r, c) - factor * at(p, c);
    }
  }
  const x = new Float64Array(m);
  for (let r = m - 1; r >= 0; r--) {
    let sum = at(r, m);
    for (let c = r + 1; c < m; c++) sum -= at(r, c) * (x[c] as number);
    x[r] = sum / at(r, r);
  }
  return x;
}
