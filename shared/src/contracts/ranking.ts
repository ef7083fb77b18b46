import { z } from 'zod';
import { criticalities } from '../core/data-sheet.js';
import { findingKind, findingState } from './findings.js';
import { pageQuery } from './paging.js';
import { area } from './people.js';
import { instant } from './text.js';

export const rankingQuery = pageQuery.extend({
  area: z.uuid().optional(),
  kind: findingKind.optional(),
  state: findingState.optional(),
  criticality: z.enum(criticalities).optional(),
  q: z.string().trim().max(100).optional(),
  /** which list: ranked valves, trip valves, or those that cannot be judged */
  list: z.enum(['ranked', 'trip', 'not judged']).default('ranked'),
});
export type RankingQuery = z.infer<typeof rankingQuery>;

const curve = z.array(z.object({ travel: z.number(), value: z.number() }));

export const rankingRow = z.object({
  /** place among all valves the asker may see, 1 first; null for trip and unjudged valves */
  rank: z.number().int().nullable(),
  tag: z.string(),
  service: z.string().nullable(),
  area,
  criticality: z.enum(criticalities),
  trip: z.boolean(),
  attention: z.number().nullable(),
  /** null where the valve was never assessed */
  ridge: z
    .object({
      shares: z.array(z.number()),
      band: z.object({ low: z.number(), high: z.number() }),
      p5: z.number(),
      p50: z.number(),
      p95: z.number(),
    })
    .nullable(),
  /** values relative to the larger curve's top */
  glyph: z.object({ specified: curve, asFound: curve, basis: z.enum(['inherent', 'installed']) }).nullable(),
  findings: z.array(
    z.object({
      kind: findingKind,
      number: z.number().int(),
      state: findingState,
      severity: z.number(),
      confidence: z.number(),
      text: z.string(),
      explainedBy: findingKind.nullable(),
    }),
  ),
  /** why it is not judged, in words */
  reason: z.string().nullable(),
  window: z.object({ from: instant, to: instant }).nullable(),
});
export type RankingRow = z.infer<typeof rankingRow>;

export const rankingPage = z.object({
  rows: z.array(rankingRow),
  total: z.number().int(),
  summary: z.object({
    valves: z.number().int(),
    judged: z.number().int(),
    needAttention: z.number().int(),
    trips: z.number().int(),
    notJudged: z.number().int(),
    lastRun: z.object({ number: z.number().int(), finishedAt: instant }).nullable(),
    /** earliest start of the windows judged */
    since: instant.nullable(),
  }),
});
export type RankingPage = z.infer<typeof rankingPage>;
