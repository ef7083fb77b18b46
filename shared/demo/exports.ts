import { type Series } from '../src/core/series.js';

/** One column of an export: the historian's name, its unit, and its samples in the units the plant records in. */
export interface Column {
  readonly tag: string;
  readonly unit: string | null;
  readonly series: Series;
  readonly decimals: number;
}

/** A wide export: one row an instant, one column a tag. Samples are at common instants. */
export function wideExport(
  columns: readonly Column[],
  options: {
    readonly delimiter: string;
    readonly decimalMark: '.' | ',';
    readonly stamp: (t: number) => string;
    readonly timeHeader: string;
  },
): string {
  const { delimiter, decimalMark, stamp, timeHeader } = options;
  const header = [timeHeader, ...columns.map(({ tag, unit }) => (unit === null ? tag : `${tag} [${unit}]`))];
  const times = columns[0]?.series.time ?? new Float64Array(0);
  const rows = [header.join(delimiter)];
  for (let i = 0; i < times.length; i++) {
    const cells = columns.map(({ series, decimals }) =>
      plain(series.value[i] as number, decimals).replace('.', decimalMark),
    );
    rows.push([stamp(times[i] as number), ...cells].join(delimiter));
  }
  return `${rows.join('\n')}\n`;
}

/** A long export: one row a sample with its quality, in order of time. Every two-thousandth sample is bad. */
export function longExport(columns: readonly Column[], stamp: (t: number) => string): string {
  const samples = columns.flatMap(({ tag, series, decimals }, column) =>
    Array.from(series.time, (time, i) => ({
      time,
      column,
      tag,
      text: plain(series.value[i] as number, decimals),
    })),
  );
  samples.sort((a, b) => a.time - b.time || a.column - b.column);
  const rows = samples.map(({ time, tag, text }, i) =>
    i % 2000 === 1999 ? `${stamp(time)},${tag},Bad,Bad` : `${stamp(time)},${tag},${text},Good`,
  );
  return `timestamp,tag,value,quality\n${rows.join('\n')}\n`;
}

function plain(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}
