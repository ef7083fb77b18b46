import { type Drift } from '../assessment.js';
import { type Limits } from '../limits.js';

/** What a record is cut into to see it change. */
export type Pace = Drift['by'];

/** The windows' segments, numbered in time order. */
export interface Segments {
  readonly by: Pace;
  readonly count: number;
  /** segment of each window; −1 where its segment holds too little */
  readonly of: Int32Array;
}

const secondsPerDay = 86_400;
const paces = ['month', 'week', 'day', 'hour', 'minute'] as const;
/** Segments a record of less than some hours is cut into. */
const shortSegments = 30;

/**
 * Cuts windows into months, else weeks, else days, hours or minutes: the longest pace of which the record holds
 * enough. Months are calendar months (UTC); shorter paces count from the first window. `minute` stands for a
 * thirtieth of the record, at least a minute.
 *
 * Where most segments hold fewer days than the handbook's five (a plant that runs a few days a month), their own
 * median is asked for instead (our choice).
 *
 * @param time s, ascending
 * @param from longest pace to try
 * @returns null where no pace has enough segments
 * Source: methods.md §7.1
 */
export function segmentsOf(time: Float64Array, limits: Limits, from: Pace = 'month'): Segments | null {
  if (time.length === 0) return null;
  for (const by of paces.slice(paces.indexOf(from))) {
    const segments = cut(time, by, limits);
    if (segments.count >= fewest(by, limits) && segments.count <= limits.drift.mostPoints) return segments;
  }
  return null;
}

/** The next shorter pace, or the same where there is none. */
export function finer(by: Pace): Pace {
  return paces[Math.min(paces.length - 1, paces.indexOf(by) + 1)] as Pace;
}

/** Segments needed before a trend or a step is looked for. */
export function fewest(by: Pace, limits: Limits): number {
  if (by === 'month') return limits.drift.months;
  return by === 'week' ? limits.drift.weeks : limits.drift.segments;
}

function cut(time: Float64Array, by: Pace, limits: Limits): Segments {
  const rules = limits.drift;
  const label = labels(time, by);
  const windows = new Map<number, number>();
  const days = new Map<number, number>();
  let lastDay = NaN;
  let lastLabel = NaN;
  for (let i = 0; i < time.length; i++) {
    const k = label[i] as number;
    const day = Math.floor((time[i] as number) / secondsPerDay);
    windows.set(k, (windows.get(k) ?? 0) + 1);
    if (day !== lastDay || k !== lastLabel) days.set(k, (days.get(k) ?? 0) + 1);
    lastDay = day;
    lastLabel = k;
  }
  const long = by === 'month' || by === 'week';
  const usual = [...days.values()].sort((a, b) => a - b)[days.size >> 1] ?? 0;
  const leastDays = long ? Math.min(by === 'month' ? rules.daysPerMonth : 2, usual) : 0;
  const leastWindows = long ? rules.windowsPerMonth / (by === 'month' ? 1 : 2) : rules.windowsPerSegment;
  const number = new Map<number, number>();
  for (const k of [...windows.keys()].sort((a, b) => a - b))
    if ((windows.get(k) ?? 0) >= leastWindows && (days.get(k) ?? 0) >= leastDays) number.set(k, number.size);
  return { by, count: number.size, of: label.map((k) => number.get(k) ?? -1) };
}

function labels(time: Float64Array, by: Pace): Int32Array {
  const label = new Int32Array(time.length);
  const first = time[0] as number;
  const record = (time[time.length - 1] as number) - first;
  const seconds = {
    week: 7 * secondsPerDay,
    day: secondsPerDay,
    hour: 3_600,
    minute: Math.max(60, record / shortSegments),
  };
  for (let i = 0; i < time.length; i++) {
    const t = time[i] as number;
    label[i] = by === 'month' ? calendarMonth(t) : Math.floor((t - first) / seconds[by] + 1e-9);
  }
  return label;
}

function calendarMonth(t: number): number {
  const date = new Date(t * 1_000);
  return 12 * date.getUTCFullYear() + date.getUTCMonth();
}
