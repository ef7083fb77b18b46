import { type DirectionSplit } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Grid } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { mad } from '../statistics/mad.js';
import { median, medianInPlace } from '../statistics/quantile.js';
import { weightedPolynomial } from '../statistics/regression.js';
import { type Legs } from './zig-zag.js';

/** Scratch columns of the splits of one record, reused between them. */
export interface SplitBuffers {
  readonly place: Int32Array;
  readonly reference: Float32Array;
  readonly response: Float64Array;
  readonly sorted: Float64Array;
}

/** What is split: a reference in % (demand or position), what should follow it, and the reference's zig-zag. */
export interface SplitPair {
  readonly reference: Float64Array;
  /** position, or ln of flow coefficient or flow; NaN where not known */
  readonly response: Float64Array;
  readonly legs: Legs;
}

/** Samples a split looks at: more say nothing new, since neighbours 10 s apart repeat each other. */
const looks = 200_000;
const turns = 4;
/** The reference runs from −10 to 110 %. */
const lowest = -10;
const highest = 110;

/** Buffers for the splits of a record of this many grid points. */
export function splitBuffers(count: number): SplitBuffers {
  const length = Math.min(count, 2 * looks);
  return {
    place: new Int32Array(length),
    reference: new Float32Array(length),
    response: new Float64Array(length),
    sorted: new Float64Array(length),
  };
}

/**
 * Dead band between a reference and its response: at the same reference, how much further the reference must go
 * after a reversal before the response is the same.
 *
 * Only slow samples count: a lag makes a loop that grows with speed, a dead band does not. A sample counts only
 * where the reference is at its furthest point since the reversal (within `directionRetreat`): once it has come
 * back a little the response rests inside its band, which read 5 to 15 % too small in the handbook's trial.
 *
 * @returns dead band in % of the reference; a refusal where too few slow samples follow both directions
 * Source: methods.md §6.3
 */
export function directionSplit(
  pair: SplitPair,
  grid: Grid,
  limits: Limits,
  buffers: SplitBuffers,
): DirectionSplit | CannotJudge {
  const rules = limits.movement;
  let need = rules.directionNeed;
  let best: DirectionSplit | CannotJudge = cannotJudge('one-direction-only');
  for (let turn = 0; turn < turns; turn++) {
    const split = splitAt(pair, grid, limits, buffers, need);
    // a longer run asked for than the record has: the last answer stands, a little small
    if ('judged' in split) return turn === 0 ? split : best;
    best = split;
    const wanted = Math.max(rules.directionNeed, rules.directionNeedRatio * split.deadBand);
    if (wanted <= need * 1.02) break;
    need = wanted;
  }
  return best;
}

function splitAt(
  { reference, response, legs }: SplitPair,
  grid: Grid,
  limits: Limits,
  buffers: SplitBuffers,
  need: number,
): DirectionSplit | CannotJudge {
  const rules = limits.movement;
  const binCount = Math.ceil((highest - lowest) / rules.directionBinWidth);
  const back = Math.max(1, Math.round(rules.slowSeconds / grid.step));
  const stride = Math.max(1, Math.ceil(grid.count / looks));
  const { place, reference: refs, response: resp } = buffers;
  const counts = new Int32Array(2 * binCount);
  let n = 0;
  let seen = 0;
  let slow = 0;
  for (let k = 0; k < legs.count; k++) {
    const from = legs.from[k] as number;
    const to = legs.to[k] as number;
    const up = (legs.direction[k] as number) > 0;
    const pivot = reference[from] as number;
    let furthest = pivot;
    for (let i = from; i <= to; i++) {
      const r = reference[i] as number;
      if (up ? r > furthest : r < furthest) furthest = r;
      if (i % stride !== 0) continue;
      seen++;
      if (!(Math.abs(r - (reference[i - back] as number)) <= rules.slowMove)) continue;
      slow++;
      if (Math.abs(furthest - pivot) <= need || Math.abs(furthest - r) > rules.directionRetreat) continue;
      const y = response[i] as number;
      if (!Number.isFinite(y) || r < lowest || r >= highest || n >= place.length) continue;
      const at = 2 * Math.floor((r - lowest) / rules.directionBinWidth) + (up ? 1 : 0);
      place[n] = at;
      refs[n] = r;
      resp[n] = y;
      counts[at] = (counts[at] as number) + 1;
      n++;
    }
  }
  if (seen > 0 && slow < rules.slowShare * seen)
    return cannotJudge('too-few-slow-samples', { share: slow / seen });
  const bins = medians(buffers, n, counts, Math.max(2, Math.ceil(rules.directionBinSamples / stride)));
  if (bins.length < rules.directionBins)
    return cannotJudge('one-direction-only', { bins: bins.length, needed: rules.directionBins });
  return deadBandOf(bins);
}

