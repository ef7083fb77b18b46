import { scaleUtc, type ScaleTime } from 'd3-scale';
import { type Tick } from './box.js';

export interface TimeAxis {
  readonly scale: ScaleTime<number, number>;
  readonly ticks: readonly Tick[];
}

/**
 * A time axis. Ticks fall on whole days and months of UTC, which in any zone is within a day of the local
 * ones; their words are in the site's zone.
 *
 * @param from s UTC
 * @param to s UTC
 * @param left px
 * @param right px
 * @param zone IANA zone of the words
 * @param finest what a tick may name; where it is the day, each day is named once
 */
export function timeAxis(
  from: number,
  to: number,
  left: number,
  right: number,
  zone: string,
  finest: 'hour' | 'day' = 'hour',
): TimeAxis {
  const known = Number.isFinite(from) && Number.isFinite(to);
  const [start, end] = known ? [from, Math.max(to, from + 86_400)] : [0, 86_400];
  const scale = scaleUtc([start * 1000, end * 1000], [left, right]);
  const ticks = known ? scale.ticks(Math.max(2, Math.floor((right - left) / 90))) : [];
  const [first, second] = ticks;
  const withinDays = finest === 'hour' && first && second && second.getTime() - first.getTime() < 86_400_000;
  const words = withinDays ? hourWords(zone) : dayWords(end - start, zone);
  const named = ticks.map((date) => ({
    at: scale(date),
    value: date.getTime() / 1000,
    text: words.format(date),
  }));
  return { scale, ticks: named.filter((tick, i) => tick.text !== named[i - 1]?.text) };
}

/** The day of an instant in words, for read-outs and tables. */
export function dayText(time: number, zone: string): string {
  return Number.isFinite(time) ? dayWords(0, zone, true).format(time * 1000) : '–';
}

function dayWords(seconds: number, zone: string, full = false): Intl.DateTimeFormat {
  const long = seconds > 200 * 86_400;
  return new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    month: 'short',
    ...(long ? {} : { day: 'numeric' }),
    ...(long || full ? { year: 'numeric' } : {}),
  });
}

/** Ticks closer than a day would all carry the same day. */
function hourWords(zone: string): Intl.DateTimeFormat {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    month: 'short',
    day: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
}
