import { quantile } from '../statistics/quantile.js';

/** The metric on one day in one duty band (of flow, or of required coefficient). */
export interface DailyValue {
  /** calendar day, UTC, counted in days */
  readonly day: number;
  /** any number that names the band */
  readonly band: number;
  readonly value: number;
  /** time behind the value, s */
  readonly seconds: number;
}

/** One value a day on either side of a change, comparable in duty. */
export interface MatchedDays {
  readonly before: Float64Array;
  readonly after: Float64Array;
  /** share of the time before that was spent in bands also seen after */
  readonly dutyShared: number;
}

/**
 * Daily values that compare like with like: only bands present on both sides, each weighted by the smaller of its two
 * shares of time.
 *
 * A day seldom visits all bands, so each band's own level (half way between its two medians) is taken out first; else a
 * day at high load would read as a change.
 *
 * @param before rows with finite values and time above 0; others are left out
 * @param after same
 * @returns values about zero: only their differences mean something; empty where no band is shared
 * Source: methods.md §10.3
 */
export function matchDuty(before: readonly DailyValue[], after: readonly DailyValue[]): MatchedDays {
  const one = byBand(before);
  const other = byBand(after);
  const bands = new Map<number, { weight: number; level: number }>();
  let dutyShared = 0;
  for (const [band, rows] of one.rows) {
    const others = other.rows.get(band);
    if (others === undefined) continue;
    const share = secondsOf(rows) / one.seconds;
    dutyShared += share;
    bands.set(band, {
      weight: Math.min(share, secondsOf(others) / other.seconds),
      level: (middle(rows) + middle(others)) / 2,
    });
  }
  return { before: daysOf(before, bands), after: daysOf(after, bands), dutyShared };
}

const usable = (row: DailyValue) => Number.isFinite(row.value) && row.seconds > 0;
const secondsOf = (rows: readonly DailyValue[]) => rows.reduce((sum, row) => sum + row.seconds, 0);
const middle = (rows: readonly DailyValue[]) =>
  quantile(
    rows.map((row) => row.value),
    0.5,
  );

function byBand(rows: readonly DailyValue[]) {
  const good = rows.filter(usable);
  const grouped = new Map<number, DailyValue[]>();
  for (const row of good) grouped.set(row.band, [...(grouped.get(row.band) ?? []), row]);
  return { rows: grouped, seconds: secondsOf(good) };
}

function daysOf(
  rows: readonly DailyValue[],
  bands: ReadonlyMap<number, { readonly weight: number; readonly level: number }>,
): Float64Array {
  const days = new Map<number, { sum: number; weight: number }>();
  for (const row of rows.filter(usable)) {
    const band = bands.get(row.band);
    if (band === undefined) continue;
    const day = days.get(row.day) ?? { sum: 0, weight: 0 };
    day.sum += band.weight * (row.value - band.level);
    day.weight += band.weight;
    days.set(row.day, day);
  }
  return Float64Array.from(
    [...days].sort(([a], [b]) => a - b),
    ([, { sum, weight }]) => sum / weight,
  );
}