interface SplitBin {
  readonly up: number;
  readonly down: number;
  readonly rUp: number;
  readonly rDown: number;
}

/** Sorts the kept samples by bin and direction and takes the median response and mean reference of each. */
function medians(
  { place, reference, response, sorted }: SplitBuffers,
  n: number,
  counts: Int32Array,
  least: number,
): SplitBin[] {
  const begin = new Int32Array(counts.length + 1);
  for (let c = 0; c < counts.length; c++) begin[c + 1] = (begin[c] as number) + (counts[c] as number);
  const next = begin.slice(0, counts.length);
  const sums = new Float64Array(counts.length);
  for (let i = 0; i < n; i++) {
    const c = place[i] as number;
    sorted[next[c] as number] = response[i] as number;
    next[c] = (next[c] as number) + 1;
    sums[c] = (sums[c] as number) + (reference[i] as number);
  }
  const bins: SplitBin[] = [];
  for (let down = 0; down < counts.length; down += 2) {
    const up = down + 1;
    const nDown = counts[down] as number;
    const nUp = counts[up] as number;
    if (nDown < least || nUp < least) continue;
    bins.push({
      down: medianInPlace(sorted, begin[down] as number, begin[up] as number),
      up: medianInPlace(sorted, begin[up] as number, begin[up + 1] as number),
      rDown: (sums[down] as number) / nDown,
      rUp: (sums[up] as number) / nUp,
    });
  }
  return bins;
}

/** Smallest share of the median slope a local slope may have: a flat end must not blow its bin up. */
const slopeFloor = 0.3;
/** Smallest spread between bins believed, % (§6.3). */
const spreadFloor = 0.15;
/** Standard error of a median against that of a mean. */
const medianFactor = 1.2533;

function deadBandOf(bins: readonly SplitBin[]): DirectionSplit | CannotJudge {
  const at = bins.map((b) => (b.rUp + b.rDown) / 2);
  const middle = bins.map((b) => (b.up + b.down) / 2);
  const ones = bins.map(() => 1);
  const curve = weightedPolynomial(at, middle, ones, 2);
  if (curve === null) return cannotJudge('one-direction-only', { bins: bins.length });
  const slopes = at.map((r) => {
    const t = (r - curve.centre) / curve.scale;
    return ((curve.coefficients[1] as number) + 2 * (curve.coefficients[2] as number) * t) / curve.scale;
  });
  const typical = median(slopes);
  if (!(Math.abs(typical) > 0)) return cannotJudge('one-direction-only', { bins: bins.length });
  const sign = Math.sign(typical);
  const bands = bins.map((b, j) => {
    const slope = sign * Math.max(sign * (slopes[j] as number), slopeFloor * Math.abs(typical));
    return (b.down - b.up - slope * (b.rDown - b.rUp)) / slope;
  });
  return {
    deadBand: median(bands),
    standardError: (medianFactor * Math.max(mad(bands), spreadFloor)) / Math.sqrt(bins.length),
    bins: bins.length,
    lines: bins.map((b, j) => {
      const slope = slopes[j] as number;
      const r = at[j] as number;
      return { at: r, up: b.up + slope * (r - b.rUp), down: b.down + slope * (r - b.rDown) };
    }),
  };
}
