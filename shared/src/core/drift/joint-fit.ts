import { huberWeight } from '../statistics/huber.js';
import { median, medianInPlace } from '../statistics/quantile.js';
import { weightedPolynomial } from '../statistics/regression.js';

/** Windows a drift is worked out from, columns of one length. */
export interface FitWindows {
  readonly time: Float64Array;
  /** relative travel */
  readonly h: Float64Array;
  /** ln of flow coefficient, or of flow */
  readonly L: Float64Array;
}

/** Capacity by segment, with what is left in each window once travel is taken out. */
export interface JointFit {
  /** ln capacity by segment, up to a constant; NaN where the segment shares no travel with the others */
  readonly change: Float64Array;
  /** L less the curve of travel, by window; NaN in travel bins that carry no information */
  readonly rest: Float64Array;
}

/** Spread of a cell that no number of windows takes away: the trim's own ripple, in ln. */
const cellFloor = 0.003;
const huber = 1.345;
const reweightings = 6;
const backfits = 400;
const settled = 1e-7;
const curveDegree = 4;

/**
 * Fits travel and time together, L = curve(h) + change(segment), so that a valve which closes as it wears does not
 * hide its wear in its own curve.
 *
 * The handbook's backfitting of medians stalls where travel and time go together, as they do in a closed loop; here
 * cells of travel bin × segment keep their medians, and the two-way fit on them is weighted and robust (Huber's
 * weights, backfitted until settled). A quartic in h is taken out first so that nothing depends on where in a bin a
 * window lies, and once more after the first change is known.
 *
 * @param segment of each window, −1 where left out
 * @param binWidth % travel
 * @returns segments joined by common travel bins; NaN for those outside the largest joined group
 * Source: methods.md §7.1; Huber 1964; backfitting as in Hastie & Tibshirani 1986
 */
export function jointFit(
  windows: FitWindows,
  segment: Int32Array,
  segments: number,
  binWidth: number,
): JointFit {
  const { h, L } = windows;
  const n = L.length;
  const bin = new Int32Array(n);
  let bins = 0;
  for (let i = 0; i < n; i++) {
    const b = Math.max(0, Math.floor((100 * (h[i] as number)) / binWidth + 1e-9));
    bin[i] = b;
    if (b >= bins) bins = b + 1;
  }
  let change = new Float64Array(segments);
  let level = new Float64Array(bins);
  const smooth = new Float64Array(n);
  for (let pass = 0; pass < 2; pass++) {
    takeCurve(windows, segment, change, smooth);
    const cells = cellsOf(windows, smooth, bin, bins, segment, segments);
    ({ change, level } = twoWay(joined(cells, segments), bins, segments));
  }
  const rest = new Float64Array(n);
  for (let i = 0; i < n; i++)
    rest[i] = (L[i] as number) - (smooth[i] as number) - (level[bin[i] as number] as number);
  return { change, rest };
}

/** The quartic of L on h with the change already known taken out, by window. */
function takeCurve(
  { h, L }: FitWindows,
  segment: Int32Array,
  change: Float64Array,
  smooth: Float64Array,
): void {
  const n = L.length;
  const y = new Float64Array(n);
  const use = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const s = segment[i] as number;
    const m = s < 0 ? NaN : (change[s] as number);
    use[i] = Number.isNaN(m) ? 0 : 1;
    y[i] = (L[i] as number) - (use[i] === 1 ? m : 0);
  }
  for (let degree = curveDegree; degree >= 1; degree--) {
    const curve = weightedPolynomial(h, y, use, degree);
    if (curve === null) continue;
    for (let i = 0; i < n; i++) {
      const t = ((h[i] as number) - curve.centre) / curve.scale;
      let v = 0;
      for (let j = degree; j >= 0; j--) v = v * t + (curve.coefficients[j] as number);
      smooth[i] = v;
    }
    return;
  }
  smooth.fill(median(y));
}

