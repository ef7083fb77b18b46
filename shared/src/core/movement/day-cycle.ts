import { median } from '../statistics/quantile.js';
import { phasorOf } from './phasor.js';
import { type Column } from './step-free.js';

const day = 86_400;
/** A day's load is not a sine: its harmonics up to this one can look like an oscillation of hours. */
const harmonics = 12;
/** Within this share of a harmonic a period cannot be told from it. */
const nearness = 0.03;
/** The day is a line of the spectrum where it stands this far above its neighbours. */
const lineRatio = 3;
const harmonicMargin = 1.5;
const neighbours = [-3.5, -2.5, -1.5, 1.5, 2.5, 3.5] as const;

/**
 * True where a period is a fraction of the day and the day itself swings the travel enough to have it as a harmonic, as
 * a line of the spectrum: the load's daily course, not the loop, is then seen (our choice; a loop that hunts at 6 h does not
 * swing at 24 h or 12 h).
 *
 * @param column travel
 * @param period s
 */
export function isDayCycle(column: Column, period: number): boolean {
  const order = Math.round(day / period);
  if (order < 1 || order > harmonics || Math.abs(day / order / period - 1) > nearness) return false;
  const days = (column.count * column.step) / day;
  if (days < 2) return false;
  const swing = (cycles: number) =>
    phasorOf(column.values, null, 0, column.count, column.count / cycles).amplitude;
  const own = swing(days * order);
  return [1, 2].some((of) => {
    if (of >= order) return false;
    const cycles = of * days;
    const line = swing(cycles);
    const around = median(neighbours.map((n) => swing(Math.max(0.5, cycles + n))));
    // the harmonics of a load that goes up and down by ramps or steps fall at least as one over their order
    return (harmonicMargin * line * of) / order > own && line > lineRatio * around;
  });
}
