import { madFactor } from '../statistics/mad.js';
import { sortedQuantile } from '../statistics/quantile.js';

/** Limits of the Hampel filter (§1.7). */
export interface OutlierRules {
  /** K: the window is 2K + 1 samples */
  readonly halfWidth: number;
  /** scaled median absolute deviations */
  readonly spread: number;
  /** largest share of samples that may go; above it the filter is off */
  readonly share: number;
}

/** What the filter did. */
export interface Outliers {
  /** the values with outliers bridged by a straight line; the argument's where nothing was removed */
  readonly value: Float64Array;
  readonly removed: number;
  /** true where more than the allowed share would have gone, so that nothing was removed */
  readonly off: boolean;
}

/** Times the usual bend of the record from which a sample is looked at. */
const noticeable = 3;

/**
 * Hampel filter: a value further than `spread` MADs from the median of its window, and further than twice the
 * resolution, is not a measurement.
 *
 * A value is only looked at where it stands away from the middle of its two neighbours by more than three times the
 * usual amount of the record; an isolated spike always does. That leaves a few windows in a thousand to sort instead
 * of all: about 10 ms instead of some 300 ms for a million samples.
 *
 * @param signal ascending times, and values that are NaN where not known
 * @param resolution of the signal, same unit
 * @param protectedAt 1 where a sample may not be removed (near a set point change), or null
 * Source: methods.md §1.7 (Hampel 1974; Pearson 2002)
 */
export function removeOutliers(
  signal: { readonly time: Float64Array; readonly value: Float64Array },
  resolution: number,
  rules: OutlierRules,
  protectedAt: Uint8Array | null = null,
): Outliers {
  const { time, value } = signal;
  const n = value.length;
  const least = Math.max(noticeable * usualBend(value), resolution);
  const K = rules.halfWidth;
  const allowed = Math.max(1, rules.share * n);
  const window = new Float64Array(2 * K + 1);
  const outliers: number[] = [];
  for (let i = 1; i + 1 < n; i++) {
    const x = value[i] as number;
    const bend = Math.abs(x - ((value[i - 1] as number) + (value[i + 1] as number)) / 2);
    // NaN among the three compares false: a sample beside a mark is left alone
    if (!(bend > least) || protectedAt?.[i] === 1) continue;
    if (isOutlier(value, i, window, rules.spread, 2 * resolution)) outliers.push(i);
    if (outliers.length > allowed) return { value, removed: 0, off: true };
  }
  if (outliers.length === 0) return { value, removed: 0, off: false };
  return { value: bridged(time, value, outliers), removed: outliers.length, off: false };
}

/** A copy with the samples at ascending indices put on the line between those that stay. */
function bridged(time: Float64Array, value: Float64Array, indices: readonly number[]): Float64Array {
  const copy = value.slice();
  indices.forEach((i, k) => {
    let last = k;
    while (indices[last + 1] === (indices[last] as number) + 1) last++;
    const next = (indices[last] as number) + 1;
    const [t0, t1] = [time[i - 1] as number, time[next] as number];
    const [v0, v1] = [copy[i - 1] as number, value[next] as number];
    copy[i] = v0 + ((v1 - v0) * ((time[i] as number) - t0)) / (t1 - t0);
  });
  return copy;
}

function isOutlier(value: Float64Array, i: number, window: Float64Array, spread: number, least: number) {
  const K = (window.length - 1) / 2;
  let m = 0;
  for (let j = Math.max(0, i - K); j <= Math.min(value.length - 1, i + K); j++) {
    const v = value[j] as number;
    if (!Number.isNaN(v)) m = insert(window, m, v);
  }
  const middle = sortedQuantile(window.subarray(0, m), 0.5);
  const away = Math.abs((value[i] as number) - middle);
  if (away <= least || m < 5) return false;
  const held = m;
  m = 0;
  const deviation = new Float64Array(held);
  for (let j = 0; j < held; j++) m = insert(deviation, m, Math.abs((window[j] as number) - middle));
  return away > spread * madFactor * sortedQuantile(deviation, 0.5);
}

/** Insertion into the sorted front of a small buffer. */
function insert(buffer: Float64Array, used: number, v: number): number {
  let j = used;
  while (j > 0 && (buffer[j - 1] as number) > v) {
    buffer[j] = buffer[j - 1] as number;
    j--;
  }
  buffer[j] = v;
  return used + 1;
}

/** Scaled median of |value − middle of its neighbours|, from a spread of at most 4096 places. */
function usualBend(value: Float64Array): number {
  const inner = value.length - 2;
  if (inner < 1) return 0;
  const taken = Math.min(inner, 4_096);
  const bends: number[] = [];
  for (let k = 0; k < taken; k++) {
    const i = 1 + Math.floor((k * inner) / taken);
    const bend = (value[i] as number) - ((value[i - 1] as number) + (value[i + 1] as number)) / 2;
    if (Number.isFinite(bend)) bends.push(Math.abs(bend));
  }
  return madFactor * sortedQuantile(Float64Array.from(bends).sort(), 0.5) || 0;
}
