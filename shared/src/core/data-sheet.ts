/** What was specified for a valve, in the units of methods.md §0. The register's own units are converted at the edge. */

export const characteristicKinds = [
  'linear',
  'equal percentage',
  'quick opening',
  'modified parabolic',
] as const;
export type CharacteristicKind = (typeof characteristicKinds)[number];

export const valveStyles = ['globe', 'rotary plug', 'segment ball', 'butterfly'] as const;
export type ValveStyle = (typeof valveStyles)[number];

export const criticalities = ['high', 'normal', 'low'] as const;
export type Criticality = (typeof criticalities)[number];

/** How a flow is measured: m³/h at line conditions, kg/h, or m³/h at 0 °C and 101.325 kPa. */
export type FlowBasis = 'volume' | 'mass' | 'normal volume';

export interface Fluid {
  readonly phase: 'liquid' | 'gas';
  /** kg/m³ at the inlet */
  readonly density: number | null;
  /** kPa(a) at inlet temperature */
  readonly vapourPressure: number | null;
  /** kPa(a) */
  readonly criticalPressure: number | null;
  /** mm²/s */
  readonly viscosity: number | null;
  /** kg/kmol */
  readonly molarMass: number | null;
  readonly specificHeatRatio: number | null;
  readonly compressibility: number | null;
  /** K at the inlet */
  readonly temperature: number | null;
}

export interface DesignCase {
  readonly name: string;
  /** in the unit of the sheet's flow basis */
  readonly flow: number;
  /** kPa(a) */
  readonly upstreamPressure: number | null;
  /** kPa(a) */
  readonly downstreamPressure: number | null;
}

export interface DataSheet {
  readonly characteristic: CharacteristicKind | 'table' | null;
  /** Kv, m³/h at 1 bar */
  readonly ratedCoefficient: number | null;
  readonly rangeability: number | null;
  /** travel in %, coefficient in Kv, ascending travel */
  readonly table: readonly { readonly travel: number; readonly coefficient: number }[] | null;
  readonly style: ValveStyle;
  readonly fluid: Fluid | null;
  readonly FL: number | null;
  readonly xT: number | null;
  readonly Fd: number | null;
  /** mm */
  readonly valveSize: number | null;
  /** mm */
  readonly pipeSize: number | null;
  /** Safety-instrumented or trip duty: marked, never ranked for tuning, never given a trim (methods.md §11). */
  readonly trip: boolean;
  readonly criticality: Criticality;
  /** % travel the valve was specified to work in */
  readonly designBand: { readonly low: number; readonly high: number } | null;
  readonly flowBasis: FlowBasis;
  /** the flow is recorded in % or without a unit: no flow coefficient can be made from it */
  readonly flowUnscaled?: boolean;
  /** full scale of the flow measurement, in the unit of the flow basis */
  readonly flowSpan: number | null;
  readonly designCases: readonly DesignCase[];
}

/** One valve as the core needs it. */
export interface ValveRecord {
  readonly tag: string;
  readonly dataSheet: DataSheet;
}
