import { type Series } from '@tailrace/shared/core/series';
import { encodeBlock } from './block-codec.js';

/** Samples in a block at most. */
export const blockSize = 4096;

/** An encoded block with what stands beside it; plain data, so that a worker thread can hand it over. */
export interface SampleBlock {
  readonly fromTime: number;
  readonly toTime: number;
  readonly count: number;
  readonly goodCount: number;
  readonly least: number | null;
  readonly greatest: number | null;
  readonly bytes: Uint8Array;
}

/** Cuts ascending samples into encoded blocks. */
export function blocksOf(series: Series): SampleBlock[] {
  const blocks: SampleBlock[] = [];
  for (let start = 0; start < series.time.length; start += blockSize)
    blocks.push(
      blockOf({
        time: series.time.subarray(start, start + blockSize),
        value: series.value.subarray(start, start + blockSize),
        good: series.good.subarray(start, start + blockSize),
      }),
    );
  return blocks;
}

function blockOf(series: Series): SampleBlock {
  const { time, value, good } = series;
  let goodCount = 0;
  let least = Infinity;
  let greatest = -Infinity;
  for (let i = 0; i < time.length; i++) {
    if (good[i] !== 1) continue;
    goodCount += 1;
    const v = value[i] as number;
    if (v < least) least = v;
    if (v > greatest) greatest = v;
  }
  return {
    fromTime: time[0] as number,
    toTime: time[time.length - 1] as number,
    count: time.length,
    goodCount,
    least: Number.isFinite(least) ? least : null,
    greatest: Number.isFinite(greatest) ? greatest : null,
    bytes: encodeBlock(series),
  };
}
