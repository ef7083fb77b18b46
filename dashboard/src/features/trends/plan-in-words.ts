import { type ColumnPlan } from '@tailrace/shared/contracts/trends';

export const delimiterWords = { ',': 'comma', ';': 'semicolon', '\t': 'tab', '|': 'bar' } as const;
export const decimalWords = { '.': 'point: 12.5', ',': 'comma: 12,5' } as const;
export const formWords = { wide: 'a column a tag', long: 'a row a sample' } as const;
export const timeFormatWords = {
  iso: 'ISO: 2026-11-30T14:05:00Z',
  'epoch seconds': 'seconds since 1970',
  'epoch milliseconds': 'milliseconds since 1970',
  'year first': 'year first: 2026/11/30 14:05',
  'day first': 'day first: 30/11/2026 14:05',
  'month first': 'month first: 11/30/2026 14:05',
} as const;

const delimiterMany = { ',': 'commas', ';': 'semicolons', '\t': 'tabs', '|': 'bars' } as const;

/** How a file is read, in one sentence. */
export function planInWords({ form, delimiter, decimalMark, time }: ColumnPlan): string {
  return (
    `${form === 'wide' ? 'A column for each tag' : 'A row for each sample'}, parted by ${delimiterMany[delimiter]}, ` +
    `decimal ${decimalMark === '.' ? 'point' : 'comma'}; time in the column “${time.column}”, ` +
    `${timeFormatWords[time.format].split(':')[0]}; stamps without an offset are read as ${time.zone}.`
  );
}
