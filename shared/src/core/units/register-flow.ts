import { basisOf } from './flow-basis.js';
import { type FlowScale, type RegisterForm, type UnitRemark } from './register-form.js';
import { isFlow, lacksState, unitOf } from './unit-of.js';
import { type Dimension, type Unit } from './unit.js';

/** Reads a unit a field must have; an unknown or unfitting one is noted as a problem and null comes back. */
export function fieldUnit(
  text: string,
  pointer: string,
  fits: (dimension: Dimension) => boolean,
  problems: UnitRemark[],
): Unit | null {
  const unit = unitOf(text);
  if (unit !== null && fits(unit.dimension)) return unit;
  const code =
    unit !== null ? 'unit-of-another-quantity' : lacksState(text) ? 'state-not-named' : 'unit-unknown';
  problems.push({ pointer, code, found: text });
  return null;
}

/**
 * What the flow of a valve is counted in: by the unit of its flow signal, else of its flow span, else volume.
 *
 * @returns scaled false where the signal is in % or no unit is given anywhere
 */
export function flowScaleOf({ signals, dataSheet }: RegisterForm, problems: UnitRemark[]): FlowScale {
  const fromSignal = signals.flow?.unit ?? null;
  const text = fromSignal ?? dataSheet.flowSpanUnit;
  if (text === null) return { basis: 'volume', scaled: signals.flow === undefined, unit: null };
  const pointer = fromSignal === null ? '/dataSheet/flowSpanUnit' : '/signals/flow/unit';
  const unit = fieldUnit(text, pointer, (d) => isFlow(d) || d === 'travel', problems);
  const basis = unit === null ? null : basisOf(unit);
  return basis === null ? { basis: 'volume', scaled: false, unit } : { basis, scaled: true, unit };
}
