import { type PresentedAssessment } from '../contracts/assessments.js';
import { type ValveForm } from '../contracts/valves.js';
import { assess } from '../core/assess.js';
import { defaultLimits, type Limits } from '../core/limits.js';
import { type AssessedSpan, type Series, type SignalRole, type Span } from '../core/series.js';
import { type UnitRemark } from '../core/units/register-form.js';
import { type Site, standardSite } from '../core/units/unit.js';
import { valveRecord } from '../core/units/valve-record.js';
import { unitRemarkSentence } from '../messages/unit-remarks.js';
import { presentAssessment } from './present-assessment.js';

export interface FormAssessment {
  readonly result: PresentedAssessment;
}

/**
 * From the register's form of a valve and its recorded signals to the assessment as it is printed and stored: the
 * one way the worker and the command line go.
 *
 * @param recorded raw samples by role, in the units the form names
 * @param span s UTC; null: the whole record
 * @returns what is wrong with the form's units instead, where they cannot be used; never a throw
 */
export function assessForm(
  form: ValveForm,
  recorded: Readonly<Partial<Record<SignalRole, Series>>>,
  options: { readonly span?: AssessedSpan | null; readonly limits?: Limits; readonly site?: Site } = {},
): FormAssessment | { readonly problems: readonly UnitRemark[] } {
  const reading = valveRecord(form, options.site ?? standardSite);
  if ('problems' in reading) return reading;
  const span = options.span ?? wholeRecord(recorded);
  const assessment = assess(
    reading.valve,
    reading.historyOf(recorded),
    span,
    options.limits ?? defaultLimits,
  );
  const result = presentAssessment(assessment, form, reading.valve.dataSheet);
  return { result: { ...result, warnings: [...result.warnings, ...reading.doubts.map(unitRemarkSentence)] } };
}

/** From the first sample of any signal to just after the last. */
export function wholeRecord(recorded: Readonly<Partial<Record<SignalRole, Series>>>): Span {
  let from = Infinity;
  let to = -Infinity;
  for (const { time } of Object.values(recorded)) {
    if (time.length === 0) continue;
    from = Math.min(from, time[0] as number);
    to = Math.max(to, time[time.length - 1] as number);
  }
  return from <= to ? { from, to: to + 1 } : { from: 0, to: 0 };
}
