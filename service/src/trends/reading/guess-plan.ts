import { type ColumnPlan, timeFormats } from '@tailrace/shared/contracts/trends';
import { parse } from 'csv-parse/sync';
import { cellValue } from './cell-value.js';
import { Refusal } from './refusal.js';
import { stampReader } from './stamp.js';

export interface GuessedPlan {
  readonly plan: ColumnPlan;
  /** the header's cells and the first rows below it */
  readonly header: readonly string[];
  readonly rows: readonly (readonly string[])[];
  /** what a person should look at before trusting the guess */
  readonly doubts: readonly string[];
}

const delimiters = ['\t', ';', '|', ','] as const;
const headersTried = 30;
const rowsLookedAt = 200;

/**
 * Guesses how a trend file is read from its first lines.
 *
 * @param text the beginning of the file; its last line may be cut
 * @param zone zone of stamps that name no offset: the site's
 * @throws Refusal where no column of times and values can be found
 */
export function guessPlan(text: string, zone: string): GuessedPlan {
  const lines = text.split(/\r\n|\n|\r/);
  if (lines.length > 1 && !/[\r\n]$/.test(text) && text.length > 32_000) lines.pop();
  if (lines.every((line) => line.trim() === '')) throw Refusal.because('empty');
  for (const delimiter of delimiters) {
    const table = tableOf(lines, delimiter);
    for (let at = 0; at < Math.min(headersTried, table.length); at++) {
      const found = planBelow(table, at, delimiter, zone);
      if (found) return found;
    }
  }
  if (lines.filter((line) => line.trim() !== '').length === 1) throw Refusal.because('headerOnly');
  throw Refusal.because('notATable');
}

interface NumberedRow {
  readonly line: number;
  readonly cells: readonly string[];
}

function tableOf(lines: readonly string[], delimiter: string): NumberedRow[] {
  try {
    const rows = parse(lines.slice(0, rowsLookedAt + headersTried).join('\n'), {
      delimiter,
      relax_column_count: true,
      relax_quotes: true,
    });
    return rows
      .map((cells, i) => ({ line: i + 1, cells }))
      .filter(({ cells }) => cells.length > 1 || cells[0]?.trim());
  } catch {
    // A quote that is never closed: the rows before it still tell the plan, and reading will name the line.
    return lines.slice(0, rowsLookedAt).map((text, i) => ({ line: i + 1, cells: text.split(delimiter) }));
  }
}

function planBelow(
  table: readonly NumberedRow[],
  at: number,
  delimiter: ColumnPlan['delimiter'],
  zone: string,
): GuessedPlan | null {
  const head = table[at];
  if (!head || head.cells.length < 2) return null;
  const header = head.cells.map((cell) => cell.trim());
  const rows = table.slice(at + 1).map(({ cells }) => cells);
  const sample = rows.filter((cells) => fitsHeader(cells, header.length));
  if (sample.length === 0 || sample.length < 0.8 * rows.length) return null;
  const doubts: string[] = [];
  const time = timeColumn(header, sample, zone, doubts);
  if (!time) return null;
  const decimalMark = decimalMarkOf(sample, time.index, delimiter);
  const long = longColumns(header, sample, time.index, decimalMark);
  const plan: ColumnPlan = {
    form: long ? 'long' : 'wide',
    delimiter,
    decimalMark,
    headerLine: head.line,
    time: { column: header[time.index] ?? '', format: time.format, zone },
    long,
    uncertainIsGood: false,
  };
  return { plan, header, rows: rows.slice(0, 20), doubts };
}

/** As many cells as the header, or one empty one more where rows end in a column mark. */
function fitsHeader(cells: readonly string[], width: number): boolean {
  return cells.length === width || (cells.length === width + 1 && cells[width]?.trim() === '');
}

