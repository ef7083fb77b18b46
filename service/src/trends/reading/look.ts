import { type ColumnPlan, type TrendLook } from '@tailrace/shared/contracts/trends';
import { columnHeader } from './column-header.js';
import { guessPlan } from './guess-plan.js';
import { openText, asRefusal } from './open-text.js';
import { readRows } from './read-rows.js';
import { stampReader } from './stamp.js';
import { findColumns } from './tag-columns.js';

const beginning = 64 * 1024;
const rowsShown = 20;
const rowsSearched = 5_000;
const examplesKept = 3;

export type FirstLook = Pick<TrendLook, 'plan' | 'header' | 'rows' | 'times' | 'doubts'> & {
  readonly tags: readonly {
    readonly historianTag: string;
    readonly unit: string | null;
    readonly examples: string[];
  }[];
};

/** Guesses a plan from the first 64 kB of a file. */
export async function guessFile(path: string, zone: string): Promise<{ plan: ColumnPlan; doubts: string[] }> {
  const { stream } = await openText(path);
  const parts: Buffer[] = [];
  let length = 0;
  try {
    for await (const chunk of stream) {
      parts.push(chunk as Buffer);
      length += (chunk as Buffer).length;
      if (length >= beginning) break;
    }
  } catch (error) {
    throw asRefusal(error);
  } finally {
    stream.destroy();
  }
  const text = Buffer.concat(parts).subarray(0, beginning).toString('utf8');
  const { plan, doubts } = guessPlan(text, zone);
  return { plan, doubts: [...doubts] };
}

/** The first rows of a file as a plan understands them, and the tags they hold. */
export async function lookAt(
  path: string,
  plan: ColumnPlan,
  doubts: readonly string[] = [],
): Promise<FirstLook> {
  const read = stampReader(plan.time);
  const tags = new Map<string, { unit: string | null; examples: string[] }>();
  const note = (name: string, cell: string) => {
    const { tag, unit } = columnHeader(name);
    const seen = tags.get(tag) ?? { unit, examples: [] };
    if (cell.trim() !== '' && seen.examples.length < examplesKept)
      seen.examples.push(cell.trim().slice(0, 40));
    tags.set(tag, seen);
  };
  let columns: ReturnType<typeof findColumns> | null = null;
  const rows: string[][] = [];
  const times: TrendLook['times'] = [];
  let searched = 0;
  search: for await (const batch of readRows(path, plan)) {
    for (const { line, cells } of batch) {
      if (line < plan.headerLine) continue;
      if (!columns) {
        columns = findColumns(cells, plan);
        continue;
      }
      searched += 1;
      if (searched > rowsSearched) break search;
      if (columns.long) note(cells[columns.long.tag] ?? '', cells[columns.long.value] ?? '');
      else for (const { index } of columns.tags) note(columns.header[index] ?? '', cells[index] ?? '');
      if (rows.length < rowsShown) {
        rows.push([...cells]);
        times.push(timeOf(read(cells[columns.time] ?? '')));
      }
      if (!columns.long && rows.length >= rowsShown) break search;
    }
  }
  return {
    plan,
    header: [...(columns?.header ?? [])],
    rows,
    times,
    doubts: [...doubts],
    tags: [...tags].filter(([tag]) => tag !== '').map(([historianTag, seen]) => ({ historianTag, ...seen })),
  };
}

function timeOf(stamp: ReturnType<ReturnType<typeof stampReader>>): TrendLook['times'][number] {
  switch (stamp.kind) {
    case 'time':
      return { instant: new Date(stamp.first * 1000).toISOString(), problem: null };
    case 'does not exist':
      return { instant: null, problem: 'This local time does not exist: the clock change skips it.' };
    case 'not understood':
      return { instant: null, problem: 'No time could be read here.' };
  }
}
