import { type Assessment, type Finding, type KindFigure } from '../assessment.js';
import { type Limits } from '../limits.js';
import { isBeyond, severityOf } from './confidence.js';
import { withConsequences } from './consequences.js';
import { type FindingKind } from './kinds.js';

/** A finding as it stands over successive assessments. */
export interface StandingFinding {
  readonly finding: Finding;
  /** x smoothed over months, which severity follows */
  readonly smoothed: number;
  /** the kind's own factor of severity when it was last raised */
  readonly factor: number;
  /** successive assessments in which x was under the keep level */
  readonly under: number;
}

/** Successive assessments under the keep level that end a finding. */
const endsAfter = 2;
/** Share of the new figure in a continuing one (§9.3 (2)). */
const newest = 0.6;

/**
 * Carries findings from one assessment to the next: once raised a finding stays until its figure has been under
 * its keep level twice in a row; its figure is smoothed while it goes on; where its kind could not be judged it
 * stays as it was.
 *
 * @param previous what stood after the assessment before; empty for a first one
 * @param current the new assessment's findings, figures and refusals
 * @returns what stands now, with severity by the smoothed figure and consequences marked anew
 * Source: methods.md §9.1, §9.3 (1), (2)
 */
export function standingFindings(
  previous: readonly StandingFinding[],
  current: Pick<Assessment, 'findings' | 'figures' | 'notJudged'>,
  limits: Limits,
): StandingFinding[] {
  const before = new Map(previous.map((s) => [s.finding.kind, s]));
  const standing: StandingFinding[] = current.findings.map((finding) => {
    const last = before.get(finding.kind);
    before.delete(finding.kind);
    const continues = last !== undefined && last.finding.rule === finding.rule;
    const smoothed = continues ? newest * finding.x + (1 - newest) * last.smoothed : finding.x;
    const plain = severityOf({ ...finding, severityFactor: 1 });
    const factor = plain > 0 ? finding.severity / plain : 1;
    return { finding: atFigure(finding, finding.x, smoothed, factor), smoothed, factor, under: 0 };
  });
  for (const last of before.values()) {
    if (current.notJudged.some((k) => k.kind === last.finding.kind)) {
      standing.push(last);
      continue;
    }
    const figure = figureOf(current.figures, last.finding.kind, last.finding.rule);
    const kept = figure !== null && isAtKeepLevel(figure, limits);
    const under = kept ? 0 : last.under + 1;
    if (under >= endsAfter) continue;
    const smoothed = figure === null ? last.smoothed : newest * figure.x + (1 - newest) * last.smoothed;
    const finding = atFigure(last.finding, figure?.x ?? last.finding.x, smoothed, last.factor);
    standing.push({ finding, smoothed, factor: last.factor, under });
  }
  const marked = withConsequences(standing.map((s) => ({ ...s.finding, explainedBy: null })));
  return standing.map((s, i) => ({ ...s, finding: marked[i] as Finding }));
}

function figureOf(figures: readonly KindFigure[], kind: FindingKind, rule: string): KindFigure | null {
  return figures.find((f) => f.kind === kind && f.rule === rule) ?? null;
}

/** The keep level is 0.85 of the raise threshold; for a falling figure, that much less far from healthy. */
export function isAtKeepLevel({ x, raise, actNow }: KindFigure, limits: Limits): boolean {
  const keep = actNow >= raise ? limits.findings.keep * raise : raise / limits.findings.keep;
  return isBeyond(x, keep, actNow);
}

/** A finding at its newest figure, with the severity its smoothed figure gives (never below that of the raise threshold). */
function atFigure(finding: Finding, x: number, smoothed: number, factor: number): Finding {
  return { ...finding, x, severity: severityOf({ ...finding, x: smoothed, severityFactor: factor }) };
}