/** The first column that reads as time in most rows, and in which format. */
function timeColumn(
  header: readonly string[],
  rows: readonly (readonly string[])[],
  zone: string,
  doubts: string[],
): { index: number; format: ColumnPlan['time']['format'] } | null {
  for (let index = 0; index < Math.min(header.length, 6); index++) {
    if (header[index] === '') continue;
    const cells = rows.map((row) => row[index] ?? '');
    const fitting = timeFormats.filter(
      (format) => readsAs(cells, format, zone) && !readsAs([header[index] ?? ''], format, zone),
    );
    const format = fitting.find((f) => plausible(cells, f));
    if (!format) continue;
    if (format === 'day first' && fitting.includes('month first'))
      doubts.push(
        'The days and months in the first rows fit day first and month first alike; day first was taken.',
      );
    if (!format.startsWith('epoch') && !cells.some((cell) => /(Z|UTC|[+-]\d{2}:?\d{2})$/i.test(cell.trim())))
      doubts.push(`The times name no zone; they are read as local time in ${zone}.`);
    if (!format.startsWith('epoch') && !cells.some((cell) => /\d:\d\d/.test(cell)))
      doubts.push(
        'The times hold a date and no time of day. Where the time of day stands in a column of its own, all rows of a day would fall on one instant: join the two columns before bringing the file in.',
      );
    return { index, format };
  }
  return null;
}

function readsAs(cells: readonly string[], format: ColumnPlan['time']['format'], zone: string): boolean {
  const read = stampReader({ format, zone });
  const understood = cells.filter((cell) => read(cell).kind !== 'not understood').length;
  return understood > 0 && understood >= 0.5 * cells.length;
}

/** A column of small numbers reads as epoch seconds too; a trend does not begin in 1970. */
function plausible(cells: readonly string[], format: ColumnPlan['time']['format']): boolean {
  if (!format.startsWith('epoch')) return true;
  const least = format === 'epoch seconds' ? 3e8 : 3e11;
  const most = format === 'epoch seconds' ? 2e10 : Infinity;
  return cells.every((cell) => Number(cell) >= least && Number(cell) <= most);
}

function decimalMarkOf(
  rows: readonly (readonly string[])[],
  time: number,
  delimiter: ColumnPlan['delimiter'],
): '.' | ',' {
  if (delimiter === ',') return '.';
  const cells = rows.flatMap((row) => row.filter((_, i) => i !== time));
  const comma = cells.filter((cell) => /^[+-]?\d+,\d+$/.test(cell.trim())).length;
  const point = cells.filter((cell) => /^[+-]?\d+\.\d+$/.test(cell.trim())).length;
  return comma > point ? ',' : '.';
}

const tagNames = /^(tag|tagname|tag name|point|point ?name|signal|name|item|variable)$/i;
const valueNames = /^(value|val|reading|data)$/i;
/** What historians write in place of a value: a column of nothing else is a dead signal, not a column of tags. */
const noValue =
  /^(\W*|[\W\d]*(bad|nan|null|none|n\/?a|no ?(data|good|value)|not connected|err(or)?|fail(ed|ure)?|invalid|i\/o timeout|time ?out|pt created|comm ?fail|shutdown|scan off|arc off-?line)\b.*)$/i;
/** Words of a quality column: whether a value can be trusted, never whose it is. */
const qualityWord = /^(good|ok|uncertain|questionable)(,.*)?$/i;
const qualityNames = /^(quality|status|q|confidence|opc ?quality)$/i;

const saysNoTag = (cell: string) => noValue.test(cell) || qualityWord.test(cell.trim());

/** The columns of the long form: one of tag names, one of values, perhaps one of qualities. */
function longColumns(
  header: readonly string[],
  rows: readonly (readonly string[])[],
  time: number,
  mark: '.' | ',',
): ColumnPlan['long'] {
  const named = (pattern: RegExp) => header.findIndex((name, i) => i !== time && pattern.test(name));
  const isText = (index: number) => rows.every((row) => cellValue(row[index] ?? '', mark).kind === 'bad');
  let tag = named(tagNames);
  // Without a name that says so, one column of figures beside the names is what tells the long form.
  const plain = header.flatMap((name, i) => (i === time || qualityNames.test(name) ? [] : [i]));
  if (tag < 0 && header.length <= 5 && plain.filter((i) => !isText(i)).length === 1)
    tag = plain.find((i) => isText(i) && !rows.every((row) => saysNoTag(row[i] ?? ''))) ?? -1;
  if (tag < 0) return null;
  let value = named(valueNames);
  if (value < 0)
    value = header.findIndex((name, i) => i !== time && i !== tag && !qualityNames.test(name) && !isText(i));
  if (value < 0) return null;
  const quality = named(qualityNames);
  return {
    tagColumn: header[tag] ?? '',
    valueColumn: header[value] ?? '',
    qualityColumn: quality < 0 ? null : (header[quality] ?? null),
  };
}
