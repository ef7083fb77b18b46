import { type ColumnPlan } from '@tailrace/shared/contracts/trends';
import { parse } from 'csv-parse';
import { finished } from 'node:stream/promises';
import { asRefusal, openText, type OpenText } from './open-text.js';
import { Refusal } from './refusal.js';

/** Bytes of one row; a row beyond is a quote that was never closed. */
const longestRow = 1024 ** 2;

export interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

/**
 * The rows of a trend file as text cells, blank lines left out, as many at a time as one chunk of the file holds:
 * an await for each row would cost more than reading it. Ends with a Refusal where the file cannot be read.
 */
export async function* readRows(
  path: string,
  plan: Pick<ColumnPlan, 'delimiter'>,
  opened?: (text: OpenText) => void,
): AsyncGenerator<Row[]> {
  const text = await openText(path);
  opened?.(text);
  const parser = parse({
    delimiter: plan.delimiter,
    relax_column_count: true,
    relax_quotes: true,
    skip_empty_lines: false,
    max_record_size: longestRow,
  });
  let broken: Error | null = null;
  parser.on('error', (error) => (broken = error));
  let line = 0;
  const parsed = (): Row[] => {
    const rows: Row[] = [];
    for (
      let cells = parser.read() as string[] | null;
      cells !== null;
      cells = parser.read() as string[] | null
    ) {
      line += 1;
      if (cells.length > 1 || cells[0]?.trim()) rows.push({ line, cells });
    }
    return rows;
  };
  try {
    for await (const chunk of text.stream) {
      parser.write(chunk);
      yield parsed();
      // The parser's error is emitted a tick later than the rows before it.
      if (broken) break;
    }
    if (!broken) {
      parser.end();
      const ended = finished(parser, { readable: false }).catch(() => undefined);
      yield parsed();
      await ended;
      yield parsed();
    }
  } catch (error) {
    throw asRefusal(error);
  } finally {
    text.stream.destroy();
    parser.destroy();
  }
  if (broken) throw asUnreadable(broken, line + 1);
}

function asUnreadable(error: Error & { code?: unknown }, line: number): unknown {
  const quote = error.code === 'CSV_MAX_RECORD_SIZE' || error.code === 'CSV_QUOTE_NOT_CLOSED';
  return quote ? Refusal.because('rowTooLong', line) : error;
}
