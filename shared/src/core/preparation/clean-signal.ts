import { type Series, type Span } from '../series.js';

/** What a value of a signal may be; anything else is rejected and counted (§1.1). */
export interface Bounds {
  readonly low: number;
  readonly high: number;
}

/** One signal inside the window, with what was refused still in its place as NaN: a mark that the value is not known. */
export interface CleanSignal {
  /** s, strictly ascending */
  readonly time: Float64Array;
  readonly value: Float64Array;
  readonly seen: number;
  readonly bad: number;
  readonly outOfRange: number;
  readonly duplicate: number;
  readonly backward: number;
}

/**
 * The samples of a signal inside the window: bad quality and values out of range become NaN, the last of
 * samples with the same time stays, and samples that came late are put in order.
 *
 * @param span window, s UTC, `to` excluded
 * @throws RangeError where the three columns differ in length
 * Source: methods.md §1.1
 */
export function cleanSignal(series: Series, span: Span, bounds: Bounds): CleanSignal {
  const n = series.time.length;
  if (series.value.length !== n || series.good.length !== n)
    throw new RangeError('time, value and good must have one length');
  const ordered = inOrder(series);
  const from = firstAtOrAfter(ordered.time, span.from);
  const to = firstAtOrAfter(ordered.time, span.to);
  const time = ordered.time.subarray(from, to);
  const raw = ordered.value.subarray(from, to);
  const good = ordered.good.subarray(from, to);
  let bad = 0;
  let outOfRange = 0;
  let value = raw;
  for (let i = 0; i < time.length; i++) {
    const v = raw[i] as number;
    if (good[i] === 1 && v >= bounds.low && v <= bounds.high) continue;
    if (good[i] === 1 && Number.isFinite(v)) outOfRange++;
    else bad++;
    if (value === raw) value = raw.slice();
    value[i] = NaN;
  }
  return {
    time,
    value,
    seen: time.length + ordered.duplicate,
    bad,
    outOfRange,
    duplicate: ordered.duplicate,
    backward: ordered.backward,
  };
}

interface Ordered extends Series {
  readonly duplicate: number;
  readonly backward: number;
}

/** Series promise ascending time; what a caller hands over all the same is sorted, the last received of equals kept. */
function inOrder(series: Series): Ordered {
  const { time, value, good } = series;
  let ascending = time.length === 0 || Number.isFinite(time[0]);
  for (let i = 1; i < time.length && ascending; i++)
    if (!((time[i] as number) > (time[i - 1] as number))) ascending = false;
  if (ascending) return { time, value, good, duplicate: 0, backward: 0 };

  const order: number[] = [];
  let backward = 0;
  let latest = -Infinity;
  for (let i = 0; i < time.length; i++) {
    const t = time[i] as number;
    if (!Number.isFinite(t)) continue;
    if (t < latest) backward++;
    else latest = t;
    order.push(i);
  }
  order.sort((a, b) => (time[a] as number) - (time[b] as number) || a - b);
  const kept: number[] = [];
  for (const i of order) {
    const last = kept[kept.length - 1];
    if (last !== undefined && time[last] === time[i]) {
      // the last *good* value received stands; a bad one does not displace it
      if (good[i] === 1 || good[last] !== 1) kept[kept.length - 1] = i;
    } else kept.push(i);
  }
  return {
    time: Float64Array.from(kept, (i) => time[i] as number),
    value: Float64Array.from(kept, (i) => value[i] as number),
    good: Uint8Array.from(kept, (i) => good[i] as number),
    duplicate: order.length - kept.length,
    backward,
  };
}

/** Index of the first time at or after t; the length where there is none. */
function firstAtOrAfter(time: Float64Array, t: number): number {
  let low = 0;
  let high = time.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((time[middle] as number) < t) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Share of the time between first and last sample for which the value was refused (time weighted, gaps at most `gap` s). */
export function rejectedShare(signal: CleanSignal, gap: number): number {
  const { time, value } = signal;
  if (signal.bad + signal.outOfRange === 0) return 0;
  let refused = 0;
  let all = 0;
  for (let i = 0; i < time.length; i++) {
    const next = i + 1 < time.length ? (time[i + 1] as number) - (time[i] as number) : 0;
    const stood = Math.min(next, gap);
    all += stood;
    if (Number.isNaN(value[i])) refused += stood;
  }
  return all > 0 ? refused / all : (signal.bad + signal.outOfRange) / time.length;
}
