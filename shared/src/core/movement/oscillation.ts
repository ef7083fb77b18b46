import { type Oscillation } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';
import { BlockSpectrum } from './block-spectrum.js';
import { type BlockPlan, blockPlans, cellsPerPeriod } from './blocks.js';
import { isDayCycle } from './day-cycle.js';
import { cellsOf, type Column, stepFree } from './step-free.js';
import { type OscillatingBlock } from './oscillating-block.js';
import { whoseOscillation } from './whose-oscillation.js';

interface Found {
  readonly blocks: readonly OscillatingBlock[];
  readonly judged: number;
  readonly share: number;
  readonly blockSeconds: number;
  /** s per point of the blocks' from and to */
  readonly step: number;
}

/**
 * Hunting: does the travel swing with one period, in how much of the time, how far, and whose swing is it?
 *
 * Each octave of periods is judged by itself; only blocks whose periods agree within `oscillationSpread` count as
 * one oscillation, since noise passed through a band swings too, but with another period each time (our addition).
 * The octave with the largest share speaks. Periods of 16 step-free cells and more are sought in the travel freed of steps.
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
  const rules = limits.movement;
  const scan = Math.max(prepared.spacing.travel, prepared.step);
  const shortest = rules.samplesPerCycle * scan;
  const cell = Math.max(rules.stepFreeCell, 2 * scan);
  const change = Math.max(shortest, 2 * cellsPerPeriod * cell);
  const whole: Column = { ...prepared, values: prepared.travel, usable };
  const freed = stepFree(whole, cell, rules.stepClip);
  const looked = [
    { column: whole, plans: blockPlans(whole, { shortest, longest: change }, limits) },
    { column: freed, plans: blockPlans(freed, { shortest: change, longest: rules.longestPeriod }, limits) },
  ];
  if (looked.every(({ plans }) => plans.length === 0)) return refusal(prepared, scan, limits);
  let best: Found | null = null;
  let judged = 0;
  for (const { column, plans } of looked) {
    for (const plan of plans) {
      const found = lookThrough(column, plan, limits);
      if (found === null) continue;
      judged++;
      if (found.blocks.length === 0 || found.share <= (best?.share ?? 0)) continue;
      if (!isDayCycle(freed, median(found.blocks.map((b) => b.period)))) best = found;
    }
  }
  if (judged === 0) return cannotJudge('valve-not-in-service');
  return best === null ? null : describe(prepared, best, sticking, limits);
}

function describe(prepared: Prepared, found: Found, sticking: boolean, limits: Limits): Oscillation {
  const of = (name: 'period' | 'regularity' | 'amplitude') => median(found.blocks.map((b) => b[name]));
  const points = found.step / prepared.step;
  const blocks = found.blocks.map((b) => ({
    ...b,
    from: Math.round(b.from * points),
    to: Math.min(prepared.count, Math.round(b.to * points)),
  }));
  return {
    period: of('period'),
    regularity: of('regularity'),
    amplitude: of('amplitude'),
    share: found.share,
    blocks: found.judged,
    blockHours: found.blockSeconds / 3_600,
    cause: whoseOscillation(prepared, blocks, sticking, limits),
  };
}

function refusal(prepared: Prepared, scan: number, limits: Limits): CannotJudge {
  const rules = limits.movement;
  const neededSeconds = rules.leastBlocks * rules.blockCycles * rules.samplesPerCycle * scan;
  return cannotJudge('record-too-short', { seconds: prepared.count * prepared.step, neededSeconds });
}

/** Every block of one octave; null where fewer than the least were complete. */
function lookThrough(column: Column, plan: BlockPlan, limits: Limits): Found | null {
  const rules = limits.movement;
  const spectrum = new BlockSpectrum(plan.cells, {
    shortest: plan.shortest / plan.cell,
    longest: plan.longest / plan.cell,
    amplitude: rules.oscillationAmplitude,
    regularity: rules.regularity,
    first: rules.oscillationFirst,
    third: rules.oscillationThird,
    clip: rules.stepClip,
  });
  const block = new Float64Array(plan.cells);
  const oscillating: OscillatingBlock[] = [];
  const points = plan.cells * plan.cellPoints;
  let judged = 0;
  for (let from = 0; from + points <= column.count; from += plan.stride) {
    if (!cellsOf(column, from, plan.cellPoints, rules.blockCoverage, block)) continue;
    judged++;
    const found = spectrum.find(block);
    if (found !== null)
      oscillating.push({ ...found, from, to: from + points, period: found.period * plan.cell });
  }
  // overlapping blocks count by what they cover, spread ones each by itself
  const covered = judged * Math.min(plan.stride, points) + Math.max(0, points - plan.stride);
  if (covered < rules.leastBlocks * points) return null;
  const blocks = samePeriod(oscillating, rules.oscillationSpread);
  return {
    blocks,
    judged,
    share: blocks.length / judged,
    blockSeconds: plan.cells * plan.cell,
    step: column.step,
  };
}

/** The largest group of blocks whose periods lie within the ratio of each other. */
function samePeriod(blocks: readonly OscillatingBlock[], ratio: number): OscillatingBlock[] {
  const sorted = [...blocks].sort((a, b) => a.period - b.period);
  let best = 0;
  let bestFrom = 0;
  for (let from = 0, to = 0; from < sorted.length; from++) {
    const longest = ratio * (sorted[from] as OscillatingBlock).period;
    while (to < sorted.length && (sorted[to] as OscillatingBlock).period <= longest) to++;
    if (to - from > best) {
      best = to - from;
      bestFrom = from;
    }
  }
  return sorted.slice(bestFrom, bestFrom + best);
}
