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
 */
export function timeAxis(from: number, to: number, left: number, right: number, zone: string): TimeAxis {
  const known = Number.isFinite(from) && Number.isFinite(to);
  const [start, end] = known ? [from, Math.max(to, from + 86_400)] : [0, 86_400];
  const scale = scaleUtc([start * 1000, end * 1000], [left, right]);
  const words = dayWords(end - start, zone);
  const ticks = known ? scale.ticks(Math.max(2, Math.floor((right - left) / 90))) : [];
  return {
    scale,
    ticks: ticks.map((date) => ({ at: scale(date), value: date.getTime() / 1000, text: words.format(date) })),
  };
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
