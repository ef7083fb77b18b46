import { type ColumnPlan } from '@tailrace/shared/contracts/trends';
import { IANAZone } from 'luxon';

/**
 * What a time cell says. `first` is s UTC; `second` is the later reading of a local time that the autumn clock
 * change makes happen twice, NaN otherwise.
 */
export type Stamp =
  | { readonly kind: 'time'; readonly first: number; readonly second: number }
  | { readonly kind: 'does not exist' }
  | { readonly kind: 'not understood' };

const notUnderstood: Stamp = { kind: 'not understood' };
const doesNotExist: Stamp = { kind: 'does not exist' };
const quarter = 900_000;

type TimePlan = Pick<ColumnPlan['time'], 'format' | 'zone'>;

const clock = String.raw`(?:[T\s]+(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,](\d{1,9}))?)?\s*([AaPp]\.?[Mm]\.?)?)?`;
const offset = String.raw`\s*(Z|z|UTC|[+-]\d{2}:?\d{2})?`;
const yearFirst = new RegExp(String.raw`^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})${clock}${offset}$`);
const yearLast = new RegExp(String.raw`^(\d{1,2})[-/.](\d{1,2})[-/.](\d{4}|\d{2})${clock}${offset}$`);

/** The earliest and latest instants a trend is believed to hold, s UTC: 1970 to 2200. */
const believable = { from: 0, to: 7_258_118_400 };

/**
 * A reader of time cells in one format and zone. A stamp that names its own offset is taken at its word; others
 * are wall time in the plan's zone.
 */
export function stampReader({ format, zone }: TimePlan): (text: string) => Stamp {
  if (format === 'epoch seconds') return epochReader(1);
  if (format === 'epoch milliseconds') return epochReader(1000);
  const inZone = wallTimeReader(zone);
  const [pattern, year, month, day] =
    format === 'day first'
      ? [yearLast, 3, 2, 1]
      : format === 'month first'
        ? [yearLast, 3, 1, 2]
        : [yearFirst, 1, 2, 3];
  return (text) => {
    const found = pattern.exec(text.trim());
    if (!found) return notUnderstood;
    const part = (i: number) => Number(found[i] ?? 0);
    const wall = wallTime({
      year: part(year) + ((found[year] ?? '').length === 2 ? 2000 : 0),
      month: part(month),
      day: part(day),
      hour: hourOf(part(4), found[8]),
      minute: part(5),
      second: part(6),
      fraction: Number(`0.${found[7] ?? '0'}`),
    });
    if (Number.isNaN(wall)) return notUnderstood;
    const named = found[9];
    return named ? at((wall - offsetOf(named)) / 1000) : inZone(wall);
  };
}

function epochReader(perSecond: number): (text: string) => Stamp {
  return (text) => {
    const cell = text.trim();
    return /^\d+(\.\d+)?$/.test(cell) ? at(Number(cell) / perSecond) : notUnderstood;
  };
}

function at(seconds: number, second = NaN): Stamp {
  return seconds >= believable.from && seconds <= believable.to
    ? { kind: 'time', first: seconds, second }
    : notUnderstood;
}

function hourOf(hour: number, half: string | undefined): number {
  if (half === undefined) return hour;
  return (hour % 12) + (half.toLowerCase().startsWith('p') ? 12 : 0);
}

interface WallTime {
  readonly year: number;
  readonly month: number;
  readonly day: number;
  readonly hour: number;
  readonly minute: number;
  readonly second: number;
  readonly fraction: number;
}

/** Wall time as ms, counted as if it were UTC; NaN for a date or a time of day that no calendar has. */
function wallTime({ year, month, day, hour, minute, second, fraction }: WallTime): number {
  if (hour > 24 || minute > 59 || second > 60 || (hour === 24 && (minute > 0 || second > 0))) return NaN;
  const midnight = Date.UTC(year, month - 1, day);
  const date = new Date(midnight);
  if (date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) return NaN;
  return midnight + ((hour * 60 + minute) * 60 + second + fraction) * 1000;
}

function offsetOf(text: string): number {
  const parts = /^([+-])(\d{2}):?(\d{2})$/.exec(text);
  if (!parts) return 0;
  const minutes = Number(parts[2]) * 60 + Number(parts[3]);
  return (parts[1] === '-' ? -minutes : minutes) * 60_000;
}

/**
 * Wall time in a named zone. The zone's offsets are asked once a quarter of an hour and kept: asking for each
 * stamp costs a hundred times the reading of it.
 */
function wallTimeReader(name: string): (wall: number) => Stamp {
  const zone = IANAZone.create(name);
  const kept = new Map<number, readonly number[]>();
  const offsetsAt = (wall: number): readonly number[] => {
    const key = Math.floor(wall / quarter);
    const known = kept.get(key);
    if (known) return known;
    const around = [...new Set([-1, 1].map((side) => zone.offset(wall + side * 86_400_000) * 60_000))];
    const fitting = around.filter((o) => zone.offset(wall - o) * 60_000 === o).sort((a, b) => b - a);
    if (kept.size > 20_000) kept.clear();
    kept.set(key, fitting);
    return fitting;
  };
  return (wall) => {
    const [first, second] = offsetsAt(wall);
    if (first === undefined) return doesNotExist;
    return at((wall - first) / 1000, second === undefined ? NaN : (wall - second) / 1000);
  };
}
