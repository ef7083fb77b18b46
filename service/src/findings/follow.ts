import { type AssessedFinding, type FindingState } from '@tailrace/shared/contracts/findings';
import { type FindingKind } from '@tailrace/shared/core/findings/kinds';

/** The part of a living finding that an assessment can move. */
export interface Standing {
  readonly kind: FindingKind;
  readonly state: FindingState;
  readonly missed: number;
}

/** What becomes of one kind after an assessment. */
export type Step =
  | { readonly what: 'opens'; readonly found: AssessedFinding }
  | { readonly what: 'goes on'; readonly kind: FindingKind; readonly found: AssessedFinding }
  | { readonly what: 'reopens'; readonly kind: FindingKind; readonly found: AssessedFinding }
  | { readonly what: 'is missed'; readonly kind: FindingKind; readonly missed: number }
  | { readonly what: 'clears'; readonly kind: FindingKind };

/** Assessments in a row that must not support a finding before it clears (methods.md §9.1: two). */
export const missesToClear = 2;

/**
 * How the findings of one valve follow its new assessment: one finding a kind lives on, clears itself when two
 * assessments in a row no longer support it, and reopens when it comes back. What a person ruled out stays so.
 *
 * @param standing the valve's findings so far, one a kind
 * @param found the findings of the new assessment
 * @param notJudged kinds the new assessment could not judge: they neither support nor clear
 */
export function followFindings(
  standing: readonly Standing[],
  found: readonly AssessedFinding[],
  notJudged: ReadonlySet<string>,
): Step[] {
  const byKind = new Map(standing.map((finding) => [finding.kind, finding]));
  const steps: Step[] = [];
  for (const finding of found) {
    const before = byKind.get(finding.kind);
    byKind.delete(finding.kind);
    if (!before) steps.push({ what: 'opens', found: finding });
    else if (before.state === 'cleared') steps.push({ what: 'reopens', kind: before.kind, found: finding });
    else steps.push({ what: 'goes on', kind: before.kind, found: finding });
  }
  for (const before of byKind.values()) {
    if (before.state === 'cleared' || notJudged.has(before.kind)) continue;
    const missed = before.missed + 1;
    if (missed >= missesToClear) steps.push({ what: 'clears', kind: before.kind });
    else steps.push({ what: 'is missed', kind: before.kind, missed });
  }
  return steps;
}
