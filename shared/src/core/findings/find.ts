import { type Finding, type KindFigure, type KindNotJudged } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { confidenceOf, isBeyond, isConfident, severityOf } from './confidence.js';
import { withConsequences } from './consequences.js';
import { type Chapters, type FindingRule, type Measure } from './finding-rule.js';
import { type FindingKind, findingKinds } from './kinds.js';
import { findingRules } from './rules.js';

/** Everything §9 says of one assessment. */
export interface Found {
  readonly findings: readonly Finding[];
  readonly notJudged: readonly KindNotJudged[];
  readonly figures: readonly KindFigure[];
}

/** Kinds that are advice on tuning or trim: never given for a trip valve (§11). */
const advice: ReadonlySet<FindingKind> = new Set<FindingKind>([
  'Oversized',
  'Undersized',
  'Hunting',
  'Excess movement',
  'Uneven gain',
]);

/**
 * Applies every kind's rule to one assessment: what is raised, what could not be judged and why, and the figure
 * of every kind judged, raised or not.
 *
 * Source: methods.md §9.1, §9.2
 */
export function find(chapters: Chapters, sheet: DataSheet, limits: Limits): Found {
  const findings: Finding[] = [];
  const notJudged: KindNotJudged[] = [];
  const figures: KindFigure[] = [];
  for (const kind of findingKinds) {
    const rule = findingRules[kind];
    if (sheet.trip && advice.has(kind)) {
      notJudged.push({ kind, reason: 'trip-valve', figures: {} });
      continue;
    }
    const measures = rule.measure(chapters, sheet, limits);
    if ('reason' in measures) {
      notJudged.push({ kind, reason: measures.reason, figures: measures.figures });
      continue;
    }
    const known = measures.filter((m) => Number.isFinite(m.x));
    for (const { rule: name, x, raise, actNow } of known)
      figures.push({ kind, rule: name, x, raise, actNow });
    const finding = mostSevere(rule, known, chapters, limits);
    if (finding !== null) findings.push(finding);
  }
  return { findings: withConsequences(findings), notJudged, figures };
}

function mostSevere(
  rule: FindingRule,
  measures: readonly Measure[],
  chapters: Chapters,
  limits: Limits,
): Finding | null {
  let worst: Finding | null = null;
  for (const measure of measures) {
    if (!measure.holds || !isBeyond(measure.x, measure.raise, measure.actNow)) continue;
    const confidence = confidenceOf(measure, chapters);
    if (!isConfident(confidence, limits)) continue;
    const severity = severityOf(measure);
    if (worst !== null && worst.severity >= severity) continue;
    const { x, raise, actNow, standardError, rule: name, evidence } = measure;
    worst = {
      kind: rule.kind,
      severity,
      confidence,
      x,
      raise,
      actNow,
      standardError,
      rule: name,
      explainedBy: null,
      evidence,
    };
  }
  return worst;
}
