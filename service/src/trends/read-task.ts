import { type ColumnPlan, type TakeInReport } from '@tailrace/shared/contracts/trends';
import { type MessagePort } from 'node:worker_threads';
import { type SampleBlock } from './store/sample-block.js';

/** What the reading thread is asked to do. */
export interface ReadTask {
  readonly path: string;
  readonly plan: ColumnPlan;
  /** tags to take; the others stay in the file */
  readonly wanted: readonly string[];
  /** where blocks and progress go, and from where "go on" comes */
  readonly port: MessagePort;
}

/** What it says on the way. Blocks wait for "go on", so that reading never runs ahead of storing. */
export type ReadMessage =
  | { readonly kind: 'blocks'; readonly tag: string; readonly blocks: readonly SampleBlock[] }
  | { readonly kind: 'progress'; readonly share: number; readonly rows: number };

/** How it ends: a refusal is an answer, not a fault. */
export type ReadOutcome =
  | { readonly kind: 'read'; readonly report: TakeInReport }
  | { readonly kind: 'refused'; readonly sentence: string };
