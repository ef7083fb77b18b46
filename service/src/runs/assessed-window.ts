import { type Span } from '@tailrace/shared/core/series';
import { DateTime } from 'luxon';

/**
 * The window a run looks at: so many days ending at the end of the last full local day that the newest sample
 * reaches, so that a night's run and a repeat of it at noon see the same data (methods.md §9.1).
 *
 * A record shorter than a day has no full day: the window then ends just after its newest sample.
 *
 * @param oldest time of the valve's oldest sample, s UTC
 * @param newest time of the valve's newest sample, s UTC
 * @param zone IANA zone of the site
 * @param days length of the window
 */
export function assessedWindow(oldest: number, newest: number, zone: string, days: number): Span {
  const dayStart = DateTime.fromSeconds(newest, { zone }).startOf('day').toSeconds();
  // A sample in the last minutes of a day closes it: exports end at 23:59 or at the last scan.
  const dayEnd = DateTime.fromSeconds(newest, { zone }).endOf('day').toSeconds();
  const closed = dayEnd - newest <= 900 ? Math.round(dayEnd) : dayStart;
  const to = closed > oldest ? closed : newest + 1;
  const from = DateTime.fromSeconds(to, { zone }).minus({ days }).toSeconds();
  return { from: Math.max(from, Math.floor(oldest)), to };
}
