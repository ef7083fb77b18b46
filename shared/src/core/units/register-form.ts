import {
  type CharacteristicKind,
  type Criticality,
  type FlowBasis,
  type Fluid,
  type ValveStyle,
} from '../data-sheet.js';
import { type SignalRole } from '../series.js';
import { type Unit } from './unit.js';

/**
 * The register's own form of a valve, as far as the core needs it: quantities with the units a person chose. The form
 * of `contracts/valves.ts` fits it by structure.
 */
export interface RegisterForm {
  readonly tag: string;
  readonly dataSheet: RegisterSheet;
  readonly signals: Readonly<Partial<Record<SignalRole, RegisterSignal>>>;
}

export interface RegisterSignal {
  readonly unit: string | null;
  readonly reversed: boolean;
}

export interface RegisterCase {
  readonly name: string;
  readonly flow: number;
  readonly flowUnit: string;
  readonly upstreamPressure: number | null;
  readonly downstreamPressure: number | null;
  readonly pressureUnit: string | null;
}

export interface RegisterSheet {
  readonly characteristic: CharacteristicKind | 'table' | null;
  readonly ratedCoefficient: number | null;
  readonly coefficientUnit: 'Cv' | 'Kv';
  readonly rangeability: number | null;
  readonly table: readonly { readonly travel: number; readonly coefficient: number }[] | null;
  readonly style: ValveStyle;
  readonly fluid: Fluid | null;
  readonly FL: number | null;
  readonly xT: number | null;
  readonly Fd: number | null;
  readonly valveSize: number | null;
  readonly pipeSize: number | null;
  readonly trip: boolean;
  readonly criticality: Criticality;
  readonly designBand: { readonly low: number; readonly high: number } | null;
  readonly flowSpan: number | null;
  readonly flowSpanUnit: string | null;
  readonly designCases: readonly RegisterCase[];
}

/** What can be wrong, or in doubt, with a unit on the register. */
export const unitRemarks = [
  /** no unit of this name is known */
  'unit-unknown',
  /** a normal or standard flow that does not name its state (0 °C, 15 °C, 60 °F) */
  'state-not-named',
  /** a known unit, but of another quantity than this field holds */
  'unit-of-another-quantity',
  /** a flow whose basis differs from the flow signal's, and the fluid's data do not connect the two */
  'flow-bases-not-connected',
  /** doubt: no gauge or absolute stated; read as absolute */
  'gauge-or-absolute-not-stated',
  /** doubt: no unit given for this signal, so it is left out */
  'unit-missing',
  /** doubt: the flow is in % or without a unit, so there is no flow coefficient, only the installed characteristic */
  'flow-without-scale',
] as const;
export type UnitRemarkCode = (typeof unitRemarks)[number];

/** A remark on one field of the form: JSON pointer, code, and the text that was found there. */
export interface UnitRemark {
  readonly pointer: string;
  readonly code: UnitRemarkCode;
  readonly found: string | null;
}

/** How the flow signal counts: in a known unit, or without scale. */
export interface FlowScale {
  readonly basis: FlowBasis;
  /** false: in % or without a unit; only the installed characteristic can be made from it */
  readonly scaled: boolean;
  /** the unit it is recorded in; null where none is known */
  readonly unit: Unit | null;
}
