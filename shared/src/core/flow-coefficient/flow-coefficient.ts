import { type DataSheet } from '../data-sheet.js';
import { fittingLosses } from './fittings.js';
import { type FlowCoefficient, type FlowConditions, noCoefficient } from './flow-conditions.js';
import { gasCoefficient } from './gas.js';
import { liquidCoefficient } from './liquid.js';

/**
 * The flow coefficient a valve shows in one steady window: what it passed, for the pressure drop it had.
 *
 * Where the valve is choked the coefficient is worked out with the choked drop, and it rests on FL or xT; where flow
 * is not turbulent it includes the standard's FR. Both are said beside the number, so that callers can leave such
 * windows out of a characteristic. What is assumed where the sheet is silent is listed at `liquidCoefficient` and
 * `gasCoefficient`.
 *
 * @param chokedFrom share of the choked drop from which a window counts as choked; 0.95 by methods.md §2.1
 * @returns coefficient NaN where the fluid is unknown, flow has no unit or is negative, or P1 is not above P2 (absolute, not negative)
 * Source: IEC 60534-2-1:2011 (ANSI/ISA-75.01.01); methods.md §2.1 to §2.4
 */
export function flowCoefficient(
  conditions: FlowConditions,
  sheet: DataSheet,
  chokedFrom = 0.95,
): FlowCoefficient {
  const { fluid } = sheet;
  const { flow, upstreamPressure, downstreamPressure } = conditions;
  if (
    fluid === null ||
    sheet.flowUnscaled === true ||
    !(flow >= 0) ||
    !(upstreamPressure > downstreamPressure) ||
    !(downstreamPressure >= 0)
  )
    return noCoefficient;
  // the sheet knows one pipe size: the reducers on both sides are taken as equal
  const setting = { losses: fittingLosses(sheet.valveSize, sheet.pipeSize, sheet.pipeSize), chokedFrom };
  return fluid.phase === 'liquid'
    ? liquidCoefficient(conditions, sheet, fluid, setting)
    : gasCoefficient(conditions, sheet, fluid, setting);
}
