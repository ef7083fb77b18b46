import { type Signals, type Valve, type ValveForm, type ValveRow } from '@tailrace/shared/contracts/valves';
import { type DataSheetEntity } from './data-sheet.entity.js';
import { type SignalEntity } from './signal.entity.js';
import { type ValveEntity } from './valve.entity.js';

/** A valve loaded with its area, current sheet and signals, as its contract. */
export function presentValve(valve: ValveEntity): Valve {
  return {
    id: valve.id,
    ...valveFormOf(valve),
    area: { id: valve.area.id, code: valve.area.code, name: valve.area.name },
    version: valve.version,
    createdAt: new Date(valve.createdAt).toISOString(),
    updatedAt: new Date(valve.updatedAt).toISOString(),
  };
}

/** The register's own JSON form of a valve: what the analysis and the command line read. */
export function valveFormOf(valve: ValveEntity): ValveForm {
  return { tag: valve.tag, dataSheet: currentSheet(valve).sheet, signals: signalsOf(valve.signals ?? []) };
}

export function presentValveRow(valve: ValveEntity): ValveRow {
  const { sheet } = currentSheet(valve);
  return {
    id: valve.id,
    tag: valve.tag,
    area: { id: valve.area.id, code: valve.area.code, name: valve.area.name },
    service: valve.service,
    characteristic: sheet.characteristic,
    ratedCoefficient: sheet.ratedCoefficient,
    coefficientUnit: sheet.coefficientUnit,
    criticality: valve.criticality,
    trip: valve.trip,
    signalRoles: (valve.signals ?? []).map((signal) => signal.role),
  };
}

function currentSheet(valve: ValveEntity): DataSheetEntity {
  if (!valve.sheet) throw new Error(`valve ${valve.tag} was loaded without its current data sheet`);
  return valve.sheet;
}

function signalsOf(signals: readonly SignalEntity[]): Signals {
  return Object.fromEntries(
    signals.map(({ role, historianTag, unit, reversed }) => [role, { tag: historianTag, unit, reversed }]),
  );
}
