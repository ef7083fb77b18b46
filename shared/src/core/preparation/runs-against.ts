/** Correlation below which one column plainly falls while the other rises. */
const plainly = -0.8;

/**
 * True where one column falls as the other rises: demand and position of which one is reverse acting.
 *
 * From at most some 4 000 points spread over the record; columns that hardly move (under 5 % of travel) say nothing.
 */
export function runsAgainst(one: Float64Array, other: Float64Array): boolean {
  const stride = Math.max(1, Math.floor(one.length / 4_000));
  let n = 0;
  let [sx, sy, sxx, syy, sxy] = [0, 0, 0, 0, 0];
  for (let i = 0; i < one.length; i += stride) {
    const x = one[i] as number;
    const y = other[i] as number;
    if (Number.isNaN(x + y)) continue;
    n++;
    sx += x;
    sy += y;
    sxx += x * x;
    syy += y * y;
    sxy += x * y;
  }
  const varianceX = sxx / n - (sx / n) ** 2;
  const varianceY = syy / n - (sy / n) ** 2;
  // 5 % of travel end to end is a standard deviation of about 1.5 %
  if (!(varianceX > 2) || !(varianceY > 2)) return false;
  return (sxy / n - (sx / n) * (sy / n)) / Math.sqrt(varianceX * varianceY) < plainly;
}
