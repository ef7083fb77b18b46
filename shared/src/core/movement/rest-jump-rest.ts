import { type Movement } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';
import { wayOf, zigZag } from './zig-zag.js';

/** Jumps whose size is kept for the histogram. */
const sizesKept = 500;

/**
 * Jumps of a sticking stem: it rests, moves at once by more than the demand asked for meanwhile, and rests again.
 *
 * A dead band also rests and then moves, but only as far as demand pushes it; hence the jump must be at least
 * `jumpDemandRatio` times the demand's own change over the same samples.
 *
 * @param usable 1 where the valve was in service
 * @returns a refusal without position and demand, or where either was sampled too slowly to see a jump
 * Source: methods.md §6.4
 */
export function restJumpRest(prepared: Prepared, usable: Uint8Array, limits: Limits): Movement['jumps'] {
  const rules = limits.movement;
  const { position: x, demand: u, step } = prepared;
  if (x === null) return cannotJudge('demand-only');
  if (u === null) return cannotJudge('no-demand');
  const spacing = Math.max(prepared.spacing.travel, prepared.spacing.demand ?? 0, step);
  if (spacing > rules.jumpScan * 1.01)
    return cannotJudge('sampled-too-slowly', { spacing, needed: rules.jumpScan });
  const rest = Math.max(2, Math.round(rules.restSeconds / step));
  const within = Math.max(1, Math.round(rules.jumpSeconds / step));
  const sizes: number[] = [];
  let way = 0;
  const last = prepared.count - within - rest;
  for (let i = rest; i < last; i++) {
    // most samples fail here: nothing moved
    if (!(Math.abs((x[i + within] as number) - (x[i] as number)) >= rules.jumpTravel)) continue;
    if (usable[i] !== 1 || usable[i + within + rest] !== 1) continue;
    if (!rests(x, i - rest, i, rules.restTravel)) continue;
    if (!rests(x, i + within, i + within + rest, rules.restTravel)) continue;
    const jump = meanOf(x, i + within, i + within + rest) - meanOf(x, i - rest, i);
    const asked = (u[i + within] as number) - (u[i] as number);
    if (!(Math.abs(jump) >= rules.jumpTravel) || !(Math.abs(jump) >= rules.jumpDemandRatio * Math.abs(asked)))
      continue;
    sizes.push(Math.abs(jump));
    way += Math.abs(jump);
    i += within;
  }
  const travelled = wayOf(zigZag(x, usable, rules.jumpZigZag), x);
  return {
    count: sizes.length,
    median: sizes.length > 0 ? median(sizes) : 0,
    share: travelled > 0 ? way / travelled : 0,
    sizes: thinned(sizes),
  };
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
