import { type Assessment } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type CannotJudge } from '../reasons.js';
import { type FindingKind } from './kinds.js';

/** The chapters of an assessment a finding is measured on: everything but the findings themselves. */
export type Chapters = Omit<
  Assessment,
  'findings' | 'figures' | 'notJudged' | 'attention' | 'attentionTerms' | 'judged' | 'reason'
>;

/** A kind's figure on one assessment, before severity, confidence and hysteresis, which are the same for all. */
export interface Measure {
  /** the figure, in the unit of the kind's limits */
  readonly x: number;
  /** standard error of x (the absolute one where x compares with the sheet), or null where x is a plain share */
  readonly standardError: number | null;
  readonly raise: number;
  readonly actNow: number;
  /** which rule of the kind this is, for kinds with more than one */
  readonly rule: string;
  /** conditions beside the threshold (jump share, amplitude …) hold */
  readonly holds: boolean;
  /** multiplies severity: 1 unless the handbook says otherwise */
  readonly severityFactor: number;
  /** what the figure rests on: decides the source part of confidence (§9.1) */
  readonly rests: { readonly onPosition: boolean; readonly onPressures: boolean };
  /** the figure is a plain fact of its own record, which needs no minimum of data to be said */
  readonly ofRecord?: boolean;
  readonly evidence: Readonly<Record<string, number | null>>;
}

/** One kind of finding: data and one function (methods.md §9.2). */
export interface FindingRule {
  readonly kind: FindingKind;
  /** weight in attention (§9.3) */
  readonly weight: number;
  /** other kinds this one explains when both are raised, and whether it does so on this assessment */
  readonly explains: readonly FindingKind[];
  /**
   * The kind's figures on one assessment, one a rule; the most severe decides. Empty: nothing to say.
   * A refusal lists the kind under "cannot judge".
   */
  measure(chapters: Chapters, sheet: DataSheet, limits: Limits): readonly Measure[] | CannotJudge;
}
