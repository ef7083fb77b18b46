/**
 * What the rest of the core calls a signal: three columns of one length.
 *
 * `time` is s, UTC, strictly ascending; `value` is in the units of methods.md §0 and NaN where nothing was
 * recorded; `good` is 1 where the historian vouched for the value and 0 where it did not.
 */
export interface Series {
  readonly time: Float64Array;
  readonly value: Float64Array;
  readonly good: Uint8Array;
}

/** What a historian tag can mean for one valve (product.md §2). */
export const signalRoles = [
  'demand',
  'position',
  'flow',
  'upstreamPressure',
  'downstreamPressure',
  'temperature',
  'density',
  'setPoint',
  'processValue',
  'mode',
] as const;
export type SignalRole = (typeof signalRoles)[number];

/**
 * The recorded history of one valve: one series a role, already in the units of methods.md §0 and with a
 * reversed signal turned round (0 = shut, 100 = open). `mode` is 1 in automatic, 0 in manual.
 */
export type History = Readonly<Partial<Record<SignalRole, Series>>>;

/** A span of time, s UTC, `to` excluded. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** The window assessed. `since` says how far back its drift is followed: to the window's own start where absent. */
export interface AssessedSpan extends Span {
  readonly since?: number;
}
