/** One formatter for all times on screen: in the site's zone, and UTC for the hover. */

export type TimeForm = 'day' | 'minute' | 'second';

const shapes: Record<TimeForm, Intl.DateTimeFormatOptions> = {
  day: { day: 'numeric', month: 'short', year: 'numeric' },
  minute: { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  second: {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  },
};

const formatters = new Map<string, Intl.DateTimeFormat>();

/** An instant in the site's zone: "3 Nov 2026", "3 Nov 2026, 14:05". A dash where it is not one. */
export function siteTime(instant: string | null, zone: string, form: TimeForm = 'minute'): string {
  const time = Date.parse(instant ?? '');
  if (Number.isNaN(time)) return '–';
  const key = `${zone} ${form}`;
  const formatter =
    formatters.get(key) ??
    new Intl.DateTimeFormat('en-GB', { ...shapes[form], hourCycle: 'h23', timeZone: zone });
  formatters.set(key, formatter);
  return formatter.format(time);
}

/** The same instant in UTC, to the second. */
export function utcTime(instant: string | null): string {
  const time = Date.parse(instant ?? '');
  return Number.isNaN(time) ? '' : `${new Date(time).toISOString().slice(0, 19).replace('T', ' ')} UTC`;
}

/**
 * The instant a calendar day begins in a zone.
 *
 * @param day "2026-11-30"
 * @returns ISO 8601 in UTC
 * @example startOfDay('2026-11-30', 'Europe/Zurich') // '2026-11-29T23:00:00.000Z'
 */
export function startOfDay(day: string, zone: string): string {
  const asUtc = Date.parse(`${day}T00:00:00Z`);
  // a second look, because the offset may change between the guess and the day's begin
  const guess = asUtc - offsetAt(asUtc, zone);
  return new Date(asUtc - offsetAt(guess, zone)).toISOString();
}

/** Zone's wall clock less UTC at an instant, both ms. */
function offsetAt(instant: number, zone: string): number {
  const parts = new Intl.DateTimeFormat('en-US', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  }).formatToParts(instant);
  const part = (type: Intl.DateTimeFormatPartTypes) => Number(parts.find((one) => one.type === type)?.value);
  const wall = Date.UTC(
    part('year'),
    part('month') - 1,
    part('day'),
    part('hour'),
    part('minute'),
    part('second'),
  );
  return wall - Math.floor(instant / 1000) * 1000;
}
