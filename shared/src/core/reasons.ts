/**
 * Why something cannot be judged. The core gives the code and its figures; `messages` says it in words, with
 * the data that would help.
 */
export const reasonCodes = [
  'no-samples',
  'no-travel-signal',
  'no-demand',
  'no-flow',
  'no-pressures',
  'no-rated-coefficient',
  'no-characteristic-specified',
  'no-fluid-data',
  'no-recovery-factor',
  'signal-quality',
  'record-too-short',
  'too-few-windows',
  'too-few-bins',
  'span-too-small',
  'travel-constant',
  'valve-not-in-service',
  'always-shut',
  'sampled-too-slowly',
  'models-too-close',
  'not-repeatable',
  'design-pressures-disagree',
  'not-separable',
  'demand-only',
  'low-travel-not-visited',
  'too-few-months',
  'months-not-connected',
  'no-shut-spells',
  'meter-cut-off',
  'no-set-point',
  'one-direction-only',
  'too-few-slow-samples',
  'not-turbulent',
  'choked-throughout',
  'outside-the-standard',
  'flow-falls-as-valve-opens',
  'flow-does-not-follow',
  'trip-valve',
] as const;
export type ReasonCode = (typeof reasonCodes)[number];

/** A refusal to judge: the code, and the figures its sentence quotes (name → number). */
export interface CannotJudge {
  readonly judged: false;
  readonly reason: ReasonCode;
  readonly figures: Readonly<Record<string, number>>;
}

/** A refusal to judge, with the figures its sentence quotes. */
export function cannotJudge(reason: ReasonCode, figures: Record<string, number> = {}): CannotJudge {
  return { judged: false, reason, figures };
}
