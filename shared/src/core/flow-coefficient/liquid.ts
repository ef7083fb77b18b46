import { type DataSheet, type Fluid } from '../data-sheet.js';
import { N1, N2, waterDensity } from './constants.js';
import { pipingFactor, recoveryWithFittings } from './fittings.js';
import {
  type FlowCoefficient,
  type FlowConditions,
  type FlowSetting,
  known,
  noCoefficient,
} from './flow-conditions.js';
import { nonTurbulentCoefficient, reynoldsFactor, turbulentFrom, valveReynolds } from './reynolds.js';
import { recoveryFactor, styleModifier } from './style-factors.js';

/**
 * Liquid critical pressure ratio factor FF = 0.96 − 0.28·√(Pv/Pc).
 *
 * @param vapourPressure kPa(a)
 * @param criticalPressure kPa(a); null: 0.96, right for a liquid far from its critical point
 * @example criticalRatioFactor(70.1, 22120) // 0.9442
 * Source: IEC 60534-2-1:2011; methods.md §2.1
 */
export function criticalRatioFactor(vapourPressure: number, criticalPressure: number | null): number {
  return criticalPressure === null ? 0.96 : 0.96 - 0.28 * Math.sqrt(vapourPressure / criticalPressure);
}

/**
 * Flow coefficient of a valve in liquid service.
 *
 * The standard iterates between C and FP; for a liquid both branches have a closed form, and the larger of the
 * unchoked and the choked solution is the one that holds. Where no solution exists (a coefficient too large for its
 * bore) the reducers are left out.
 *
 * Missing data: density → NaN; vapour pressure → 0, so choking is named at the latest drop it could begin at;
 * critical pressure → FF 0.96; FL and Fd → typical of the style; viscosity → turbulent. A liquid given in normal
 * volume → NaN.
 *
 * @param setting reducers at the valve, and the share of the choked drop from which the window counts as choked
 * Source: IEC 60534-2-1:2011; methods.md §2.1, §2.3, §2.4
 */
export function liquidCoefficient(
  conditions: FlowConditions,
  sheet: DataSheet,
  fluid: Fluid,
  { losses, chokedFrom }: FlowSetting,
): FlowCoefficient {
  const density = known(conditions.density, fluid.density);
  const drop = conditions.upstreamPressure - conditions.downstreamPressure;
  const vapourPressure = fluid.vapourPressure ?? 0;
  const room =
    conditions.upstreamPressure -
    criticalRatioFactor(vapourPressure, fluid.criticalPressure) * vapourPressure;
  if (!(density > 0) || !(room > 0) || sheet.flowBasis === 'normal volume') return noCoefficient;
  const flow = sheet.flowBasis === 'mass' ? conditions.flow / density : conditions.flow;
  const FL = recoveryFactor(sheet);
  const d = sheet.valveSize;
  // C·FP·√ΔP
  const demand = (flow * Math.sqrt(density / waterDensity)) / N1;
  const bare = demand / Math.sqrt(drop);

  const plain = Math.max(bare, demand / (FL * Math.sqrt(room)));
  let coefficient = plain;
  let chokedDrop = FL * FL * room;
  if (losses.inlet > 0 && d !== null) {
    const perSquare = 1 / (N2 * d ** 4);
    const unchoked = bare / Math.sqrt(1 - losses.sum * perSquare * bare * bare);
    const atRoom = demand / Math.sqrt(room);
    const choked = atRoom / (FL * Math.sqrt(1 - losses.inlet * perSquare * atRoom * atRoom));
    const withFittings = Math.max(unchoked, choked);
    if (Number.isFinite(withFittings)) {
      coefficient = withFittings;
      const FLP = recoveryWithFittings(FL, losses.inlet, coefficient, d);
      chokedDrop = (FLP / pipingFactor(losses.sum, coefficient, d)) ** 2 * room;
    }
  }
  const choked = drop >= chokedFrom * chokedDrop;
  if (fluid.viscosity === null || coefficient === 0)
    return { coefficient, choked, turbulent: true, chokedDrop };

  const viscosity = fluid.viscosity * 1e-6;
  const shape = { FL, Fd: styleModifier(sheet), D: sheet.pipeSize ?? d };
  if (valveReynolds(flow, viscosity, coefficient, shape) >= turbulentFrom)
    return { coefficient, choked, turbulent: true, chokedDrop };
  // the standard's viscous equation knows no reducers
  const viscous =
    d === null
      ? coefficient
      : nonTurbulentCoefficient(plain, (C) =>
          reynoldsFactor(valveReynolds(flow, viscosity, C, shape), C, d, FL),
        );
  return { coefficient: viscous, choked, turbulent: false, chokedDrop };
}
