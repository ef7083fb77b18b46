import { type ValveForm } from '../contracts/valves.js';
import { type FlowBasis } from '../core/data-sheet.js';
import { fromCore } from '../core/units/unit.js';
import { unitOf } from '../core/units/unit-of.js';

/** From the core's units to those a valve's register entry is kept in. */
export interface RegisterUnits {
  readonly coefficientUnit: 'Cv' | 'Kv';
  readonly flowUnit: string;
  coefficient(kv: number): number;
  flow(value: number): number;
}

/** Cv = 1.156 Kv (IEC 60534-1; methods.md §0). */
export const cvPerKv = 1.156;

const coreFlowUnit: Record<FlowBasis, string> = {
  volume: 'm³/h',
  mass: 'kg/h',
  'normal volume': 'm³/h (0 °C)',
};

/** The units a valve's figures are shown in: the sheet's coefficient unit, the flow signal's unit. */
export function registerUnits(form: ValveForm, basis: FlowBasis): RegisterUnits {
  const { coefficientUnit } = form.dataSheet;
  const name = form.signals.flow?.unit ?? form.dataSheet.flowSpanUnit;
  const unit = name === null || name === undefined ? null : unitOf(name);
  const known = unit !== null && ['volume flow', 'mass flow', 'normal volume flow'].includes(unit.dimension);
  return {
    coefficientUnit,
    flowUnit: known ? unit.name : (name ?? coreFlowUnit[basis]),
    coefficient: (kv) => (coefficientUnit === 'Cv' ? kv * cvPerKv : kv),
    flow: (value) => (known ? fromCore(value, unit) : value),
  };
}
