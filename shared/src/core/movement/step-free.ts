import { type Grid } from '../preparation/prepared.js';
import { madFactor } from '../statistics/mad.js';
import { medianInPlace } from '../statistics/quantile.js';

/** A travel on a grid: NaN, or 0 in `usable`, where it does not count. */
export interface Column extends Grid {
  readonly values: Float64Array;
  /** null: all that is not NaN */
  readonly usable: Uint8Array | null;
}

/** Cells over which the ordinary size of a change is taken: a day of two-minute cells. */
const ordinaryCells = 720;

/**
 * The travel without its steps: means over cells, their changes held at a few spreads of the day's ordinary
 * changes, and summed up again.
 *
 * A set-point step of 20 % is one change of many; held, it is no larger than the rest, and an oscillation of hours
 * and 2 % becomes visible between steps that follow each other faster than its own period (our use of winsorised
 * changes, Huber 1964).
 *
 * @param seconds wished length of a cell
 * @param clip spreads at which a change is held
 */
export function stepFree(column: Column, seconds: number, clip: number): Column {
  const points = Math.max(1, Math.round(seconds / column.step));
  const count = Math.floor(column.count / points);
  const values = new Float64Array(count);
  for (let c = 0; c < count; c++) values[c] = meanOf(column, c * points, (c + 1) * points, points / 2);
  const sizes = new Float64Array(ordinaryCells);
  let level = NaN;
  let before = NaN;
  for (let from = 0; from < count; from += ordinaryCells) {
    const to = Math.min(count, from + ordinaryCells);
    const hold = clip * ordinaryChange(values, from, to, before, sizes);
    for (let c = from; c < to; c++) {
      const v = values[c] as number;
      if (Number.isNaN(v)) continue;
      const change = Number.isNaN(before) ? 0 : v - before;
      level = Number.isNaN(level) ? v : level + Math.min(hold, Math.max(-hold, change));
      before = v;
      values[c] = level;
    }
  }
  return { values, usable: null, start: column.start, step: points * column.step, count };
}

/** Scaled median size of a change; infinite where most cells do not change at all, so that nothing is held. */
function ordinaryChange(
  values: Float64Array,
  from: number,
  to: number,
  before: number,
  sizes: Float64Array,
): number {
  let last = before;
  let n = 0;
  for (let c = from; c < to; c++) {
    const v = values[c] as number;
    if (!Number.isNaN(v - last)) sizes[n++] = Math.abs(v - last);
    last = v;
  }
  const middle = medianInPlace(sizes, 0, n);
  return middle > 0 ? madFactor * middle : Infinity;
}

/** Mean of the points that count; NaN where they are fewer than `least`. */
function meanOf({ values, usable }: Column, from: number, to: number, least: number): number {
  let sum = 0;
  let n = 0;
  for (let i = from; i < to; i++) {
    const v = values[i] as number;
    if (Number.isNaN(v) || (usable !== null && usable[i] !== 1)) continue;
    sum += v;
    n++;
  }
  return n > 0 && n >= least ? sum / n : NaN;
}

/**
 * Means of the cells of one block, gaps bridged by straight lines.
 *
 * @param block filled, one entry a cell
 * @param coverage share of cells that must be known
 * @returns false where too much is missing; the block then holds nothing of use
 */
export function cellsOf(
  column: Column,
  from: number,
  cellPoints: number,
  coverage: number,
  block: Float64Array,
): boolean {
  const cells = block.length;
  const mostMissing = (1 - coverage) * cells;
  let missing = 0;
  let last = -1;
  for (let c = 0; c < cells; c++) {
    const value = meanOf(column, from + c * cellPoints, from + (c + 1) * cellPoints, 1);
    if (Number.isNaN(value)) {
      if (++missing > mostMissing) return false;
      continue;
    }
    bridge(block, last, c, value);
    block[c] = value;
    last = c;
  }
  if (last < 0) return false;
  bridge(block, last, cells, block[last] as number);
  return true;
}

/** Fills the cells between `last` (−1: before the first known) and `next` on a straight line to `value`. */
function bridge(block: Float64Array, last: number, next: number, value: number): void {
  const start = last < 0 ? value : (block[last] as number);
  for (let c = last + 1; c < next; c++) block[c] = start + ((value - start) * (c - last)) / (next - last);
}
