import { type FittingLosses } from './fittings.js';

/** What was measured in one steady window, in the units of methods.md §0. */
export interface FlowConditions {
  /** in the unit of the sheet's flow basis */
  readonly flow: number;
  /** kPa(a) */
  readonly upstreamPressure: number;
  /** kPa(a) */
  readonly downstreamPressure: number;
  /** K; null or NaN where not recorded */
  readonly temperature: number | null;
  /** kg/m³ at the inlet; null or NaN where not recorded */
  readonly density: number | null;
}

/** What stays the same from window to window beside the sheet. */
export interface FlowSetting {
  readonly losses: FittingLosses;
  /** share of the choked drop from which a window counts as choked */
  readonly chokedFrom: number;
}

/** The flow coefficient one window shows. */
export interface FlowCoefficient {
  /** Kv; NaN outside the equations' domain */
  readonly coefficient: number;
  /** the coefficient rests on a recovery factor that itself changes with travel */
  readonly choked: boolean;
  /** false below a valve Reynolds number of 10 000 */
  readonly turbulent: boolean;
  /** kPa: the drop from which flow no longer rises; NaN where not known */
  readonly chokedDrop: number;
}

/** The answer where the equations do not apply. */
export const noCoefficient: FlowCoefficient = {
  coefficient: NaN,
  choked: false,
  turbulent: true,
  chokedDrop: NaN,
};

/** The first of two numbers that is really known; NaN where neither is. */
export function known(first: number | null, second: number | null): number {
  if (first !== null && Number.isFinite(first)) return first;
  return second ?? NaN;
}
