import { type Grid } from './prepared.js';

/** Rules for rebuilding a signal between its stored samples (§1.2). */
export interface RebuildRules {
  /** s: longest time without a stored value that may be bridged whatever the change */
  readonly gap: number;
  /** change of value over a longer time than `gap` above which nothing is bridged */
  readonly gapChange: number;
  /** s: how long the last stored value stands */
  readonly tail: number;
}

/**
 * Straight lines between stored samples, on a grid. A NaN in the signal means "not known from here to the next
 * stored value"; the value before it stands until it.
 *
 * @param time s, strictly ascending
 * @param value same length; NaN where refused
 * @returns one value a grid point, NaN where it is not known
 * Source: methods.md §1.2 (swinging-door archives, Bristol 1990)
 */
export function rebuildLinear(
  time: Float64Array,
  value: Float64Array,
  grid: Grid,
  rules: RebuildRules,
): Float64Array {
  const column = new Float64Array(grid.count);
  const n = time.length;
  const { start, step, count } = grid;
  // grid points a hair before a sample are that sample: sums of steps are not exact
  const near = step * 1e-6;
  let j = -1;
  let from = 0;
  let v0 = NaN;
  let slope = 0;
  let limit = -Infinity;
  let next = n > 0 ? (time[0] as number) - near : Infinity;
  for (let i = 0; i < count; i++) {
    const t = start + i * step;
    if (t >= next) {
      do j++;
      while (j + 1 < n && (time[j + 1] as number) - near <= t);
      from = time[j] as number;
      v0 = value[j] as number;
      slope = 0;
      if (j + 1 < n) {
        next = (time[j + 1] as number) - near;
        const spacing = (time[j + 1] as number) - from;
        const change = (value[j + 1] as number) - v0;
        limit = Infinity;
        if (Number.isNaN(change)) limit = from + rules.gap;
        else if (spacing > rules.gap && Math.abs(change) > rules.gapChange) limit = from;
        else slope = change / spacing;
      } else {
        next = Infinity;
        limit = from + rules.tail;
      }
    }
    column[i] = t <= limit + near ? v0 + slope * (t - from > near ? t - from : 0) : NaN;
  }
  return column;
}

/**
 * The last stored value stands until the next: set points, modes and what is entered by hand (§1.2).
 *
 * @returns one value a grid point, NaN before the first sample and after a refused one
 */
export function rebuildHeld(time: Float64Array, value: Float64Array, grid: Grid): Float64Array {
  const column = new Float64Array(grid.count);
  const near = grid.step * 1e-6;
  let j = -1;
  for (let i = 0; i < grid.count; i++) {
    const t = grid.start + i * grid.step + near;
    while (j + 1 < time.length && (time[j + 1] as number) <= t) j++;
    column[i] = j < 0 ? NaN : (value[j] as number);
  }
  return column;
}
