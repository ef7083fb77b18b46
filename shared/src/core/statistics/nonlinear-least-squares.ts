import { linearLeastSquares } from './linear-least-squares.js';

/** A nonlinear fit at its end. */
export interface NonlinearFit {
  readonly parameters: Float64Array;
  readonly standardErrors: Float64Array;
  readonly rss: number;
  readonly turns: number;
  /** false: the turns ran out before the step became negligible */
  readonly settled: boolean;
}

/**
 * Nonlinear least squares by Marquardt's damped steps (Levenberg 1944, Marquardt 1963): each step is a linear
 * least-squares problem solved by reflections, not by normal equations, and the slopes are central differences.
 *
 * @param model predicted values, as long as y, for a set of parameters; must not change them
 * @param y observed values
 * @param start first guess, near enough that a downhill path exists
 * @returns null where the start gives values that are not finite or the slopes depend on each other throughout
 */
export function nonlinearLeastSquares(
  model: (parameters: Float64Array) => ArrayLike<number>,
  y: ArrayLike<number>,
  start: ArrayLike<number>,
  turns = 2000,
): NonlinearFit | null {
  let parameters = Float64Array.from(start);
  const m = parameters.length;
  let residual = residuals(model, y, parameters);
  let rss = sumOfSquares(residual);
  if (!Number.isFinite(rss)) return null;
  let damping = 1e-3;
  let settled = false;
  let turn = 0;
  for (; turn < turns && !settled; turn++) {
    const slopes = slopesOf(model, parameters, y.length);
    const sizes = slopes.map((column) => Math.sqrt(sumOfSquares(column)) || 1);
    let accepted = false;
    while (!accepted && damping < 1e20) {
      const root = Math.sqrt(damping);
      const step = linearLeastSquares(
        slopes.map((column, j) => padded(column, m, j, root * (sizes[j] as number))),
        padded(residual, m, -1, 0),
      );
      const trial = parameters.map((p, j) => p + (step?.coefficients[j] ?? NaN));
      const trialResidual = residuals(model, y, trial);
      const trialRss = sumOfSquares(trialResidual);
      accepted = trialRss <= rss;
      if (!accepted) {
        damping *= 4;
        continue;
      }
      settled =
        damping < 1 && trial.every((p, j) => Math.abs(p - (parameters[j] as number)) <= 1e-9 * Math.abs(p));
      parameters = trial;
      residual = trialResidual;
      rss = trialRss;
      damping = Math.max(damping / 5, 1e-14);
    }
    // no step helps any more: rounding is all that is left
    if (!accepted) settled = true;
  }
  const final = linearLeastSquares(slopesOf(model, parameters, y.length), residual);
  if (final === null) return null;
  const sigma = Math.sqrt(rss / (y.length - m));
  const rescale = sigma / Math.sqrt(final.rss / (y.length - m));
  return {
    parameters,
    standardErrors: final.standardErrors.map((e) => e * rescale),
    rss,
    turns: turn,
    settled,
  };
}

function residuals(
  model: (parameters: Float64Array) => ArrayLike<number>,
  y: ArrayLike<number>,
  parameters: Float64Array,
): Float64Array {
  const predicted = model(parameters);
  return Float64Array.from(y, (v, i) => v - (predicted[i] as number));
}

function sumOfSquares(values: Float64Array): number {
  let sum = 0;
  for (const v of values) sum += v * v;
  return sum;
}

function slopesOf(
  model: (parameters: Float64Array) => ArrayLike<number>,
  parameters: Float64Array,
  n: number,
): Float64Array[] {
  return Array.from(parameters, (p, j) => {
    // the cube root of rounding is the best spacing of a central difference
    const spacing = 6e-6 * (Math.abs(p) || 1);
    const up = parameters.slice();
    const down = parameters.slice();
    up[j] = p + spacing;
    down[j] = p - spacing;
    const above = model(up);
    const below = model(down);
    const width = up[j] - down[j];
    return Float64Array.from({ length: n }, (_, i) => ((above[i] as number) - (below[i] as number)) / width);
  });
}

/** The values with m more rows, of which row j holds the damping. */
function padded(values: Float64Array, m: number, j: number, damping: number): Float64Array {
  const longer = new Float64Array(values.length + m);
  longer.set(values);
  if (j >= 0) longer[values.length + j] = damping;
  return longer;
}
