import { type Series } from '../core/series.js';

export interface Archive {
  /** s */
  readonly scan: number;
  /** in the signal's unit; 0: every scan is kept */
  readonly tolerance: number;
  /** longest time without a stored value, s */
  readonly longest: number;
  /** stored digits behind the point */
  readonly decimals: number;
}

/**
 * What a historian keeps of scans at even spacing: a straight line through the stored points misses no dropped scan
 * by more than the tolerance (swinging door, Bristol 1990).
 *
 * @param start s UTC of the first scan
 * @param scans one value a scan; NaN: no value, which ends the segment before it
 */
export function archive(start: number, scans: Float64Array, settings: Archive): Series {
  const { scan, tolerance, longest, decimals } = settings;
  const scale = 10 ** decimals;
  const time: number[] = [];
  const value: number[] = [];
  const keep = (i: number) => {
    time.push(start + i * scan);
    value.push(Math.round((scans[i] as number) * scale) / scale);
  };
  let pivot = -1;
  let held = -1;
  let least = -Infinity;
  let most = Infinity;
  for (let i = 0; i < scans.length; i++) {
    if (Number.isNaN(scans[i])) {
      if (held > pivot) keep(held);
      pivot = held = -1;
      continue;
    }
    if (pivot < 0 || tolerance === 0) {
      keep(i);
      pivot = held = i;
      [least, most] = [-Infinity, Infinity];
      continue;
    }
    const from = Math.round((scans[pivot] as number) * scale) / scale;
    const span = i - pivot;
    const low = ((scans[i] as number) - tolerance - from) / span;
    const high = ((scans[i] as number) + tolerance - from) / span;
    const slope = ((scans[i] as number) - from) / span;
    if (slope >= least && slope <= most && span * scan <= longest) {
      least = Math.max(least, low);
      most = Math.min(most, high);
      held = i;
      continue;
    }
    // The door has shut: the scan before this one is the last the line still reached.
    if (held > pivot) {
      keep(held);
      pivot = held;
      i -= 1;
    } else {
      keep(i);
      pivot = i;
    }
    held = pivot;
    [least, most] = [-Infinity, Infinity];
  }
  if (held > pivot && pivot >= 0) keep(held);
  return {
    time: Float64Array.from(time),
    value: Float64Array.from(value),
    good: new Uint8Array(time.length).fill(1),
  };
}
