import { moments } from './moments.js';
import { studentQuantile, studentTwoSided } from './student.js';

/** The difference of two means with its interval. */
export interface WelchTest {
  /** mean of the second less mean of the first */
  readonly difference: number;
  readonly standardError: number;
  readonly low: number;
  readonly high: number;
  readonly t: number;
  readonly degrees: number;
  /** two-sided */
  readonly p: number;
}

/**
 * Welch's test of two means with unequal spreads, with counts that may be smaller than the samples where neighbours
 * resemble each other.
 *
 * @param first at least two values
 * @param second at least two values
 * @param counts number of independent values each sample is worth, above 1; its own length by default
 * @param level of the interval
 * @returns NaN throughout where a sample is too small; where neither varies, p is 0 for different means and 1 for equal
 * Source: Welch 1947; methods.md §10.4
 */
export function welch(
  first: ArrayLike<number>,
  second: ArrayLike<number>,
  counts: readonly [number, number] = [first.length, second.length],
  level = 0.95,
): WelchTest {
  const a = moments(first);
  const b = moments(second);
  const va = a.deviation ** 2 / counts[0];
  const vb = b.deviation ** 2 / counts[1];
  const difference = b.mean - a.mean;
  const standardError = Math.sqrt(va + vb);
  if (standardError === 0) {
    const t = difference === 0 ? 0 : Math.sign(difference) * Infinity;
    return {
      difference,
      standardError,
      low: difference,
      high: difference,
      t,
      degrees: Infinity,
      p: t === 0 ? 1 : 0,
    };
  }
  const degrees = (va + vb) ** 2 / (va ** 2 / (counts[0] - 1) + vb ** 2 / (counts[1] - 1));
  const half = studentQuantile((1 + level) / 2, degrees) * standardError;
  const t = difference / standardError;
  return {
    difference,
    standardError,
    low: difference - half,
    high: difference + half,
    t,
    degrees,
    p: studentTwoSided(t, degrees),
  };
}
