import { type SteadyWindows } from '../preparation/steady-windows.js';
import { drawBlocks, numberBlocks } from '../statistics/block-bootstrap.js';
import { madFactor } from '../statistics/mad.js';
import { type TravelBins } from './travel-bins.js';

/** Fewest calendar days that may be the blocks; a shorter record is resampled by slot. */
const fewestDays = 5;

/**
 * The block each window belongs to when days are drawn anew: its calendar day, or its slot where the record has
 * fewer than five days.
 *
 * Source: methods.md §1.10 (block bootstrap, Künsch 1989); the short-record rule is our choice
 */
export function resamplingBlocks(windows: SteadyWindows): {
  readonly block: Int32Array;
  readonly blocks: number;
} {
  const byDay = numberBlocks(windows.day);
  return byDay.blocks >= fewestDays ? byDay : numberBlocks(windows.slot);
}

/**
 * Resampled bins: days are drawn with replacement and each bin's mean of winsorised values recomputed.
 *
 * Bins hold sums by block, so that a resample costs (bins × blocks) and not the windows again. Means are moved
 * so that drawing every block once gives the bin medians back.
 *
 * @param value one value a window
 * @param centre the bins' medians of it
 * @returns a function filling `into` with one resample's bin values; a bin no drawn day visits keeps its median
 * Source: methods.md §3.4
 */
export function dayResamples(
  windows: SteadyWindows,
  bins: TravelBins,
  value: Float64Array,
  centre: Float64Array,
  random: () => number,
): (into: Float64Array) => Float64Array {
  const { block, blocks } = resamplingBlocks(windows);
  const sums = bins.y.map(() => 0);
  const counts = new Float64Array(bins.count);
  const cells = new Map<number, { sum: number; count: number }>();
  const limit = winsorLimits(bins, value, centre);
  for (let k = 0; k < bins.used.length; k++) {
    const i = bins.used[k] as number;
    const b = bins.binOf[k] as number;
    const away = (value[i] as number) - (centre[b] as number);
    const kept = Math.max(-(limit[b] as number), Math.min(limit[b] as number, away));
    sums[b] = (sums[b] as number) + kept;
    counts[b] = (counts[b] as number) + 1;
    const key = b * blocks + (block[i] as number);
    const cell = cells.get(key);
    if (cell === undefined) cells.set(key, { sum: kept, count: 1 });
    else {
      cell.sum += kept;
      cell.count++;
    }
  }
  const packed = [...cells.entries()].map(([key, cell]) => ({
    bin: Math.floor(key / blocks),
    block: key % blocks,
    ...cell,
  }));
  const drawn = new Int32Array(blocks);
  const sum = new Float64Array(bins.count);
  const count = new Float64Array(bins.count);
  return (into) => {
    drawBlocks(blocks, random, drawn);
    sum.fill(0);
    count.fill(0);
    for (const cell of packed) {
      const times = drawn[cell.block] as number;
      if (times === 0) continue;
      sum[cell.bin] = (sum[cell.bin] as number) + times * cell.sum;
      count[cell.bin] = (count[cell.bin] as number) + times * cell.count;
    }
    for (let b = 0; b < bins.count; b++) {
      const n = count[b] as number;
      const moved = n > 0 ? (sum[b] as number) / n - (sums[b] as number) / (counts[b] as number) : 0;
      into[b] = (centre[b] as number) + moved;
    }
    return into;
  };
}

/** Three scaled MADs of each bin's values about its centre. */
function winsorLimits(bins: TravelBins, value: Float64Array, centre: Float64Array): Float64Array {
  const away: number[][] = Array.from({ length: bins.count }, () => []);
  for (let k = 0; k < bins.used.length; k++) {
    const b = bins.binOf[k] as number;
    away[b]?.push(Math.abs((value[bins.used[k] as number] as number) - (centre[b] as number)));
  }
  return Float64Array.from(away, (list) => {
    const sorted = Float64Array.from(list).sort();
    return 3 * madFactor * (sorted[sorted.length >> 1] as number);
  });
}
