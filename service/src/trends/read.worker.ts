import { once } from 'node:events';
import { readTrend } from './reading/read-trend.js';
import { Refusal } from './reading/refusal.js';
import { type ReadMessage, type ReadOutcome, type ReadTask } from './read-task.js';
import { blocksOf, blockSize } from './store/sample-block.js';

/** Reads a trend file in a thread of its own and hands encoded blocks over. */
export default async function read({ path, plan, wanted, port }: ReadTask): Promise<ReadOutcome> {
  const tags = new Set(wanted);
  const say = (message: ReadMessage) => port.postMessage(message);
  let spoke = 0;
  try {
    const report = await readTrend({
      path,
      plan,
      batch: blockSize,
      wanted: (tag) => tags.has(tag),
      onSamples: async (tag, series) => {
        const stored = once(port, 'message');
        say({ kind: 'blocks', tag, blocks: blocksOf(series) });
        await stored;
      },
      onProgress: ({ share, rows }) => {
        const now = Date.now();
        if (now - spoke < 400) return;
        spoke = now;
        say({ kind: 'progress', share, rows });
      },
    });
    return { kind: 'read', report };
  } catch (error) {
    if (error instanceof Refusal) return { kind: 'refused', sentence: error.message };
    throw error;
  } finally {
    port.close();
  }
}
