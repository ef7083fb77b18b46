import { type DataSheet, type Fluid } from '../data-sheet.js';
import { gasConstant, molarVolume, N22, N6, N8, N9 } from './constants.js';
import { dropRatioWithFittings, pipingFactor } from './fittings.js';
import {
  type FlowCoefficient,
  type FlowConditions,
  type FlowSetting,
  known,
  noCoefficient,
} from './flow-conditions.js';
import { nonTurbulentCoefficient, reynoldsFactor, turbulentFrom, valveReynolds } from './reynolds.js';
import { dropRatioFactor, recoveryFactor, styleModifier } from './style-factors.js';

/**
 * Flow coefficient of a valve in gas or vapour service.
 *
 * Expansion factor by the text of 2011: Y = 1 − x/(3·Fγ·xTP), with xTP where there are reducers (the text of 2007 took
 * xT there; the two differ by up to 6 % in high-recovery valves).
 *
 * Missing data: γ → 1.4; Z → 1; xT, FL and Fd → typical of the style; viscosity → turbulent. Without temperature a
 * density stands in; without molar mass only mass and volume flow with a known density can be used. What is then
 * still missing → NaN.
 *
 * @param setting reducers at the valve, and the share of the choked drop from which the window counts as choked
 * Source: IEC 60534-2-1:2011; methods.md §2.2, §2.3, §2.4
 */
export function gasCoefficient(
  conditions: FlowConditions,
  sheet: DataSheet,
  fluid: Fluid,
  { losses, chokedFrom }: FlowSetting,
): FlowCoefficient {
  const P1 = conditions.upstreamPressure;
  const P2 = conditions.downstreamPressure;
  const x = (P1 - P2) / P1;
  const gamma = (fluid.specificHeatRatio ?? 1.4) / 1.4;
  const xT = dropRatioFactor(sheet);
  // C·FP·Y·√x
  const demand = gasDemand(conditions, sheet, fluid);
  if (!(demand >= 0)) return noCoefficient;

  let xChoked = gamma * xT;
  let coefficient = expanded(demand, x, xChoked);
  const d = sheet.valveSize;
  if (losses.inlet > 0 && d !== null) {
    const bare = coefficient;
    let settled = false;
    for (let turn = 0; turn < 100 && !settled; turn++) {
      const FP = pipingFactor(losses.sum, coefficient, d);
      xChoked = gamma * dropRatioWithFittings(xT, FP, losses.inlet, coefficient, d);
      const next = expanded(demand, x, xChoked) / FP;
      settled = Math.abs(next - coefficient) <= 1e-9 * next || next === 0;
      coefficient = next;
    }
    if (!settled || !Number.isFinite(coefficient)) {
      coefficient = bare;
      xChoked = gamma * xT;
    }
  }
  const chokedDrop = xChoked * P1;
  const choked = P1 - P2 >= chokedFrom * chokedDrop;
  if (fluid.viscosity === null || coefficient === 0)
    return { coefficient, choked, turbulent: true, chokedDrop };
  return viscousOr({ coefficient, choked, turbulent: true, chokedDrop }, conditions, sheet, fluid);
}

/** C·FP = demand/(Y·√x), with x and Y held at their choked values beyond choking. */
function expanded(demand: number, x: number, xChoked: number): number {
  const sized = Math.min(x, xChoked);
  return demand / ((1 - sized / (3 * xChoked)) * Math.sqrt(sized));
}

/** kg/m³ at the inlet: measured, else by the gas law, else the sheet's. */
function inletDensity(conditions: FlowConditions, fluid: Fluid): number {
  const measured = known(conditions.density, null);
  if (measured > 0) return measured;
  const temperature = known(conditions.temperature, fluid.temperature);
  const byLaw =
    (conditions.upstreamPressure * (fluid.molarMass ?? NaN)) /
    ((fluid.compressibility ?? 1) * gasConstant * temperature);
  return known(byLaw, fluid.density);
}

function gasDemand(conditions: FlowConditions, sheet: DataSheet, fluid: Fluid): number {
  const { flow, upstreamPressure: P1 } = conditions;
  const M = fluid.molarMass ?? NaN;
  const T = known(conditions.temperature, fluid.temperature);
  const Z = fluid.compressibility ?? 1;
  if (sheet.flowBasis === 'normal volume') {
    const byTemperature = (flow / (N9 * P1)) * Math.sqrt(M * T * Z);
    if (Number.isFinite(byTemperature)) return byTemperature;
    return massDemand((flow * M) / molarVolume, P1, inletDensity(conditions, fluid));
  }
  const density = inletDensity(conditions, fluid);
  if (sheet.flowBasis === 'volume') return massDemand(flow * density, P1, density);
  if (known(conditions.density, null) > 0 || !Number.isFinite(M * T)) return massDemand(flow, P1, density);
  return (flow / (N8 * P1)) * Math.sqrt((T * Z) / M);
}

function massDemand(mass: number, P1: number, density: number): number {
  return mass / (N6 * Math.sqrt(P1 * density));
}

/** m³/h at 0 °C and 101.325 kPa, whatever the flow is measured in. */
function normalFlow(conditions: FlowConditions, sheet: DataSheet, fluid: Fluid): number {
  if (sheet.flowBasis === 'normal volume') return conditions.flow;
  const mass =
    sheet.flowBasis === 'mass' ? conditions.flow : conditions.flow * inletDensity(conditions, fluid);
  return (mass * molarVolume) / (fluid.molarMass ?? NaN);
}

function viscousOr(
  turbulent: FlowCoefficient,
  conditions: FlowConditions,
  sheet: DataSheet,
  fluid: Fluid,
): FlowCoefficient {
  const flow = normalFlow(conditions, sheet, fluid);
  const viscosity = (fluid.viscosity ?? NaN) * 1e-6;
  const FL = recoveryFactor(sheet);
  const d = sheet.valveSize;
  const shape = { FL, Fd: styleModifier(sheet), D: sheet.pipeSize ?? d };
  const reynolds = (C: number) => valveReynolds(flow, viscosity, C, shape);
  if (!(reynolds(turbulent.coefficient) < turbulentFrom)) return turbulent;
  const T = known(conditions.temperature, fluid.temperature);
  const P1 = conditions.upstreamPressure;
  const P2 = conditions.downstreamPressure;
  const bare = (flow / N22) * Math.sqrt(((fluid.molarMass ?? NaN) * T) / ((P1 - P2) * (P1 + P2)));
  if (d === null || !Number.isFinite(bare)) return { ...turbulent, turbulent: false };
  const coefficient = nonTurbulentCoefficient(bare, (C) => reynoldsFactor(reynolds(C), C, d, FL));
  return { ...turbulent, coefficient, turbulent: false };
}
