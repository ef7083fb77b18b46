import { type Oscillation } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';
import { BlockSpectrum } from './block-spectrum.js';
import { type BlockPlan, blockPlans } from './blocks.js';
import { isDayCycle } from './day-cycle.js';
import { whoseOscillation } from './whose-oscillation.js';

/** A block in which the travel oscillates: grid points from…to, period in s. */
export interface OscillatingBlock {
  readonly from: number;
  readonly to: number;
  readonly period: number;
  readonly regularity: number;
  readonly amplitude: number;
}

interface Found {
  readonly plan: BlockPlan;
  readonly judged: number;
  readonly blocks: readonly OscillatingBlock[];
  readonly share: number;
}

/**
 * Hunting: does the travel swing with one period, in how much of the time, how far, and whose swing is it?
 *
 * Each block length is judged by itself; only blocks whose periods agree within `oscillationSpread` count as one
 * oscillation, since noise passed through a band swings too, but with another period each time (our addition).
 * The block length with the largest share speaks.
 *
 * @param usable 1 where the valve was in service and not held by hand
 * @param sticking whether the stem jumps (§6.4): then the valve is the cause
 * @returns null where it does not oscillate; a refusal where nothing of the record could show it
 * Source: Thornhill, Huang & Zhang 2003; methods.md §6.2
 */
export function oscillationOf(
  prepared: Prepared,
  usable: Uint8Array,
  sticking: boolean,
  limits: Limits,
): Oscillation | CannotJudge | null {
  const plans = blockPlans(prepared, limits);
  if (plans.length === 0) return refusal(prepared, limits);
  let best: Found | null = null;
  let judged = 0;
  for (const plan of plans) {
    const found = lookThrough(prepared, usable, plan, limits);
    if (found === null) continue;
    judged++;
    if (found.blocks.length === 0 || (best !== null && found.share <= best.share)) continue;
    if (isDayCycle(prepared, usable, median(found.blocks.map((b) => b.period)))) continue;
    best = found;
  }
  if (judged === 0) return cannotJudge('valve-not-in-service');
  if (best === null) return null;
  const of = (name: 'period' | 'regularity' | 'amplitude') => median(best.blocks.map((b) => b[name]));
  return {
    period: of('period'),
    regularity: of('regularity'),
    amplitude: of('amplitude'),
    share: best.share,
    blocks: best.judged,
    blockHours: best.plan.seconds / 3_600,
    cause: whoseOscillation(prepared, best.blocks, sticking, limits),
  };
}

function refusal(prepared: Prepared, limits: Limits): CannotJudge {
  const rules = limits.movement;
  const scan = Math.max(prepared.spacing.travel, prepared.step);
  const seconds = prepared.count * prepared.step;
  const neededSeconds = rules.leastBlocks * rules.blockCycles * rules.samplesPerCycle * scan;
  return seconds < neededSeconds
    ? cannotJudge('record-too-short', { seconds, neededSeconds })
    : cannotJudge('sampled-too-slowly', { spacing: scan });
}

/** Every block of one length; null where fewer than the least were complete. */
function lookThrough(prepared: Prepared, usable: Uint8Array, plan: BlockPlan, limits: Limits): Found | null {
  const rules = limits.movement;
  const spectrum = new BlockSpectrum(plan.cells);
  const block = new Float64Array(plan.cells);
  const asked = {
    shortest: plan.shortest / plan.cell,
    longest: plan.longest / plan.cell,
    amplitude: rules.oscillationAmplitude,
    regularity: rules.regularity,
    first: rules.oscillationFirst,
    third: rules.oscillationThird,
  };
  const oscillating: OscillatingBlock[] = [];
  let judged = 0;
  for (let b = 0; b < plan.blocks; b++) {
    const from = b * plan.stride;
    if (!cellsOf(prepared.travel, usable, from, plan, rules.blockCoverage, block)) continue;
    judged++;
    const found = spectrum.find(block, asked);
    if (found === null) continue;
    oscillating.push({
      from,
      to: from + plan.cells * plan.cellPoints,
      period: found.period * plan.cell,
      regularity: found.regularity,
      amplitude: found.amplitude,
    });
  }
  const apart = Math.max(1, Math.round((plan.cells * plan.cellPoints) / plan.stride));
  if (judged < rules.leastBlocks + (rules.leastBlocks - 1) * (apart - 1)) return null;
  const together = samePeriod(oscillating, rules.oscillationSpread);
  return { plan, judged, blocks: together, share: together.length / judged };
}

/** The largest group of blocks whose periods lie within the ratio of each other. */
function samePeriod(blocks: readonly OscillatingBlock[], ratio: number): OscillatingBlock[] {
  const sorted = [...blocks].sort((a, b) => a.period - b.period);
  let best = 0;
  let bestFrom = 0;
  for (let from = 0, to = 0; from < sorted.length; from++) {
    while (
      to < sorted.length &&
      (sorted[to] as OscillatingBlock).period <= ratio * (sorted[from] as OscillatingBlock).period
    )
      to++;
    if (to - from > best) {
      best = to - from;
      bestFrom = from;
    }
  }
  return sorted.slice(bestFrom, bestFrom + best);
}

/** Means of the usable points of each cell, gaps bridged by straight lines; false where too much is missing. */
function cellsOf(
  travel: Float64Array,
  usable: Uint8Array,
  from: number,
  plan: BlockPlan,
  coverage: number,
  block: Float64Array,
): boolean {
  const { cells, cellPoints } = plan;
  const fewest = coverage * cells;
  let known = 0;
  let last = -1;
  let i = from;
  for (let c = 0; c < cells; c++) {
    let sum = 0;
    let n = 0;
    for (const end = i + cellPoints; i < end; i++) {
      const v = travel[i] as number;
      if (usable[i] !== 1 || Number.isNaN(v)) continue;
      sum += v;
      n++;
    }
    if (n === 0) {
      if (c + 1 - known > cells - fewest) return false;
      continue;
    }
    const value = sum / n;
    bridge(block, last, c, value);
    block[c] = value;
    last = c;
    known++;
  }
  if (last < 0) return false;
  bridge(block, last, cells, block[last] as number);
  return known >= fewest;
}

/** Fills the cells between `last` (−1: before the first known) and `next` on a straight line to `value`. */
function bridge(block: Float64Array, last: number, next: number, value: number): void {
  const start = last < 0 ? value : (block[last] as number);
  for (let c = last + 1; c < next; c++) block[c] = start + ((value - start) * (c - last)) / (next - last);
}
