/**
 * Accepted steady windows as columns of one length (§1.9): what the characteristic, drift and trim replay are
 * made from. One entry a window; NaN where a quantity is not known.
 */
export interface SteadyWindows {
  readonly count: number;
  /** s, middle of the window */
  readonly time: Float64Array;
  /** mean relative travel, 0 to 1 */
  readonly h: Float64Array;
  /** mean flow, unit of the flow basis */
  readonly flow: Float64Array;
  /** kPa; NaN without pressures */
  readonly pressureDrop: Float64Array;
  readonly upstreamPressure: Float64Array;
  /** Kv by §2; NaN where the basis is installed */
  readonly coefficient: Float64Array;
  /** ln of the coefficient, or of the flow where the basis is installed */
  readonly L: Float64Array;
  /** 1 where choked: kept for stress, no weight in fits */
  readonly choked: Uint8Array;
  /** index of the 2 h slot, and of the calendar day (UTC) */
  readonly slot: Int32Array;
  readonly day: Int32Array;
  /** length of a window, s */
  readonly seconds: number;
}
