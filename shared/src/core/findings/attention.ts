import { type Assessment, type Finding } from '../assessment.js';
import { type Criticality, type DataSheet } from '../data-sheet.js';
import { findingRules } from './rules.js';

const criticalityFactor: Record<Criticality, number> = { high: 1, normal: 0.8, low: 0.6 };

/** How much a valve deserves work now, with each finding's term. */
export interface Attention {
  /** 0 to 100; null for a trip valve */
  readonly attention: number | null;
  readonly attentionTerms: Assessment['attentionTerms'];
}

/**
 * Attention A = 100·K·(1 − Π(1 − w·s·v)) over the findings that count. It rises with each finding, never passes
 * 100·K, and ten trifles do not outrank one real fault.
 *
 * Safety-instrumented valves get none: they have their own list.
 *
 * @example // terms (0.54, w 1) and (0.24, w 0.4), K 0.8: 46.73
 * Source: methods.md §9.3
 */
export function attentionOf(findings: readonly Finding[], sheet: DataSheet): Attention {
  const attentionTerms = findings
    .filter((f) => f.explainedBy === null)
    .map(({ kind, severity, confidence }) => ({
      kind,
      weight: findingRules[kind].weight,
      severity,
      confidence,
    }));
  if (sheet.trip) return { attention: null, attentionTerms };
  const left = attentionTerms.reduce((rest, t) => rest * (1 - t.weight * t.severity * t.confidence), 1);
  return { attention: 100 * criticalityFactor[sheet.criticality] * (1 - left), attentionTerms };
}

/** What the ranking's order is made from. */
export interface Ranked {
  readonly tag: string;
  readonly attention: number;
  readonly largestTerm: number;
  readonly criticality: Criticality;
}

/**
 * Order of the ranking: attention at whole numbers, then the largest single s·v, then criticality, then tag.
 *
 * @returns below 0 where `one` stands first
 * Source: methods.md §9.3 (4), (5)
 */
export function compareRank(one: Ranked, other: Ranked): number {
  return (
    Math.round(other.attention) - Math.round(one.attention) ||
    other.largestTerm - one.largestTerm ||
    criticalityFactor[other.criticality] - criticalityFactor[one.criticality] ||
    (one.tag < other.tag ? -1 : one.tag > other.tag ? 1 : 0)
  );
}

/** Change of attention from which a move of rank is worth telling (§9.3 (6)). */
const tellingChange = 5;

/** True where a valve's move in the ranking is worth telling: its own attention changed by 5 or more. */
export function isTellingMove(attention: number, before: number): boolean {
  return Math.abs(attention - before) >= tellingChange;
}

const carried = 0.8;
const carriedMonths = 2;

/** Attention of a valve that could not be judged this month. */
export interface CarriedAttention {
  readonly attention: number;
  /** months in a row it could not be judged, this one included */
  readonly months: number;
}

/**
 * A valve that cannot be judged this month keeps last month's attention × 0.8, for at most two months, then leaves
 * the ranking.
 *
 * @param before last month's attention, and how many months it had already been carried
 * @returns null where it leaves the ranking
 * Source: methods.md §9.3 (3)
 */
export function carryAttention(before: CarriedAttention): CarriedAttention | null {
  if (before.months >= carriedMonths) return null;
  return { attention: carried * before.attention, months: before.months + 1 };
}
