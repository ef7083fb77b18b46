import { huberWeight } from '../statistics/huber.js';
import { median } from '../statistics/quantile.js';

/** Medians by travel bin × segment, as columns: only pairs that hold a window. */
export interface Cells {
  readonly count: number;
  readonly bin: Int32Array;
  readonly segment: Int32Array;
  readonly value: Float64Array;
  readonly weight: Float64Array;
}

/** What is added up: a change by segment, a level by travel bin. */
export interface TwoWay {
  readonly change: Float64Array<ArrayBuffer>;
  readonly level: Float64Array<ArrayBuffer>;
}

const huber = 1.345;
const reweightings = 6;
const backfits = 400;
const settled = 1e-6;
/** How far a trim departs from a smooth curve from bin to bin, in ln (methods.md §2.6, u_trim). */
const trimRipple = 0.02;

/** Cells of travel bins seen in two segments or more, in the largest group of segments that share such bins. */
export function joined(cells: Cells, segments: number): Cells {
  const parent = Int32Array.from({ length: segments }, (_, s) => s);
  const root = (s: number): number => {
    let r = s;
    while (parent[r] !== r) r = parent[r] as number;
    parent[s] = r;
    return r;
  };
  const seen = new Map<number, number>();
  const shared = new Set<number>();
  for (let c = 0; c < cells.count; c++) {
    const b = cells.bin[c] as number;
    const s = cells.segment[c] as number;
    const before = seen.get(b);
    if (before === undefined) seen.set(b, s);
    else {
      shared.add(b);
      parent[root(s)] = root(before);
    }
  }
  const mass = new Map<number, number>();
  for (let c = 0; c < cells.count; c++) {
    if (!shared.has(cells.bin[c] as number)) continue;
    const r = root(cells.segment[c] as number);
    mass.set(r, (mass.get(r) ?? 0) + (cells.weight[c] as number));
  }
  let largest = -1;
  for (const [r, m] of mass) if (largest < 0 || m > (mass.get(largest) ?? 0)) largest = r;
  const kept: number[] = [];
  for (let c = 0; c < cells.count; c++)
    if (shared.has(cells.bin[c] as number) && root(cells.segment[c] as number) === largest) kept.push(c);
  return {
    count: kept.length,
    bin: Int32Array.from(kept, (c) => cells.bin[c] as number),
    segment: Int32Array.from(kept, (c) => cells.segment[c] as number),
    value: Float64Array.from(kept, (c) => cells.value[c] as number),
    weight: Float64Array.from(kept, (c) => cells.weight[c] as number),
  };
}

/** Robust weighted two-way fit value = level(bin) + change(segment); NaN where a bin or segment has no cell. */
export function twoWay({ count, bin, segment, value, weight }: Cells, start: TwoWay): TwoWay {
  const known = (v: number) => (Number.isNaN(v) ? 0 : v);
  const level = start.level.map(known);
  const change = start.change.map(known);
  const robust = weight.slice();
  const away = new Float64Array(count);
  for (let turn = 0; turn < reweightings; turn++) {
    for (let back = 0; back < backfits; back++) {
      averages(count, segment, bin, level, value, robust, 0, change);
      if (averages(count, bin, segment, change, value, robust, 1 / trimRipple ** 2, level) < settled) break;
    }
    for (let c = 0; c < count; c++) {
      const rest =
        (value[c] as number) - (level[bin[c] as number] as number) - (change[segment[c] as number] as number);
      away[c] = Math.abs(rest) * Math.sqrt(weight[c] as number);
    }
    const scale = Math.max(1, 1.4826 * median(away));
    for (let c = 0; c < count; c++)
      robust[c] = (weight[c] as number) * huberWeight((away[c] as number) / scale, huber);
  }
  const seenBins = new Uint8Array(level.length);
  const seenSegments = new Uint8Array(change.length);
  for (let c = 0; c < count; c++) {
    seenBins[bin[c] as number] = 1;
    seenSegments[segment[c] as number] = 1;
  }
  return {
    change: change.map((m, s) => (seenSegments[s] === 1 ? m : NaN)),
    level: level.map((g, b) => (seenBins[b] === 1 ? g : NaN)),
  };
}

/**
 * Sets `into[group]` to the weighted mean of value less `other`, drawn to zero with the weight `toZero`; returns the
 * largest change made.
 */
function averages(
  count: number,
  group: Int32Array,
  otherGroup: Int32Array,
  other: Float64Array,
  value: Float64Array,
  weight: Float64Array,
  toZero: number,
  into: Float64Array,
): number {
  const sum = new Float64Array(into.length);
  const total = new Float64Array(into.length);
  for (let c = 0; c < count; c++) {
    const g = group[c] as number;
    const w = weight[c] as number;
    sum[g] = (sum[g] as number) + w * ((value[c] as number) - (other[otherGroup[c] as number] as number));
    total[g] = (total[g] as number) + w;
  }
  let most = 0;
  for (let g = 0; g < into.length; g++) {
    if (!((total[g] as number) > 0)) continue;
    const mean = (sum[g] as number) / ((total[g] as number) + toZero);
    most = Math.max(most, Math.abs(mean - (into[g] as number)));
    into[g] = mean;
  }
  return most;
}
