import { unitRemarkSentence } from '@tailrace/shared/messages/unit-remarks';
import { assessForm } from '@tailrace/shared/register/assess-form';
import { type AssessOutcome, type AssessTask } from './assess-task.js';

/** Assesses one valve in a thread of its own. */
export default function assess({ form, recorded, span, site }: AssessTask): AssessOutcome {
  const started = performance.now();
  const outcome = assessForm(form, recorded, { span, site });
  return 'problems' in outcome
    ? { kind: 'units', reason: outcome.problems.map(unitRemarkSentence).join(' ') }
    : { kind: 'assessed', result: outcome.result, took: performance.now() - started };
}
