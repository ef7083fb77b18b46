import { mad } from './mad.js';

/** A level the series kept from one index to before another. */
export interface Segment {
  readonly from: number;
  readonly to: number;
  readonly mean: number;
}

/**
 * Spread of a series that may have steps: scaled MAD of first differences over √2, which one step does not move.
 *
 * @returns NaN below two points
 */
export function differenceSpread(y: ArrayLike<number>): number {
  const differences = Float64Array.from(
    { length: Math.max(0, y.length - 1) },
    (_, i) => (y[i + 1] as number) - (y[i] as number),
  );
  return mad(differences) / Math.SQRT2;
}

/**
 * The division of a series into levels that costs least: squared distance from each level's mean plus a penalty a level.
 *
 * Exact search over all divisions (the problem PELT prunes, Killick et al. 2012): n²/2 steps, meant for up to some 400
 * monthly or weekly points, where pruning saves nothing.
 *
 * @param y in time order, without NaN
 * @param penalty cost of one more level; 3σ² ln n by methods.md §7.3
 * @param least points in a level
 * @returns one segment where the series is shorter than two levels; none where it is empty
 * Source: methods.md §7.3
 */
export function levels(y: ArrayLike<number>, penalty: number, least = 3): readonly Segment[] {
  const n = y.length;
  if (n === 0) return [];
  const sums = new Float64Array(n + 1);
  const squares = new Float64Array(n + 1);
  // about the first value, so that a large offset costs no digits
  const origin = y[0] as number;
  for (let i = 0; i < n; i++) {
    const v = (y[i] as number) - origin;
    sums[i + 1] = (sums[i] as number) + v;
    squares[i + 1] = (squares[i] as number) + v * v;
  }
  const cost = (from: number, to: number) => {
    const sum = (sums[to] as number) - (sums[from] as number);
    return (squares[to] as number) - (squares[from] as number) - (sum * sum) / (to - from);
  };
  const best = new Float64Array(n + 1).fill(Infinity);
  const start = new Int32Array(n + 1);
  best[0] = -penalty;
  for (let to = Math.min(least, n); to <= n; to++)
    for (let from = 0; from <= to - Math.min(least, n); from++) {
      const total = (best[from] as number) + cost(from, to) + penalty;
      if (total < (best[to] as number)) {
        best[to] = total;
        start[to] = from;
      }
    }
  const found: Segment[] = [];
  for (let to = n; to > 0; to = start[to] as number) {
    const from = start[to] as number;
    found.unshift({ from, to, mean: origin + ((sums[to] as number) - (sums[from] as number)) / (to - from) });
  }
  return found;
}

/** A step between two levels: the index of its first point, and its size. */
export interface Step {
  readonly at: number;
  readonly change: number;
}

/**
 * The steps of a monthly or weekly series that count: |step| at least `smallest` and 3σ.
 *
 * @param y in time order, without NaN
 * @param smallest in the unit of y; 0.04 for ln capacity
 * Source: methods.md §7.3
 */
export function stepsOf(y: ArrayLike<number>, smallest: number): readonly Step[] {
  const sigma = differenceSpread(y);
  if (!Number.isFinite(sigma)) return [];
  const segments = levels(y, 3 * sigma ** 2 * Math.log(y.length));
  return segments.slice(1).flatMap((segment, i) => {
    const change = segment.mean - (segments[i] as Segment).mean;
    return Math.abs(change) >= Math.max(smallest, 3 * sigma) ? [{ at: segment.from, change }] : [];
  });
}
