import { type RegisterForm } from './register-form.js';
import { isFlow, unitOf } from './unit-of.js';
import { fromCore, type Site, standardSite, type Unit } from './unit.js';

/** The units a valve's figures are shown in: those its register entry uses. */
export interface RegisterUnits {
  /** null where the flow is recorded in % or without a unit */
  readonly flow: Unit | null;
  readonly pressure: Unit;
  readonly coefficient: Unit;
}

const Kv: Unit = {
  name: 'Kv',
  dimension: 'coefficient',
  factor: 1,
  offset: 0,
  gauge: false,
  doubtful: false,
};
const kPa: Unit = {
  name: 'kPa(a)',
  dimension: 'pressure',
  factor: 1,
  offset: 0,
  gauge: false,
  doubtful: false,
};

/**
 * The units of the register for showing results: flow in the flow signal's (else the span's), pressure in that of the
 * upstream, the downstream or the first design case, coefficient as entered. Units that are not known are passed over.
 */
export function registerUnits({ signals, dataSheet }: RegisterForm): RegisterUnits {
  const first = (texts: readonly (string | null | undefined)[], fits: (unit: Unit) => boolean) =>
    texts.map((text) => (text ? unitOf(text) : null)).find((unit) => unit !== null && fits(unit)) ?? null;
  return {
    flow: first([signals.flow?.unit ?? dataSheet.flowSpanUnit], (unit) => isFlow(unit.dimension)),
    pressure:
      first(
        [
          signals.upstreamPressure?.unit,
          signals.downstreamPressure?.unit,
          ...dataSheet.designCases.map((c) => c.pressureUnit),
        ],
        (unit) => unit.dimension === 'pressure',
      ) ?? kPa,
    coefficient: unitOf(dataSheet.coefficientUnit) ?? Kv,
  };
}

/**
 * A difference of the core in another unit: no offset, no barometric pressure.
 *
 * @example differenceFromCore(100, barg) // 1
 */
export function differenceFromCore(difference: number, unit: Unit): number {
  return difference / unit.factor;
}

/** A value of the core in a register's unit; taken as it is where that unit is not known. */
export function shownIn(value: number, unit: Unit | null, site: Site = standardSite): number {
  return unit === null ? value : fromCore(value, unit, site);
}
