import { type Limits } from '../limits.js';
import { type Grid } from '../preparation/prepared.js';

/** How a column is cut for one octave of periods, times in s. */
export interface BlockPlan {
  /** grid points averaged into one cell */
  readonly cellPoints: number;
  /** length of a cell, s */
  readonly cell: number;
  /** cells in a block */
  readonly cells: number;
  /** grid points from the start of a block to the start of the next */
  readonly stride: number;
  /** blocks that do not overlap */
  readonly apart: number;
  readonly shortest: number;
  readonly longest: number;
}

/** Cells in the shortest period of an octave. */
export const cellsPerPeriod = 8;
/** An octave reaches this much beyond both ends, so that no period falls between two. */
const slack = 1.08;
/** Up to this many blocks they overlap by half. */
const fewBlocks = 24;
/** Of more than this many, evenly spread ones are looked at: their share is then known to 2 %. */
const manyBlocks = 600;

/**
 * The octaves of periods a column can show, each with blocks of `blockCycles` of its longest period; the last is
 * cut short where the record does not hold `leastBlocks` of them.
 *
 * The handbook's blocks of 1, 6 and 24 h miss periods of an hour and more, which then have too few cycles in a
 * block. Blocks that follow the period keep the ten cycles its test needs at every period and every pace.
 *
 * @param range shortest and longest period wanted, s
 * @returns none where the record is too short
 * Source: the ten cycles of Thornhill, Huang & Zhang 2003; methods.md §6.2
 */
export function blockPlans(
  { step, count }: Grid,
  range: { readonly shortest: number; readonly longest: number },
  limits: Limits,
): BlockPlan[] {
  const rules = limits.movement;
  const held = Math.min(range.longest, (count * step) / (rules.leastBlocks * rules.blockCycles));
  const plans: BlockPlan[] = [];
  for (let shortest = range.shortest; shortest < held;) {
    // below eight points a period the octave ends where there are eight, so that a cell is one point
    const eight = cellsPerPeriod * step;
    const longest = Math.min(held, shortest < eight ? Math.max(1.2 * shortest, eight) : 2 * shortest);
    const cellPoints = Math.max(1, Math.floor(shortest / eight + 1e-6));
    const cells = Math.floor((rules.blockCycles * longest) / (cellPoints * step) + 1e-6);
    const points = cells * cellPoints;
    const apart = Math.floor(count / points);
    plans.push({
      cellPoints,
      cell: cellPoints * step,
      cells,
      stride: apart <= fewBlocks ? Math.max(1, points >> 1) : points * Math.ceil(apart / manyBlocks),
      apart,
      shortest: plans.length === 0 ? shortest : shortest / slack,
      longest: longest * slack,
    });
    shortest = longest;
  }
  return plans.filter((plan) => plan.apart >= rules.leastBlocks && plan.cells >= 2 * cellsPerPeriod);
}
