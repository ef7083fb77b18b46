import { type DirectionSplit } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Grid } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { type DirectionBin, directionBins, type SlowSamples } from './direction-bins.js';
import { mad } from '../statistics/mad.js';
import { median } from '../statistics/quantile.js';
import { weightedPolynomial } from '../statistics/regression.js';
import { type Legs } from './zig-zag.js';

/** What is split: a reference in % (demand or position), what should follow it, and the reference's zig-zag. */
export interface SplitPair {
  readonly reference: Float64Array;
  /** position, or ln of flow coefficient or flow, at a grid point; NaN where not known */
  readonly responseAt: (i: number) => number;
  readonly legs: Legs;
  /** slope of the response where it is known beforehand (1 for position on demand), else null */
  readonly slope: number | null;
  /** what samples are binned by, %; the reference where absent */
  readonly binnedBy?: Float64Array;
  /** whether the response is seen to move the reference's way at a grid point; all count where absent */
  readonly engaged?: (i: number, up: boolean) => boolean;
}

/** Samples a split looks at: more say nothing new, since neighbours 10 s apart repeat each other. */
const looks = 200_000;
const turns = 4;
/** Slow is judged over at least this many scans. */
const slowScans = 3;
const looksBack = 6;

/** Room for the samples of a split of a record of this many grid points; reused between its splits. */
export function slowSamplesFor(count: number): SlowSamples {
  const room = Math.min(count, looks + 1);
  return {
    count: 0,
    reference: new Float32Array(room),
    response: new Float64Array(room),
    reach: new Float32Array(room),
    up: new Uint8Array(room),
    bin: new Int32Array(room),
    sorted: new Float64Array(room),
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
  room: SlowSamples,
): DirectionSplit | CannotJudge {
  const rules = limits.movement;
  const stride = Math.max(1, Math.ceil(grid.count / looks));
  const { samples, seen, slow } = slowSamples(pair, grid, stride, limits, room);
  if (seen > 0 && slow < rules.slowShare * seen)
    return cannotJudge('too-few-slow-samples', { share: slow / seen });
  const least = Math.max(2, Math.ceil(rules.directionBinSamples / stride));
  let need = rules.directionNeed;
  let best: DirectionSplit | CannotJudge = cannotJudge('one-direction-only', {
    bins: 0,
    needed: rules.directionBins,
  });
  for (let turn = 0; turn < turns; turn++) {
    const bins = directionBins(samples, need, least, limits);
    // a longer run asked for than the record has: the last answer stands, a little small
    if (bins.length < rules.directionBins) break;
    const split = deadBandOf(bins, pair.slope);
    if (split === null) break;
    best = split;
    const wanted = Math.max(rules.directionNeed, rules.directionNeedRatio * split.deadBand);
    if (wanted <= need * 1.02) break;
    need = wanted;
  }
  if ('reason' in best || pair.slope !== null) return best;
  return { ...best, jitter: jitterOf(pair.reference, grid.count) };
}

/** Second differences looked at for the jitter. */
const jitterLooks = 20_000;

/**
 * How far a reference moves from scan to scan without going anywhere: the median size of its second differences, %.
 *
 * A controller answers its meter's noise, and at the furthest point of a run upwards the meter just read low: such
 * a loop shows a band that is not there, and crosses one that is.
 */
function jitterOf(reference: Float64Array, count: number): number {
  const stride = Math.max(1, Math.floor(count / jitterLooks));
  const sizes: number[] = [];
  for (let i = 1; i < count - 1; i += stride) {
    const [a, b, c] = [reference[i - 1] as number, reference[i] as number, reference[i + 1] as number];
    const size = Math.abs(a - 2 * b + c);
    if (!Number.isNaN(size)) sizes.push(size);
  }
  return sizes.length === 0 ? 0 : median(sizes);
}

/** Slow samples at their furthest point, with how far the reference had come since it turned. */
function slowSamples(
  { reference, responseAt, legs, binnedBy = reference, engaged }: SplitPair,
  grid: Grid,
  stride: number,
  limits: Limits,
  room: SlowSamples,
): { samples: SlowSamples; seen: number; slow: number } {
  const rules = limits.movement;
  // at a slow scan a lag is known to half a scan only: the reference must then be slower still
  const back = Math.max(1, Math.round(Math.max(rules.slowSeconds, slowScans * grid.step) / grid.step));
  // looked at between as well: a quick oscillation would pass for rest at its turning points
  const between = Math.max(1, Math.floor(back / looksBack));
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
      if (!isSlow(reference, i, back, between, rules.slowMove)) continue;
      slow++;
      const reach = Math.abs(furthest - pivot);
      if (reach <= rules.directionNeed || Math.abs(furthest - r) > rules.directionRetreat) continue;
      if (engaged !== undefined && !engaged(i, up)) continue;
      const y = responseAt(i);
      const place = binnedBy[i] as number;
      if (!Number.isFinite(y + place) || n >= room.reference.length) continue;
      room.reference[n] = place;
      room.response[n] = y;
      room.reach[n] = reach;
      room.up[n] = up ? 1 : 0;
      n++;
    }
  }
  return { samples: { ...room, count: n }, seen, slow };
}

function isSlow(reference: Float64Array, i: number, back: number, between: number, move: number): boolean {
  const r = reference[i] as number;
  for (let j = i - back; j < i; j += between)
    if (!(Math.abs(r - (reference[j] as number)) <= move)) return false;
  return true;
}

/** Smallest share of the median slope a local slope may have: a flat end must not blow its bin up. */
const slopeFloor = 0.3;
/** Smallest spread between bins believed, % (§6.3). */
const spreadFloor = 0.15;
/** Standard error of a median against that of a mean. */
const medianFactor = 1.2533;

/** Median over the bins of (falling less rising response) in units of the reference; null where no slope shows. */
function deadBandOf(bins: readonly DirectionBin[], known: number | null): DirectionSplit | null {
  const at = bins.map((b) => (b.rUp + b.rDown) / 2);
  const slopes = known === null ? localSlopes(bins, at) : at.map(() => known);
  if (slopes === null) return null;
  const typical = median(slopes);
  if (!(Math.abs(typical) > 0)) return null;
  const sign = Math.sign(typical);
  const held = slopes.map((slope) => sign * Math.max(sign * slope, slopeFloor * Math.abs(typical)));
  const bands = bins.map((b, j) => {
    const slope = held[j] as number;
    return (b.down - b.up - slope * (b.rDown - b.rUp)) / slope;
  });
  return {
    deadBand: median(bands),
    standardError: (medianFactor * Math.max(mad(bands), spreadFloor)) / Math.sqrt(bins.length),
    bins: bins.length,
    lines: bins.map((b, j) => {
      const slope = held[j] as number;
      const r = at[j] as number;
      return { at: r, up: b.up + slope * (r - b.rUp), down: b.down + slope * (r - b.rDown) };
    }),
  };
}

/** Slopes of a quadratic through the mid-points of the bins. */
function localSlopes(bins: readonly DirectionBin[], at: readonly number[]): number[] | null {
  const middle = bins.map((b) => (b.up + b.down) / 2);
  const curve = weightedPolynomial(
    at,
    middle,
    at.map(() => 1),
    2,
  );
  if (curve === null) return null;
  return at.map((r) => {
    const t = (r - curve.centre) / curve.scale;
    return ((curve.coefficients[1] as number) + 2 * (curve.coefficients[2] as number) * t) / curve.scale;
  });
}
