/**
 * Shape-preserving piecewise cubic through points: it rises where the points rise and overshoots nowhere
 * (Fritsch & Carlson 1980, with the harmonic-mean slopes of Fritsch & Butland 1984).
 *
 * @param x strictly ascending, at least one
 * @param y same length
 * @returns a function; outside the points it holds the end values; with one point it is constant
 */
export function pchip(x: ArrayLike<number>, y: ArrayLike<number>): (at: number) => number {
  const n = x.length;
  const X = Float64Array.from(x);
  const Y = Float64Array.from(y);
  if (n === 1) return () => Y[0] as number;
  const width = (i: number) => (X[i + 1] as number) - (X[i] as number);
  const secant = (i: number) => ((Y[i + 1] as number) - (Y[i] as number)) / width(i);
  const slope = new Float64Array(n);
  for (let i = 1; i < n - 1; i++) {
    const before = secant(i - 1);
    const after = secant(i);
    if (before * after <= 0) continue;
    const w1 = 2 * width(i) + width(i - 1);
    const w2 = width(i) + 2 * width(i - 1);
    slope[i] = (w1 + w2) / (w1 / before + w2 / after);
  }
  slope[0] = n === 2 ? secant(0) : endSlope(width(0), width(1), secant(0), secant(1));
  slope[n - 1] = n === 2 ? secant(0) : endSlope(width(n - 2), width(n - 3), secant(n - 2), secant(n - 3));

  return (at) => {
    if (!(at > (X[0] as number))) return Number.isNaN(at) ? NaN : (Y[0] as number);
    if (at >= (X[n - 1] as number)) return Y[n - 1] as number;
    let low = 0;
    let high = n - 1;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if ((X[middle] as number) <= at) low = middle;
      else high = middle;
    }
    const w = width(low);
    const t = (at - (X[low] as number)) / w;
    const s = 1 - t;
    return (
      (Y[low] as number) * (1 + 2 * t) * s * s +
      (slope[low] as number) * w * t * s * s +
      (Y[high] as number) * t * t * (3 - 2 * t) -
      (slope[high] as number) * w * t * t * s
    );
  };
}

/** One-sided three-point slope, kept from turning the end interval over. */
function endSlope(w0: number, w1: number, d0: number, d1: number): number {
  const slope = ((2 * w0 + w1) * d0 - w0 * d1) / (w0 + w1);
  if (slope * d0 <= 0) return 0;
  return d0 * d1 <= 0 && Math.abs(slope) > 3 * Math.abs(d0) ? 3 * d0 : slope;
}