interface Cells {
  readonly count: number;
  readonly bin: Int32Array;
  readonly segment: Int32Array;
  readonly value: Float64Array;
  readonly weight: Float64Array;
}

/** Median of L less its curve in each travel bin × segment, weighted by how many windows stand behind it. */
function cellsOf(
  { L }: FitWindows,
  smooth: Float64Array,
  bin: Int32Array,
  bins: number,
  segment: Int32Array,
  segments: number,
): Cells {
  const n = L.length;
  const begin = new Int32Array(bins * segments + 1);
  const key = (i: number) => (bin[i] as number) * segments + (segment[i] as number);
  for (let i = 0; i < n; i++)
    if ((segment[i] as number) >= 0) begin[key(i) + 1] = (begin[key(i) + 1] as number) + 1;
  for (let k = 0; k < bins * segments; k++) begin[k + 1] = (begin[k + 1] as number) + (begin[k] as number);
  const sorted = new Float64Array(begin[bins * segments] as number);
  const next = begin.slice();
  for (let i = 0; i < n; i++) {
    if ((segment[i] as number) < 0) continue;
    const k = key(i);
    sorted[next[k] as number] = (L[i] as number) - (smooth[i] as number);
    next[k] = (next[k] as number) + 1;
  }
  const ofBin: number[] = [];
  const ofSegment: number[] = [];
  const value: number[] = [];
  const size: number[] = [];
  const away: number[] = [];
  for (let k = 0; k < bins * segments; k++) {
    const from = begin[k] as number;
    const to = begin[k + 1] as number;
    if (to === from) continue;
    const middle = medianInPlace(sorted, from, to);
    ofBin.push(Math.floor(k / segments));
    ofSegment.push(k % segments);
    value.push(middle);
    size.push(to - from);
    for (let i = from; i < to && to - from > 2; i += 1 + ((to - from) >> 4))
      away.push(Math.abs((sorted[i] as number) - middle));
  }
  const spread = away.length > 0 ? 1.4826 * median(away) : 0;
  return {
    count: value.length,
    bin: Int32Array.from(ofBin),
    segment: Int32Array.from(ofSegment),
    value: Float64Array.from(value),
    weight: Float64Array.from(size, (windows) => 1 / ((spread * spread) / windows + cellFloor ** 2)),
  };
}

/** Cells of travel bins seen in two segments or more, in the largest group of segments that share such bins. */
function joined(cells: Cells, segments: number): Cells {
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
function twoWay(
  { count, bin, segment, value, weight }: Cells,
  bins: number,
  segments: number,
): { change: Float64Array<ArrayBuffer>; level: Float64Array<ArrayBuffer> } {
  const level = new Float64Array(bins);
  const change = new Float64Array(segments);
  const robust = weight.slice();
  const away = new Float64Array(count);
  for (let turn = 0; turn < reweightings; turn++) {
    for (let back = 0; back < backfits; back++) {
      averages(count, segment, bin, level, value, robust, change);
      if (averages(count, bin, segment, change, value, robust, level) < settled) break;
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
  const seenBins = new Uint8Array(bins);
  const seenSegments = new Uint8Array(segments);
  for (let c = 0; c < count; c++) {
    seenBins[bin[c] as number] = 1;
    seenSegments[segment[c] as number] = 1;
  }
  return {
    change: change.map((m, s) => (seenSegments[s] === 1 ? m : NaN)),
    level: level.map((g, b) => (seenBins[b] === 1 ? g : NaN)),
  };
}

/** Sets `into[group]` to the weighted mean of value less `other`; returns the largest change made. */
function averages(
  count: number,
  group: Int32Array,
  otherGroup: Int32Array,
  other: Float64Array,
  value: Float64Array,
  weight: Float64Array,
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
    const mean = (sum[g] as number) / (total[g] as number);
    most = Math.max(most, Math.abs(mean - (into[g] as number)));
    into[g] = mean;
  }
  return most;
}
