import { type DataSheet, type DesignCase } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';

/**
 * The line a valve sits in, as two design cases describe it: ΔP(q) = a − b·q².
 *
 * `a` is the drop at shut, `b` the resistance of everything else, pump droop included. q is in the unit of the
 * sheet's flow basis.
 */
export interface LineModel {
  /** kPa */
  readonly a: number;
  /** kPa per squared unit of flow */
  readonly b: number;
  /** flow the model may be used from, and up to */
  readonly from: number;
  readonly to: number;
  /** the cases had the drop grow with flow: b was set to 0 and a to their mean */
  readonly flat: boolean;
}

type WholeCase = DesignCase & { readonly upstreamPressure: number; readonly downstreamPressure: number };

/**
 * The line model of a data sheet, from its design cases of lowest and highest flow.
 *
 * @returns a refusal where fewer than two cases of different flow carry both pressures with P1 above P2
 * @example // (20 m³/h, 4.0 bar), (60 m³/h, 1.6 bar): a = 430 kPa, b = 0.075 kPa/(m³/h)²
 * Source: methods.md §2.5
 */
export function lineModel(sheet: DataSheet): LineModel | CannotJudge {
  const cases = sheet.designCases
    .filter(
      (c): c is WholeCase =>
        c.upstreamPressure !== null &&
        c.downstreamPressure !== null &&
        c.upstreamPressure > c.downstreamPressure &&
        c.flow > 0,
    )
    .sort((one, other) => one.flow - other.flow);
  const low = cases[0];
  const high = cases[cases.length - 1];
  if (low === undefined || high === undefined || !(high.flow > low.flow))
    return cannotJudge('no-pressures', { cases: cases.length });
  const dropLow = low.upstreamPressure - low.downstreamPressure;
  const dropHigh = high.upstreamPressure - high.downstreamPressure;
  const span = { from: 0.5 * low.flow, to: 1.2 * high.flow };
  const b = (dropLow - dropHigh) / (high.flow ** 2 - low.flow ** 2);
  if (b < 0) return { a: (dropLow + dropHigh) / 2, b: 0, ...span, flat: true };
  return { a: dropLow + b * low.flow ** 2, b, ...span, flat: false };
}

/**
 * Pressure drop across the valve at a flow, kPa.
 *
 * @param flow in the unit of the sheet's flow basis
 * @returns NaN outside the flows the design cases speak for (half the lowest to 1.2 times the highest), and where the
 * line would take more than there is
 * Source: methods.md §2.5
 */
export function pressureDropAt(model: LineModel, flow: number): number {
  if (!(flow >= model.from && flow <= model.to)) return NaN;
  const drop = model.a - model.b * flow * flow;
  return drop > 0 ? drop : NaN;
}

/**
 * The model and its four neighbours within the tolerance of design figures: a kind is named from modelled drops only
 * if all five agree (the consensus rule), because an error of b bends the curve and fakes a characteristic.
 *
 * @returns (a, b) × (1, 1), (1 ± u_a, 1), (1, 1 ± u_b), the model itself first
 * Source: methods.md §2.5
 */
export function neighbouringModels(
  model: LineModel,
  { designDropShut: ua, designDropSlope: ub }: Limits['uncertainty'],
): readonly LineModel[] {
  const factors = [
    [1, 1],
    [1 + ua, 1],
    [1 - ua, 1],
    [1, 1 + ub],
    [1, 1 - ub],
  ] as const;
  return factors.map(([fa, fb]) => ({ ...model, a: fa * model.a, b: fb * model.b }));
}

/**
 * Flow through a liquid valve of a given coefficient in a modelled line, with the slope of flow against coefficient.
 *
 * q = C√(a/SG)/√(1 + C²b/SG), dq/dC = q/(C(1 + C²b/SG)): §5.4, for the drop of §2.5 put into the liquid equation
 * without reducers.
 *
 * @param C Kv, above 0
 * @param perRootDrop flow in the basis of the model through Kv 1 at 1 kPa: 0.1/√SG for m³/h, times density for kg/h
 * @returns NaN where C is not above 0
 * @example // a 430 kPa, b 0.075, C 30, water: 48.067 m³/h, slope 0.95656
 * Source: methods.md §5.4 (3)
 */
export function flowThrough(
  model: LineModel,
  C: number,
  perRootDrop: number,
): { readonly flow: number; readonly slope: number } {
  if (!(C > 0)) return { flow: NaN, slope: NaN };
  const g = C * perRootDrop;
  const loading = 1 + g * g * model.b;
  const flow = (g * Math.sqrt(model.a)) / Math.sqrt(loading);
  return { flow, slope: flow / (C * loading) };
}
