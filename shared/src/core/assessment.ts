import { type CharacteristicKind } from './data-sheet.js';
import { type FindingKind } from './findings/kinds.js';
import { type CannotJudge, type ReasonCode } from './reasons.js';

/**
 * Everything inferred for one valve over one window, in the units of methods.md §0 (travel in %, shares 0 to 1,
 * coefficient in Kv, flow in the unit of the flow basis, time in s UTC). `messages/present-assessment` puts it
 * into the register's units and into words.
 */
export const methodVersion = '1';

/** A figure with the interval it is given with. */
export interface Interval {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/** Where the pressure drop behind a coefficient came from (§2). */
export type DropSource = 'measured' | 'modelled' | 'none';

export interface WindowUse {
  readonly from: number;
  readonly to: number;
  readonly samplesSeen: number;
  readonly samplesUsed: number;
  /** running days: time with the valve in service, in days */
  readonly runningDays: number;
  /** grid step, s */
  readonly step: number;
  readonly steadyWindows: number;
  /** independent periods of steady windows (§1.10) */
  readonly periods: number;
  /** slots of the same length in which the valve was in service: what findings on travel alone rest on */
  readonly runningPeriods: number;
  /** left out, by reason: a sample or a grid point is counted once */
  readonly leftOut: Readonly<Record<string, number>>;
}

export interface CharacteristicPoint {
  readonly travel: number;
  /** Kv, or flow where the basis is installed */
  readonly value: number;
  readonly count: number;
  /** relative spread (scaled MAD of ln) */
  readonly spread: number;
}

export interface CurvePoint {
  readonly travel: number;
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

export interface FittedKind {
  readonly kind: CharacteristicKind;
  /** Kv at full travel, by extrapolation */
  readonly ratedCoefficient: number;
  /** rangeability of equal percentage, exponent n of quick opening, null otherwise */
  readonly parameter: number | null;
  readonly aicc: number;
  /** probability of the kind, all kinds being equally likely before the record (kind-evidence.ts) */
  readonly probability: number;
  /** rms relative residual over the bins */
  readonly rms: number;
}

export interface EffectiveCharacteristic {
  readonly basis: 'inherent' | 'installed';
  readonly pressureDrop: DropSource;
  readonly kind: CharacteristicKind | 'undecided';
  /** why no kind is named, or null */
  readonly undecided: CannotJudge | null;
  readonly ratedCoefficient: Interval | null;
  readonly rangeability: Interval | null;
  /** change of coefficient per 1 % of travel, in % */
  readonly percentStep: Interval | null;
  readonly span: { readonly from: number; readonly to: number };
  readonly points: readonly CharacteristicPoint[];
  /** the best curve over the travel visited, with its 2.5 to 97.5 % band */
  readonly curve: readonly CurvePoint[];
  readonly fits: readonly FittedKind[];
  /** share of day resamples in which the best kind won */
  readonly agreement: number | null;
}

export interface Deviation {
  /** absolute interval: for comparing with the sheet (§2.6) */
  readonly capacityRatio: Interval | null;
  /** repeatability interval: for comparing the valve with itself */
  readonly capacityRatioRepeatability: Interval | null;
  /** % travel; null where it cannot be told from capacity */
  readonly travelShift: Interval | null;
  /** where the shift is not identifiable: the shift that would explain the ratio as well, % travel */
  readonly equivalentShift: number | null;
  readonly notSeparable: CannotJudge | null;
  /** true where a shift of travel explains the bins and a change of capacity does not (§4.3); the ratio is then the one beside the shift */
  readonly offset: boolean;
  readonly worst: { readonly travel: number; readonly percent: number } | null;
  /** shape deviation by bin after the capacity ratio is taken out, and the tolerance of IEC 60534-2-4 there, % */
  readonly byTravel: readonly {
    readonly travel: number;
    readonly percent: number;
    readonly tolerance: number;
  }[];
  /** a unit factor the ratio is within 3 % of, or null (§9.1) */
  readonly suspectedUnitFactor: number | null;
}

export interface OperatingRange {
  readonly judged: boolean;
  readonly p5: number;
  readonly p50: number;
  readonly p95: number;
  readonly belowLow: number;
  readonly aboveHigh: number;
  /** share of in-service time with demand or travel at its shut end while flow passes */
  readonly atSeat: number;
  /** share with u ≥ 99 % or x ≥ 99 % */
  readonly atOpen: number;
  /** share pinned at either end in automatic */
  readonly pinned: number;
  /** share wide open with the set point not reached; null without set point and process value */
  readonly short: number | null;
  /** working band used: the sheet's design band or the style's */
  readonly band: { readonly low: number; readonly high: number };
  /** share of time in each 1 % of travel, 0…100 */
  readonly ridge: readonly number[];
  readonly verdict:
    'oversized' | 'undersized' | 'rangeability not enough' | 'well sized' | 'acceptable' | null;
  /** the verdict without the 48 h after each start; null where nothing is left */
  readonly verdictAfterStarts: OperatingRange['verdict'];
  /** C(p95)/C(p5), null where no curve covers both */
  readonly rangeabilityUsed: number | null;
}

/** Reported travel while the valve was told to be shut, or wide open, for ten minutes or more (§4.4). */
export interface EndReadings {
  /** % travel, median over spells; null without such a spell */
  readonly shut: { readonly travel: number; readonly spells: number } | null;
  readonly open: { readonly travel: number; readonly spells: number } | null;
}

/** A spell in which a signal stood still while its partner moved (§1.3), s UTC. */
export interface FrozenSpell {
  readonly role: string;
  readonly from: number;
  readonly to: number;
}

export interface InstalledGain {
  /** bins of travel the gain rests on, and the travel between the outermost, % */
  readonly bins: number;
  readonly span: number;
  readonly points: readonly { readonly travel: number; readonly gain: number }[];
  readonly min: Interval;
  readonly max: Interval;
  /** 10 to 90 % of day resamples */
  readonly ratio: Interval;
  /** gain in % of span per %; false: shape only (the flow is not the controlled quantity) */
  readonly absolute: boolean;
}

export interface DirectionSplit {
  /** dead band, % travel */
  readonly deadBand: number;
  readonly standardError: number;
  /** what the reference moves by from scan to scan without going anywhere, % travel; absent where it asks nothing of the band */
  readonly jitter?: number;
  readonly bins: number;
  /** mid-lines: reference value, response rising, response falling */
  readonly lines: readonly { readonly at: number; readonly up: number; readonly down: number }[];
}

export interface Oscillation {
  readonly period: number;
  readonly regularity: number;
  /** % travel */
  readonly amplitude: number;
  /** share of blocks oscillating */
  readonly share: number;
  readonly blocks: number;
  readonly blockHours: number;
  readonly cause: 'outside' | 'line' | 'valve' | 'loop' | 'not decided';
}

export interface Movement {
  readonly threshold: number;
  readonly reversalsPerDay: number;
  readonly travelPerDay: number;
  readonly perDay: readonly { readonly day: number; readonly reversals: number; readonly travel: number }[];
  readonly demandToPosition: DirectionSplit | CannotJudge;
  readonly positionToFlow: DirectionSplit | CannotJudge;
  readonly demandToFlow: DirectionSplit | CannotJudge;
  readonly jumps:
    | {
        readonly count: number;
        readonly median: number;
        readonly share: number;
        readonly sizes: readonly number[];
        /** dead band plus stick band S, % travel, read from where the stem slipped; null with too few jumps */
        readonly stickBand: { readonly value: number; readonly standardError: number } | null;
      }
    | CannotJudge;
  readonly oscillation: Oscillation | CannotJudge | null;
  readonly mismatch:
    | {
        readonly offset: number;
        readonly spread: number;
        readonly sameSignDays: number;
        readonly slope: number;
        /** the difference follows a curve of demand: a characterised signal, to be asked about, not a fault */
        readonly characterised: boolean;
      }
    | CannotJudge;
}

export interface Drift {
  /** what the series is cut into; `minute`: a thirtieth of a record of hours */
  readonly by: 'month' | 'week' | 'day' | 'hour' | 'minute';
  readonly reference: ReferenceSpan;
  /** ln capacity against the reference period */
  readonly series: readonly {
    readonly at: number;
    readonly change: number;
    readonly low: number;
    readonly high: number;
    readonly windows: number;
  }[];
  readonly trend:
    | {
        readonly change: number;
        readonly low: number;
        readonly high: number;
        readonly p: number;
        readonly confirmed: boolean;
      }
    | CannotJudge;
  readonly steps: readonly { readonly at: number; readonly change: number }[];
}
interface ReferenceSpan {
  readonly from: number;
  readonly to: number;
}

export interface Passing {
  /** share of rated coefficient */
  readonly share: number;
  readonly coefficient: number;
  readonly spells: number;
  readonly seconds: number;
  /** the smallest share that could have been seen */
  readonly smallestVisible: number;
}

export interface ServiceStress {
  readonly chokedShare: number | null;
  readonly nearChokedShare: number | null;
  readonly flashingHours: number | null;
  /** hours by xF (liquid) or x/x_choked (gas) band; band edges below */
  readonly bands: readonly { readonly from: number; readonly to: number; readonly hours: number }[];
  readonly medianCavitationIndex: number | null;
  readonly lowTravelHours: number | null;
  readonly reason: CannotJudge | null;
}

/** One thing the assessment says is wrong. Words are added by `messages`. */
export interface Finding {
  readonly kind: FindingKind;
  /** 0 to 1 */
  readonly severity: number;
  /** 0 to 1 */
  readonly confidence: number;
  /** the kind's figure, its raise threshold, its act-now threshold, its standard error */
  readonly x: number;
  readonly raise: number;
  readonly actNow: number;
  readonly standardError: number | null;
  /** which rule of the kind raised it, for kinds with more than one */
  readonly rule: string;
  /** a primary finding that explains this one: shown struck through, not counted (§9.1) */
  readonly explainedBy: FindingKind | null;
  readonly evidence: Readonly<Record<string, number | null>>;
}

/** A kind's figure whether it raised a finding or not: what keep levels and smoothing compare (§9.1, §9.3). */
export interface KindFigure {
  readonly kind: FindingKind;
  readonly rule: string;
  readonly x: number;
  readonly raise: number;
  readonly actNow: number;
}

export interface KindNotJudged {
  readonly kind: FindingKind | 'characteristic' | 'range';
  readonly reason: ReasonCode;
  readonly figures: Readonly<Record<string, number>>;
}

export interface Assessment {
  readonly tag: string;
  readonly methodVersion: string;
  readonly window: WindowUse;
  readonly travelSource: 'position' | 'demand';
  readonly basis: 'inherent' | 'installed';
  readonly pressureDrop: DropSource;
  /** true where any chapter reached a verdict */
  readonly judged: boolean;
  readonly reason: CannotJudge | null;
  readonly lag: { readonly seconds: number; readonly identified: boolean };
  readonly resolution: { readonly travel: number | null; readonly flow: number | null };
  readonly characteristic: EffectiveCharacteristic | null;
  readonly deviation: Deviation | null;
  readonly range: OperatingRange | null;
  readonly gain: InstalledGain | null;
  readonly endReadings: EndReadings;
  readonly frozen: readonly FrozenSpell[];
  readonly movement: Movement | null;
  readonly drift: Drift | null;
  readonly passing: Passing | CannotJudge | null;
  readonly service: ServiceStress | null;
  readonly findings: readonly Finding[];
  readonly notJudged: readonly KindNotJudged[];
  readonly figures: readonly KindFigure[];
  /** things the reader must know: role swapped, crossed pressures, outlier filter off … */
  readonly warnings: readonly { readonly code: string; readonly figures: Readonly<Record<string, number>> }[];
  /** 0 to 100; null for trip valves */
  readonly attention: number | null;
  readonly attentionTerms: readonly {
    readonly kind: FindingKind;
    readonly weight: number;
    readonly severity: number;
    readonly confidence: number;
  }[];
}
