import { median, medianInPlace } from '../statistics/quantile.js';
import { weightedPolynomial } from '../statistics/regression.js';
import { type Cells, joined, twoWay } from './two-way-fit.js';

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
const curveDegree = 4;
const passes = 12;
const passSettled = 5e-4;

/**
 * Fits travel and time together, L = curve(h) + change(segment), so that a valve which closes as it wears does not
 * hide its wear in its own curve.
 *
 * The handbook's backfitting of medians stalls where travel and time go together, as they do in a closed loop; here
 * cells of travel bin × segment keep their medians, and the two-way fit on them is weighted and robust (Huber's
 * weights, backfitted until settled). A quartic in h is taken out first so that nothing depends on where in a bin a
 * window lies, and again as the change becomes known. What a bin may differ from the quartic is drawn to zero as a
 * trim's ripple is: in a short record each segment sees a bin or two, and free bins would let errors add up along
 * the chain of segments.
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
  for (let pass = 0; pass < passes; pass++) {
    takeCurve(windows, segment, change, smooth);
    const cells = cellsOf(windows, smooth, bin, bins, segment, segments);
    const before = change;
    ({ change, level } = twoWay(joined(cells, segments), { change, level }));
    if (pass > 0 && largestMove(before, change) < passSettled) break;
  }
  const rest = new Float64Array(n);
  for (let i = 0; i < n; i++)
    rest[i] = (L[i] as number) - (smooth[i] as number) - (level[bin[i] as number] as number);
  return { change, rest };
}

function largestMove(before: Float64Array, after: Float64Array): number {
  let most = 0;
  const shift = median(after.map((v, i) => v - (before[i] as number)));
  for (let s = 0; s < after.length; s++) {
    const moved = Math.abs((after[s] as number) - (before[s] as number) - shift);
    if (moved > most) most = moved;
  }
  return most;
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
