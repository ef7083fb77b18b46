import { type CharacteristicKind } from '../core/data-sheet.js';
import { type SignalRole } from '../core/series.js';

/** A span of the record, s from its start. */
export interface Spell {
  readonly from: number;
  readonly to: number;
}

/** The valve as it really is. The data sheet may say something else. */
export interface TrueValve {
  readonly kind: CharacteristicKind;
  /** rangeability of equal percentage, exponent of quick opening; null: the kind's usual one */
  readonly parameter: number | null;
  /** Kv at full travel */
  readonly ratedCoefficient: number;
  /** sd of the trim's smooth departure from its law, relative */
  readonly ripple: number;
  /** added to travel before the trim, % */
  readonly shift: number;
  /** relative change of capacity over the record, growing evenly */
  readonly drift: number;
  /** factor on capacity from a time on, s from the start */
  readonly step: { readonly at: number; readonly factor: number } | null;
  /** Kv that passes when shut, share of rated */
  readonly passing: number;
  /** stick band S and slip jump J, % travel; a dead band is S without J */
  readonly stick: { readonly S: number; readonly J: number };
  /** play between stem and plug, % travel */
  readonly play: number;
  /** reported position minus true position, % travel */
  readonly positionError: number;
  readonly FL: number;
}

/** The line the valve stands in: ΔP over the valve = dropShut − resistance·q². */
export interface Line {
  /** kPa at no flow */
  readonly dropShut: number;
  /** share of dropShut lost in the line at the valve's full capacity */
  readonly lossShare: number;
  /** kPa(a) */
  readonly destination: number;
  /** kg/m³ */
  readonly density: number;
  /** kPa(a) */
  readonly vapourPressure: number;
  /** sd of slow supply disturbances, share of dropShut */
  readonly disturbance: number;
}

/** What the set point asks of the valve, said as the travel a healthy valve would need, %. */
export interface Duty {
  readonly kind: 'steps' | 'diurnal' | 'base load' | 'cascade' | 'constant demand';
  readonly low: number;
  readonly high: number;
}

export interface Loop {
  readonly seed: number;
  /** s UTC */
  readonly start: number;
  readonly days: number;
  readonly valve: TrueValve;
  readonly line: Line;
  readonly duty: Duty;
  /** multiplies the controller's gain; above 3 it oscillates */
  readonly tuning: number;
  /** a set point that swings: period in s, amplitude as share of span */
  readonly swing: { readonly period: number; readonly amplitude: number } | null;
  /** sd of meter noise, share of span */
  readonly meterNoise: number;
  readonly shutdowns: readonly Spell[];
  readonly frozen: readonly (Spell & { readonly role: SignalRole })[];
  readonly historian: {
    /** s */
    readonly scan: number;
    /** swinging-door tolerance, share of span; 0: every scan is kept */
    readonly tolerance: number;
    /** longest time without a stored value, s */
    readonly longest: number;
    readonly roles: readonly SignalRole[];
  };
}
