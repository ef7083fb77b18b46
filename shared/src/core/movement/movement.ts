import { type DirectionSplit, type Movement } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { dailyMovement } from './daily-movement.js';
import { directionSplit, splitBuffers } from './direction-split.js';
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
  const sticking =
    'count' in jumps &&
    jumps.share >= rules.jumpShare &&
    jumps.median >= rules.jumpMedian &&
    'deadBand' in splits.demandToPosition &&
    splits.demandToPosition.deadBand >= limits.findings.kinds.Sticking.raise;
  return {
    threshold,
    ...dailyMovement(legs, prepared.travel, usable, prepared),
    ...splits,
    jumps,
    oscillation: oscillationOf(prepared, controlled, sticking, limits),
    mismatch: mismatch(prepared, usable, limits),
  };
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
  const buffers = splitBuffers(prepared.count);
  const flowLow = limits.windows.flowLowShare * prepared.flowSpan;
  const response = flowResponse(prepared, pressures, sheet, flowLow);
  const legsOf = (reference: Float64Array | null) =>
    reference === null ? null : zigZag(reference, usable, limits.movement.directionThreshold);
  const demandLegs = legsOf(demand);
  const positionLegs = legsOf(position);
  const split = (reference: Float64Array, legs: Legs, y: Float64Array): DirectionSplit | CannotJudge =>
    directionSplit({ reference, response: y, legs }, prepared, limits, buffers);
  const noDemand = cannotJudge('no-demand');
  const noPosition = cannotJudge('demand-only');
  const noFlow = cannotJudge('no-flow');
  return {
    demandToPosition:
      demandLegs === null || demand === null
        ? noDemand
        : position === null
          ? noPosition
          : split(demand, demandLegs, position),
    positionToFlow:
      response === null
        ? noFlow
        : positionLegs === null || position === null
          ? noPosition
          : split(position, positionLegs, response),
    demandToFlow:
      response === null
        ? noFlow
        : demandLegs === null || demand === null
          ? noDemand
          : split(demand, demandLegs, response),
  };
}
