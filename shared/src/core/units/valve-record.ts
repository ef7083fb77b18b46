import { type ValveRecord } from '../data-sheet.js';
import { type History, type Series, type SignalRole, signalRoles } from '../series.js';
import { type FlowScale, type RegisterForm, type UnitRemark } from './register-form.js';
import { flowScaleOf } from './register-flow.js';
import { registerSheet } from './register-sheet.js';
import { type SignalReading, signalReading } from './signal-reading.js';
import { columnToCore, type Site, standardSite } from './unit.js';

/** A valve of the register as the core needs it, with the way its recorded signals become the core's. */
export interface ValveReading {
  readonly valve: ValveRecord;
  readonly flow: FlowScale;
  /** what was read with a reservation, to be said beside the assessment */
  readonly doubts: readonly UnitRemark[];
  /** One recorded signal in the core's units, a reversed one turned round; null where its unit does not let it be used. */
  toHistory(role: SignalRole, series: Series): Series | null;
  /** The recorded signals of a valve as its history; signals that cannot be used are left out. */
  historyOf(recorded: Readonly<Partial<Record<SignalRole, Series>>>): History;
}

/** Why a form cannot be turned into a valve of the core: one entry a field. */
export interface FormProblems {
  readonly problems: readonly UnitRemark[];
}

/**
 * Turns the register's form of a valve into the core's units (methods.md §0), once, at the edge.
 *
 * The flow basis is that of the flow signal's unit, else of the flow span's, else volume. A flow in % or without any
 * unit has no scale: the record then says `flowUnscaled` and carries no design cases, so that nothing but the installed
 * characteristic can be made from it, and a doubt says so. Mode must already be 1 (automatic) or 0 (manual).
 * Set point and process value keep their own unit where it is no flow: only their difference counts.
 *
 * @param site barometric pressure for gauge pressures; 101.325 kPa where not given
 * @returns every field whose unit cannot be used; never a throw
 * Source: methods.md §0, §1.4
 */
export function valveRecord(form: RegisterForm, site: Site = standardSite): ValveReading | FormProblems {
  const problems: UnitRemark[] = [];
  const doubts: UnitRemark[] = [];
  const flow = flowScaleOf(form, problems);
  const dataSheet = registerSheet(form.dataSheet, { flow, site, problems, doubts });
  if (!flow.scaled && form.signals.flow !== undefined)
    doubts.push({ pointer: '/signals/flow/unit', code: 'flow-without-scale', found: form.signals.flow.unit });

  const readings = new Map<SignalRole, SignalReading>();
  for (const role of signalRoles) {
    const signal = form.signals[role];
    if (signal !== undefined) readings.set(role, signalReading(role, form, { flow, problems, doubts }));
  }
  if (problems.length > 0) return { problems };

  const toHistory = (role: SignalRole, series: Series): Series | null => {
    const reading = readings.get(role);
    if (reading === undefined || reading === 'left out') return null;
    const value =
      reading.unit === null
        ? series.value
        : scaled(columnToCore(series.value, reading.unit, site), reading.factor);
    return { ...series, value: reading.reversed ? turnedRound(value) : value };
  };
  return {
    valve: { tag: form.tag, dataSheet },
    flow,
    doubts,
    toHistory,
    historyOf(recorded) {
      const history: Partial<Record<SignalRole, Series>> = {};
      for (const role of signalRoles) {
        const series = recorded[role];
        const read = series === undefined ? null : toHistory(role, series);
        if (read !== null) history[role] = read;
      }
      return history;
    },
  };
}

function scaled(values: Float64Array, factor: number): Float64Array {
  return factor === 1 ? values : values.map((v) => v * factor);
}

/** 100 where the signal says 0: a reverse-acting signal as travel. */
function turnedRound(values: Float64Array): Float64Array {
  return values.map((v) => 100 - v);
}
