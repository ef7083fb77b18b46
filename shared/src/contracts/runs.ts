import { z } from 'zod';
import { pageOf, pageQuery } from './paging.js';
import { instant, tagText } from './text.js';

export const runStates = ['waiting', 'running', 'done', 'done with failures', 'stopped'] as const;
export const runState = z.enum(runStates);
export type RunState = z.infer<typeof runState>;

export const runDraft = z.object({
  /** only these valves; left out, every valve of the asker's areas */
  tags: z.array(tagText).max(5000).optional(),
  /** window; left out, the default window ending at the newest sample's last full day */
  from: instant.optional(),
  to: instant.optional(),
});
export type RunDraft = z.infer<typeof runDraft>;

export const analysisRun = z.object({
  id: z.uuid(),
  number: z.number().int(),
  state: runState,
  trigger: z.enum(['schedule', 'person', 'seed']),
  requestedBy: z.string().nullable(),
  createdAt: instant,
  startedAt: instant.nullable(),
  finishedAt: instant.nullable(),
  valves: z.number().int(),
  judged: z.number().int(),
  notJudged: z.number().int(),
  failed: z.number().int(),
});
export type AnalysisRun = z.infer<typeof analysisRun>;
export const runPage = pageOf(analysisRun).extend({
  /** the nightly schedule in words-ready form: local time and zone, and the next instant */
  schedule: z.object({ at: z.string(), zone: z.string(), next: instant.nullable() }),
});
export type RunPage = z.infer<typeof runPage>;
export const runQuery = pageQuery;

export const valveOutcome = z.object({
  tag: z.string(),
  outcome: z.enum(['waiting', 'judged', 'not judged', 'failed', 'stopped']),
  reason: z.string().nullable(),
  findings: z.number().int(),
  /** ms of computing */
  took: z.number().nullable(),
});
export type ValveOutcome = z.infer<typeof valveOutcome>;
export const runDetail = analysisRun.extend({ outcomes: z.array(valveOutcome) });
export type RunDetail = z.infer<typeof runDetail>;

/** Run states a person can still stop. */
export const stoppable: readonly RunState[] = ['waiting', 'running'];
