import { type Limits } from '../limits.js';
import { medianInPlace } from '../statistics/quantile.js';

/** Slow samples of a split, as columns; the first `count` entries are in use. */
export interface SlowSamples {
  readonly count: number;
  /** % */
  readonly reference: Float32Array;
  readonly response: Float64Array;
  /** how far the reference had come since it turned, % */
  readonly reach: Float32Array;
  /** 1 after an upward run, 0 after a downward one */
  readonly up: Uint8Array;
  /** scratch */
  readonly bin: Int32Array;
  readonly sorted: Float64Array;
}

/** A bin of the reference: median response and mean reference after each direction. */
export interface DirectionBin {
  readonly up: number;
  readonly down: number;
  readonly rUp: number;
  readonly rDown: number;
}

/**
 * Sorts slow samples into bins of the reference, and keeps those with enough of both directions.
 *
 * Bins are `directionBinWidth` wide, and narrower where the valve worked in a short stretch of travel, so that it
 * still gives `directionBinsWanted` (our choice: base load moves a valve by less than three bins of 2 %).
 *
 * @param need samples with a shorter run since the reversal are left out, %
 * @param least samples of each direction
 */
export function directionBins(
  samples: SlowSamples,
  need: number,
  least: number,
  limits: Limits,
): DirectionBin[] {
  const { count, reference, response, reach, up, bin, sorted } = samples;
  const rules = limits.movement;
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < count; i++) {
    if ((reach[i] as number) <= need) continue;
    const r = reference[i] as number;
    if (r < low) low = r;
    if (r > high) high = r;
  }
  if (!(high > low)) return [];
  const width = Math.min(
    rules.directionBinWidth,
    Math.max(rules.directionBinNarrowest, (high - low) / rules.directionBinsWanted),
  );
  const first = Math.floor(low / width);
  const places = 2 * (Math.floor(high / width) - first + 1);
  const begin = new Int32Array(places + 1);
  for (let i = 0; i < count; i++) {
    if ((reach[i] as number) <= need) {
      bin[i] = -1;
      continue;
    }
    const place = 2 * (Math.floor((reference[i] as number) / width) - first) + (up[i] as number);
    bin[i] = place;
    begin[place + 1] = (begin[place + 1] as number) + 1;
  }
  for (let place = 0; place < places; place++)
    begin[place + 1] = (begin[place + 1] as number) + (begin[place] as number);
  const next = begin.slice(0, places);
  const sums = new Float64Array(places);
  for (let i = 0; i < count; i++) {
    const place = bin[i] as number;
    if (place < 0) continue;
    sorted[next[place] as number] = response[i] as number;
    next[place] = (next[place] as number) + 1;
    sums[place] = (sums[place] as number) + (reference[i] as number);
  }
  const bins: DirectionBin[] = [];
  for (let down = 0; down < places; down += 2) {
    const start = begin[down] as number;
    const middle = begin[down + 1] as number;
    const end = begin[down + 2] as number;
    if (middle - start < least || end - middle < least) continue;
    bins.push({
      down: medianInPlace(sorted, start, middle),
      up: medianInPlace(sorted, middle, end),
      rDown: (sums[down] as number) / (middle - start),
      rUp: (sums[down + 1] as number) / (end - middle),
    });
  }
  return bins;
}
