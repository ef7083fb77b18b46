import { type FlowBasis } from '../data-sheet.js';

/** State of the valve at one grid point (§1.5). Bits of `Prepared.state`. */
export const valveState = {
  inService: 1,
  shut: 2,
  manual: 4,
  /** inside the first 30 min after a start, or the first 5 min of a shut spell */
  settling: 8,
  /** a signal this valve needs was frozen */
  frozen: 16,
  /** more than half of the signals stopped together */
  outage: 32,
} as const;

/** A regular grid of times: point i is at `start + i·step` s. */
export interface Grid {
  readonly start: number;
  /** s */
  readonly step: number;
  readonly count: number;
}

/**
 * The record on one regular grid, cleaned and aligned: the only form the chapters after §1 read.
 *
 * Column i is at `start + i·step` s. A column holds NaN wherever the value is not known (gap, bad, frozen,
 * rejected). Flow and pressures are already moved by the lag between position and flow.
 */
export interface Prepared extends Grid {
  /** % : position, or demand standing in for it */
  readonly travel: Float64Array;
  readonly travelSource: 'position' | 'demand';
  readonly demand: Float64Array | null;
  readonly position: Float64Array | null;
  readonly flow: Float64Array | null;
  readonly flowBasis: FlowBasis;
  /** full scale of the flow signal: the sheet's, else the largest value seen */
  readonly flowSpan: number;
  /** kPa(a) */
  readonly upstreamPressure: Float64Array | null;
  readonly downstreamPressure: Float64Array | null;
  /** K */
  readonly temperature: Float64Array | null;
  /** kg/m³ */
  readonly density: Float64Array | null;
  readonly setPoint: Float64Array | null;
  readonly processValue: Float64Array | null;
  readonly mode: Float64Array | null;
  /** bits of valveState */
  readonly state: Uint8Array;
  readonly lag: { readonly seconds: number; readonly identified: boolean };
  /** proxy of the archive's tolerance (§1.2) */
  readonly resolution: { readonly travel: number | null; readonly flow: number | null };
  /** scan by signal, s: the spacing of stored samples while the signal moves (pace.ts) */
  readonly spacing: { readonly travel: number; readonly flow: number | null; readonly demand: number | null };
  readonly samplesSeen: number;
  readonly samplesUsed: number;
  readonly leftOut: Readonly<Record<string, number>>;
  readonly frozen: readonly { readonly role: string; readonly from: number; readonly to: number }[];
  readonly warnings: readonly { readonly code: string; readonly figures: Readonly<Record<string, number>> }[];
}
