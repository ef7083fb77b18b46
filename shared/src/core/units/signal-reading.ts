import { type SignalRole } from '../series.js';
import { basisOf, betweenBases } from './flow-basis.js';
import { fieldUnit } from './register-flow.js';
import { type FlowScale, type RegisterForm, type UnitRemark } from './register-form.js';
import { isFlow, unitOf } from './unit-of.js';
import { type Dimension, type Unit } from './unit.js';

/** How one recorded signal becomes the core's: its unit (null: taken as it is), a factor after it, and its direction. */
export type SignalReading =
  { readonly unit: Unit | null; readonly factor: number; readonly reversed: boolean } | 'left out';

interface Notes {
  readonly flow: FlowScale;
  readonly problems: UnitRemark[];
  readonly doubts: UnitRemark[];
}

const wanted: Partial<Record<SignalRole, Dimension>> = {
  demand: 'travel',
  position: 'travel',
  upstreamPressure: 'pressure',
  downstreamPressure: 'pressure',
  temperature: 'temperature',
  density: 'density',
};

const asRecorded = { unit: null, factor: 1, reversed: false };

/**
 * How a bound signal is to be read. Travel without a unit is in %; a pressure, temperature or density without one is
 * left out, because its size does not give its unit away.
 *
 * @param role a role that is bound on this form
 */
export function signalReading(role: SignalRole, form: RegisterForm, notes: Notes): SignalReading {
  const signal = form.signals[role];
  if (signal === undefined || role === 'mode') return asRecorded;
  const pointer = `/signals/${role}/unit`;
  if (role === 'flow') return { ...asRecorded, unit: notes.flow.unit };
  if (role === 'setPoint' || role === 'processValue') return controlledReading(signal.unit, form, notes.flow);
  const dimension = wanted[role];
  if (signal.unit === null) {
    if (dimension === 'travel') return { ...asRecorded, reversed: signal.reversed };
    notes.doubts.push({ pointer, code: 'unit-missing', found: null });
    return 'left out';
  }
  const unit = fieldUnit(signal.unit, pointer, (d) => d === dimension, notes.problems);
  if (unit?.doubtful === true)
    notes.doubts.push({ pointer, code: 'gauge-or-absolute-not-stated', found: signal.unit });
  return { unit, factor: 1, reversed: dimension === 'travel' && signal.reversed };
}

/**
 * Set point and process value of a flow loop go into the flow's own basis, so that a set point may stand for the flow;
 * of any other loop they stay as recorded.
 */
function controlledReading(text: string | null, form: RegisterForm, flow: FlowScale): SignalReading {
  const unit = text === null ? null : unitOf(text);
  const basis = unit === null || !isFlow(unit.dimension) ? null : basisOf(unit);
  if (basis === null || !flow.scaled) return asRecorded;
  const factor = betweenBases(basis, flow.basis, form.dataSheet.fluid);
  return factor === null ? asRecorded : { unit, factor, reversed: false };
}
