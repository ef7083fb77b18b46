import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { type ValveForm } from '@tailrace/shared/contracts/valves';
import { type AssessedSpan, type Series, type SignalRole } from '@tailrace/shared/core/series';
import { type Site } from '@tailrace/shared/core/units/unit';

/** One valve and its recorded signals; the columns are handed over, not copied. */
export interface AssessTask {
  readonly form: ValveForm;
  readonly recorded: Partial<Record<SignalRole, Series>>;
  readonly span: AssessedSpan;
  readonly site: Site;
}

export type AssessOutcome =
  | { readonly kind: 'assessed'; readonly result: PresentedAssessment; readonly took: number }
  | { readonly kind: 'units'; readonly reason: string };
