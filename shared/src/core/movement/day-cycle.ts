import { type Prepared } from '../preparation/prepared.js';
import { phasorOf } from './phasor.js';

const day = 86_400;
/** A day's load is not a sine: its harmonics up to this one can look like an oscillation of hours. */
const harmonics = 12;
/** Within this share of a harmonic a period cannot be told from it. */
const nearness = 0.03;

/**
 * True where a period is a fraction of the day and the day itself swings the travel more: the load's daily
 * course, not the loop, is then seen (our choice; a loop that hunts at 6 h does not swing at 24 h or 12 h).
 *
 * @param period s
 */
export function isDayCycle(prepared: Prepared, usable: Uint8Array, period: number): boolean {
  const order = Math.round(day / period);
  if (order < 1 || order > harmonics || Math.abs(day / order / period - 1) > nearness) return false;
  if (prepared.count * prepared.step < 2 * day) return false;
  const swing = (seconds: number) =>
    phasorOf(prepared.travel, usable, 0, prepared.count, seconds / prepared.step).amplitude;
  const own = swing(day / order);
  return swing(day) > own || (order > 2 && swing(day / 2) > own);
}
