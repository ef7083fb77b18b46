import { type Limits } from '../limits.js';
import { type Prepared } from './prepared.js';

/** How long a steady window is, and the slot in which windows of one travel bin count as one period, s. */
export interface WindowLength {
  readonly seconds: number;
  readonly slotSeconds: number;
  /** the next length is tried unless this share of the record's windows passes, whatever their number */
  readonly leastShare: number;
}

/** Samples a window needs for its two halves to mean anything in a short record. */
const samplesOfShortWindow = 6;
/** Records up to this long may use windows shorter than a minute, s. */
const shortRecord = 6 * 3_600;
/** Windows of a slow record have to pass for this share of it; below, each sample stands for itself. */
const shareOfSlowRecord = 0.5;
/** A short record is cut into about this many slots. */
const slotsOfShortRecord = 12;

/**
 * Window lengths to try in turn until enough windows pass: 300 s; 60 s where the scan allows it; and, in a
 * record of hours rather than days, six samples. Records too slow for three samples in 300 s get windows of three
 * samples, and where those fail for most of it, single samples: minutes apart, a sample is its own steady state.
 *
 * The handbook's lengths are tuned to weeks at 10 to 60 s; the others are our choice for records of another pace.
 *
 * Source: methods.md §1.9, §1.10
 */
export function windowLengths(prepared: Prepared, limits: Limits): WindowLength[] {
  const rules = limits.windows;
  const scan = Math.max(prepared.spacing.travel, prepared.spacing.flow ?? 0, prepared.step);
  const record = prepared.count * prepared.step;
  const regular = Math.max(rules.seconds, 3 * scan);
  const seconds = [regular];
  if (scan <= rules.fastScan && rules.fastSeconds < regular) seconds.push(rules.fastSeconds);
  const short = Math.max(samplesOfShortWindow * scan, 1);
  if (record <= shortRecord && short < (seconds.at(-1) ?? 0)) seconds.push(short);
  const slow = regular > rules.seconds;
  if (slow) seconds.push(scan);
  return seconds.map((length) => ({
    seconds: length,
    leastShare: slow ? shareOfSlowRecord : 0,
    slotSeconds: Math.max(2 * length, Math.min(rules.periodSeconds, record / slotsOfShortRecord)),
  }));
}
