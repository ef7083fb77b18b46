import { type Movement } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge } from '../reasons.js';
import { mad } from '../statistics/mad.js';
import { median } from '../statistics/quantile.js';
import { wayOf, zigZag } from './zig-zag.js';

/** Jumps whose size is kept for the histogram. */
const sizesKept = 500;
/** Standard error of a median against that of a mean. */
const medianFactor = 1.2533;

/**
 * Jumps of a sticking stem: it rests, moves at once by more than the demand asked for meanwhile, and rests again.
 *
 * A dead band also rests and then moves, but only as far as demand pushes it; hence the jump must be at least
 * `jumpDemandRatio` times the demand's own change over the same samples.
 *
 * @param usable 1 where the valve was in service
 * @returns a refusal without position and demand, or where the position was sampled too slowly to see a jump
 * Source: methods.md §6.4
 */
export function restJumpRest(prepared: Prepared, usable: Uint8Array, limits: Limits): Movement['jumps'] {
  const rules = limits.movement;
  const { position: x, demand: u, step } = prepared;
  if (x === null) return cannotJudge('demand-only');
  if (u === null) return cannotJudge('no-demand');
  // demand may be slower: between its samples it is a line, and only its change over the jump is asked for
  const spacing = Math.max(prepared.spacing.travel, step);
  if (spacing > rules.jumpScan * 1.01)
    return cannotJudge('sampled-too-slowly', { spacing, needed: rules.jumpScan });
  const rest = Math.max(2, Math.round(rules.restSeconds / step));
  const within = Math.max(1, Math.round(rules.jumpSeconds / step));
  const up: Jumps = { size: [], lag: [] };
  const down: Jumps = { size: [], lag: [] };
  const last = prepared.count - within - rest;
  for (let i = rest; i < last; i++) {
    // most samples fail here: nothing moved
    if (!(Math.abs((x[i + within] as number) - (x[i] as number)) >= rules.jumpTravel)) continue;
    if (usable[i] !== 1 || usable[i + within + rest] !== 1) continue;
    if (!rests(x, i - rest, i, rules.restTravel)) continue;
    if (!rests(x, i + within, i + within + rest, rules.restTravel)) continue;
    const before = meanOf(x, i - rest, i);
    const jump = meanOf(x, i + within, i + within + rest) - before;
    const asked = (u[i + within] as number) - (u[i] as number);
    if (!(Math.abs(jump) >= Math.max(rules.jumpTravel, rules.jumpDemandRatio * Math.abs(asked)))) continue;
    const side = jump > 0 ? up : down;
    side.size.push(Math.abs(jump));
    side.lag.push((u[slipBetween(x, i, i + within)] as number) - before);
    i += within;
  }
  const sizes = [...up.size, ...down.size];
  const way = sizes.reduce((sum, size) => sum + size, 0);
  const travelled = wayOf(zigZag(x, usable, rules.jumpZigZag), x);
  const typical = sizes.length > 0 ? median(sizes) : 0;
  return {
    count: sizes.length,
    median: typical,
    share: travelled > 0 ? way / travelled : 0,
    sizes: thinned(sizes),
    stickBand: stickBand(up, down, typical, rules.jumpsEachWay),
  };
}

interface Jumps {
  readonly size: number[];
  /** demand less position when it slipped */
  readonly lag: number[];
}

/**
 * Dead band plus stick band S, from where the stem slipped: it slips up when demand is fS ahead and down when it is
 * fS behind, so the two lie 2·fS apart, and S = 2·fS − J with J = fS − fD (our reading of the model of He et al. 2007).
 *
 * Unlike the direction split this holds in a limit cycle too, where demand turns as soon as the stem has slipped.
 *
 * @returns null with fewer than `least` jumps in either direction
 */
function stickBand(
  up: Jumps,
  down: Jumps,
  jump: number,
  least: number,
): { value: number; standardError: number } | null {
  if (Math.min(up.lag.length, down.lag.length) < least) return null;
  const error = (lag: readonly number[]) => (medianFactor * mad(lag)) / Math.sqrt(lag.length);
  return {
    value: median(up.lag) - median(down.lag) - jump,
    standardError: Math.hypot(error(up.lag), error(down.lag)),
  };
}

/** The last point before the largest change of x. */
function slipBetween(x: Float64Array, from: number, to: number): number {
  let at = from;
  let most = 0;
  for (let i = from; i < to; i++) {
    const change = Math.abs((x[i + 1] as number) - (x[i] as number));
    if (change <= most) continue;
    most = change;
    at = i;
  }
  return at;
}

/** True where all values from `from` to `to`, both included, lie within `band` of each other. */
function rests(x: Float64Array, from: number, to: number, band: number): boolean {
  let low = Infinity;
  let high = -Infinity;
  for (let i = from; i <= to; i++) {
    const v = x[i] as number;
    if (Number.isNaN(v)) return false;
    if (v < low) low = v;
    if (v > high) high = v;
    if (high - low > band) return false;
  }
  return true;
}

function meanOf(x: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let i = from; i <= to; i++) sum += x[i] as number;
  return sum / (to - from + 1);
}

function thinned(sizes: readonly number[]): number[] {
  const stride = Math.ceil(sizes.length / sizesKept);
  return stride <= 1 ? [...sizes] : sizes.filter((_, i) => i % stride === 0);
}
