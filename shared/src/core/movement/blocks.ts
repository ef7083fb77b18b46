import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';

/** How a record is cut for one range of periods, times in s. */
export interface BlockPlan {
  readonly seconds: number;
  /** grid points averaged into one cell */
  readonly cellPoints: number;
  /** length of a cell, s */
  readonly cell: number;
  /** cells in a block */
  readonly cells: number;
  /** grid points from the start of a block to the start of the next */
  readonly stride: number;
  readonly blocks: number;
  readonly shortest: number;
  readonly longest: number;
}

/** The shortest period of a block length reaches well into the range of the next shorter one. */
const periodRange = 12;
const cellsPerShortest = 8;
const mostCells = 8_192;
/** Up to this many blocks they overlap by half. */
const fewBlocks = 24;

/**
 * Block lengths that fit a record, each with the range of periods it is asked about: from
 * `samplesPerCycle` scans to a `blockCycles`th of the block.
 *
 * Blocks of 1, 6 and 24 h see periods up to 2.4 h. A period of 6 h needs ten cycles as well, so blocks of 96 h are
 * added, and in records shorter than three of those one of a third of the record (our choice: the same test of
 * Thornhill, Huang & Zhang 2003 on a longer block, rather than a weaker test on a short one).
 *
 * @returns none where the record is too short, or sampled too slowly for the blocks that fit
 * Source: methods.md §6.2
 */
export function blockPlans(prepared: Prepared, limits: Limits): BlockPlan[] {
  const rules = limits.movement;
  const record = prepared.count * prepared.step;
  const scan = Math.max(prepared.spacing.travel, prepared.step);
  const wanted = rules.blockHours.map((hours) => 3_600 * hours);
  const fit = wanted.filter((seconds) => seconds * rules.leastBlocks <= record * 1.001);
  const third = record / rules.leastBlocks;
  const longest = Math.max(...wanted);
  if (third < longest && third > 1.5 * (fit.at(-1) ?? 0)) fit.push(third);
  return fit
    .map((seconds) => planOf(prepared, limits, seconds, scan))
    .filter((plan) => plan.longest >= plan.shortest && plan.blocks >= rules.leastBlocks);
}

function planOf(prepared: Prepared, limits: Limits, seconds: number, scan: number): BlockPlan {
  const rules = limits.movement;
  const { step, count } = prepared;
  const longest = (1.05 * seconds) / rules.blockCycles;
  const shortest = Math.max(rules.samplesPerCycle * scan, longest / periodRange / 2);
  const points = Math.floor(seconds / step);
  const cellPoints = Math.max(
    1,
    Math.floor(shortest / cellsPerShortest / step),
    Math.ceil(points / mostCells),
  );
  const cells = Math.floor(points / cellPoints);
  const apart = Math.floor(count / Math.max(1, points));
  const stride = apart <= fewBlocks ? Math.max(1, points >> 1) : points;
  const blocks = count < points ? 0 : Math.floor((count - cells * cellPoints) / stride) + 1;
  return { seconds, cellPoints, cell: cellPoints * step, cells, stride, blocks, shortest, longest };
}
