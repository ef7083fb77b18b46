import { type DirectionSplit, type Movement } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { dailyMovement } from './daily-movement.js';
import { directionSplit, slowSamplesFor, type SplitPair } from './direction-split.js';
import { flowResponse } from './flow-response.js';
import { mismatch } from './mismatch.js';
import { oscillationOf } from './oscillation.js';
import { restJumpRest } from './rest-jump-rest.js';
import { type Legs, zigZag } from './zig-zag.js';

/**
 * How the valve moves: how much, whether it hunts, sticks, loses motion, and whether the stem stands where the
 * demand asks.
 *
 * @param windows say whether pressures are measured: the flow response then is the coefficient's, else the flow's
 * @returns each part with its figures, or its own refusal
 * Source: methods.md §6
 */
export function movementOf(
  prepared: Prepared,
  windows: SteadyWindows,
  sheet: DataSheet,
  limits: Limits,
): Movement {
  const rules = limits.movement;
  const usable = pointsIn(prepared, valveState.inService, valveState.frozen | valveState.outage);
  const controlled = pointsIn(
    prepared,
    valveState.inService,
    valveState.frozen | valveState.outage | valveState.manual | valveState.settling,
  );
  const threshold = Math.max(rules.zigZag, 2 * (prepared.resolution.travel ?? 0));
  const legs = zigZag(prepared.travel, usable, threshold);
  const jumps = restJumpRest(prepared, usable, limits);
  const splits = directionSplits(prepared, usable, windows.source === 'measured', sheet, limits);
  return {
    threshold,
    ...dailyMovement(legs, prepared.travel, usable, prepared),
    ...splits,
    jumps,
    oscillation: oscillationOf(prepared, controlled, isSticking(jumps, splits, limits), limits),
    mismatch: mismatch(prepared, usable, limits),
  };
}

function isSticking(
  jumps: Movement['jumps'],
  { demandToPosition }: Pick<Movement, 'demandToPosition'>,
  limits: Limits,
): boolean {
  if ('reason' in jumps) return false;
  const rules = limits.movement;
  const band = jumps.stickBand?.value ?? ('deadBand' in demandToPosition ? demandToPosition.deadBand : 0);
  return (
    jumps.share >= rules.jumpShare &&
    jumps.median >= rules.jumpMedian &&
    band >= limits.findings.kinds.Sticking.raise
  );
}

/** 1 where all bits of `has` and none of `hasNot` are set. */
function pointsIn(prepared: Prepared, has: number, hasNot: number): Uint8Array {
  const { state, count } = prepared;
  const points = new Uint8Array(count);
  const looked = has | hasNot;
  for (let i = 0; i < count; i++) points[i] = ((state[i] as number) & looked) === has ? 1 : 0;
  return points;
}

type Splits = Pick<Movement, 'demandToPosition' | 'positionToFlow' | 'demandToFlow'>;

function directionSplits(
  prepared: Prepared,
  usable: Uint8Array,
  pressures: boolean,
  sheet: DataSheet,
  limits: Limits,
): Splits {
  const { demand, position } = prepared;
  const room = slowSamplesFor(prepared.count);
  const flowLow = limits.windows.flowLowShare * prepared.flowSpan;
  const flowAt = flowResponse(prepared, pressures, sheet, flowLow);
  const legsOf = (reference: Float64Array | null) =>
    reference === null ? null : zigZag(reference, usable, limits.movement.directionThreshold);
  const demandLegs = legsOf(demand);
  const positionLegs = legsOf(position);
  const split = (pair: SplitPair) => directionSplit(pair, prepared, limits, room);
  const noDemand = cannotJudge('no-demand');
  const noPosition = cannotJudge('demand-only');
  const noFlow = cannotJudge('no-flow');
  const toFlow = (reference: Float64Array | null, legs: Legs | null, absent: CannotJudge) => {
    if (flowAt === null) return noFlow;
    return reference === null || legs === null
      ? absent
      : split({ reference, responseAt: flowAt, legs, slope: null });
  };
  return {
    demandToPosition:
      demand === null || demandLegs === null
        ? noDemand
        : position === null
          ? noPosition
          : larger(
              split(positionOnDemand(demand, position, demandLegs)),
              split(engagedPosition(demand, position, demandLegs, prepared, limits)),
            ),
    positionToFlow: toFlow(position, positionLegs, noPosition),
    demandToFlow: toFlow(demand, demandLegs, noDemand),
  };
}

function positionOnDemand(demand: Float64Array, position: Float64Array, legs: Legs): SplitPair {
  return { reference: demand, responseAt: (i) => position[i] as number, legs, slope: 1 };
}

/**
 * The same band read where the stem moves: how far demand is ahead of it while it opens, less while it closes, at
 * the same position. Binned by position, because demand stands a whole band apart there. Written as a response of
 * slope 1, position less (demand − position).
 */
function engagedPosition(
  demand: Float64Array,
  position: Float64Array,
  legs: Legs,
  { step }: Prepared,
  limits: Limits,
): SplitPair {
  const rules = limits.movement;
  const back = Math.max(1, Math.round(rules.engagedSeconds / step));
  return {
    reference: demand,
    binnedBy: position,
    responseAt: (i) => 2 * (position[i] as number) - (demand[i] as number),
    legs,
    slope: 1,
    engaged: (i, up) => {
      const moved = (position[i] as number) - (position[i - back] as number);
      return (up ? moved : -moved) >= rules.engagedMove;
    },
  };
}

/**
 * The larger of two readings. A run of demand shorter than the dead band leaves the stem where it was, which the
 * first reading takes for no dead band at all; the second, of samples in which the stem is seen to move, has no
 * such samples, but reads a sticking stem just after its jump, where little of the band is left.
 */
function larger(
  one: DirectionSplit | CannotJudge,
  other: DirectionSplit | CannotJudge,
): DirectionSplit | CannotJudge {
  if ('reason' in one) return other;
  return 'reason' in other || other.deadBand < one.deadBand ? one : other;
}
