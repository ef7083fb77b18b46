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
