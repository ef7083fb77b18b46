import { z } from 'zod';
import { findingKinds } from '../core/findings/kinds.js';
import { pageOf } from './paging.js';
import { instant } from './text.js';

export const findingKind = z.enum(findingKinds);
export const findingState = z.enum(['new', 'confirmed', 'shelved', 'ruled out', 'cleared']);
export type FindingState = z.infer<typeof findingState>;

/** A finding in an assessment, with its words. */
export const assessedFinding = z.object({
  kind: findingKind,
  severity: z.number(),
  confidence: z.number(),
  /** the finding written out with its figure */
  text: z.string(),
  nextStep: z.string(),
  /** what could make it false */
  doubts: z.array(z.string()),
  explainedBy: findingKind.nullable(),
  rule: z.string(),
  x: z.number(),
  raise: z.number(),
  actNow: z.number(),
  standardError: z.number().nullable(),
  evidence: z.record(z.string(), z.number().nullable()),
});
export type AssessedFinding = z.infer<typeof assessedFinding>;

/** A finding as it lives on across assessments. */
export const finding = z.object({
  id: z.uuid(),
  number: z.number().int(),
  valveTag: z.string(),
  kind: findingKind,
  state: findingState,
  severity: z.number(),
  confidence: z.number(),
  text: z.string(),
  explainedBy: findingKind.nullable(),
  firstSeen: instant,
  lastSeen: instant,
});
export type LivingFinding = z.infer<typeof finding>;
export const findingPage = pageOf(finding);
export type FindingPage = z.infer<typeof findingPage>;
