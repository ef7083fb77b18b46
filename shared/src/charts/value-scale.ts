import { scaleLinear, scaleLog } from 'd3-scale';
import { type Tick } from './box.js';
import { figureText } from './figure-text.js';

/** An axis of values: where a value lies, and the marks beside it. */
export interface ValueScale {
  /** px of a value, held within the axis; on a log axis what is not above zero lies at the bottom */
  readonly place: (value: number) => number;
  readonly ticks: readonly Tick[];
  /** the value range the axis covers */
  readonly domain: readonly [number, number];
}

/**
 * A linear axis that covers the values, ends on round numbers.
 *
 * @param values anything to be shown; what is not finite is passed over
 * @param bottom px of the low end
 * @param top px of the high end
 * @param always values the axis covers in any case, by default 0
 */
export function linearValues(
  values: readonly number[],
  bottom: number,
  top: number,
  always: readonly number[] = [0],
): ValueScale {
  const shown = [...values, ...always].filter((value) => Number.isFinite(value));
  const low = Math.min(...shown);
  const high = Math.max(...shown);
  const count = tickCount(bottom, top);
  const scale = scaleLinear(shown.length === 0 || low === high ? around(low) : [low, high], [bottom, top])
    .nice(count)
    .clamp(true);
  const [from = 0, to = 1] = scale.domain();
  return {
    place: (value) => scale(value),
    ticks: scale.ticks(count).map((value) => ({ at: scale(value), value, text: figureText(value, 4) })),
    domain: [from, to],
  };
}

/**
 * A logarithmic axis, marked at 1, 2 and 5 of each decade. It reaches at most three decades down from the
 * largest value: a specified curve that starts near zero would otherwise squeeze out what was found.
 *
 * @param values anything to be shown; only what is above zero counts
 * @param bottom px of the low end
 * @param top px of the high end
 */
export function logValues(values: readonly number[], bottom: number, top: number): ValueScale {
  const shown = values.filter((value) => Number.isFinite(value) && value > 0);
  const high = shown.length > 0 ? Math.max(...shown) : 1;
  const low = Math.max(shown.length > 0 ? Math.min(...shown) : 0.1, high / 1000);
  const scale = scaleLog([low / 1.12, high * 1.12], [bottom, top]).clamp(true);
  const [from = 0.1, to = 1] = scale.domain();
  return {
    place: (value) => (value > 0 ? scale(value) : bottom),
    ticks: decadeMarks(from, to, tickCount(bottom, top)).map((value) => ({
      at: scale(value),
      value,
      text: figureText(value),
    })),
    domain: [from, to],
  };
}

/** The round numbers of a log axis: 1, 2, 5 of each decade, tens alone over many decades, finer over few. */
function decadeMarks(from: number, to: number, count: number): number[] {
  const choices = [[1], [1, 2, 5], [1, 1.5, 2, 3, 4, 5, 6, 7, 8, 9]];
  const marks = choices.map((steps) => {
    const first = Math.floor(Math.log10(from));
    const decades = Math.ceil(Math.log10(to)) - first + 1;
    return Array.from({ length: decades }, (_, i) => first + i)
      .flatMap((decade) => steps.map((step) => Number((step * 10 ** decade).toPrecision(6))))
      .filter((value) => value >= from && value <= to);
  });
  return marks.find((some) => some.length >= Math.min(4, count)) ?? marks.at(-1) ?? [];
}

function tickCount(bottom: number, top: number): number {
  return Math.max(2, Math.min(8, Math.round(Math.abs(bottom - top) / 44)));
}

function around(value: number): [number, number] {
  if (!Number.isFinite(value)) return [0, 1];
  return value === 0 ? [0, 1] : value > 0 ? [0, value] : [value, 0];
}
