import { sortedQuantile } from '../statistics/quantile.js';

/** How a signal's stored samples follow each other, s. */
export interface Pace {
  /** spacing while the signal moves: the scan behind a compressed archive */
  readonly scan: number;
  readonly median: number;
  /** 99th percentile */
  readonly longest: number;
}

const looks = 4_096;

/**
 * The pace of a signal, from at most 4096 pairs of neighbours spread over the record.
 *
 * The scan is the 2nd percentile of spacing: a compressed archive stores neighbours only while the signal
 * moves, so its median says how quiet the plant was and its low end how often it was looked at (our choice).
 *
 * @param time s, strictly ascending
 * @returns NaN throughout for fewer than two samples
 */
export function paceOf(time: Float64Array): Pace {
  const pairs = time.length - 1;
  if (pairs < 1) return { scan: NaN, median: NaN, longest: NaN };
  const taken = Math.min(pairs, looks);
  const spacing = new Float64Array(taken);
  for (let k = 0; k < taken; k++) {
    const i = Math.floor((k * pairs) / taken);
    spacing[k] = (time[i + 1] as number) - (time[i] as number);
  }
  spacing.sort();
  return {
    scan: sortedQuantile(spacing, 0.02),
    median: sortedQuantile(spacing, 0.5),
    longest: sortedQuantile(spacing, 0.99),
  };
}

/**
 * Proxy of the archive's tolerance, which cannot be observed: the 5th percentile of |second difference| of
 * stored values (§1.2). null with fewer than three values.
 */
export function resolutionOf(value: Float64Array): number | null {
  const triples = value.length - 2;
  if (triples < 1) return null;
  const taken = Math.min(triples, looks);
  const second: number[] = [];
  for (let k = 0; k < taken; k++) {
    const i = 1 + Math.floor((k * triples) / taken);
    const d = (value[i - 1] as number) - 2 * (value[i] as number) + (value[i + 1] as number);
    if (Number.isFinite(d)) second.push(Math.abs(d));
  }
  return second.length === 0 ? null : sortedQuantile(Float64Array.from(second).sort(), 0.05);
}
