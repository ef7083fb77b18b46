/** Filter constants of the R-statistic. */
export interface RFilters {
  readonly value: number;
  readonly variance: number;
  readonly difference: number;
}

/** Critical values of R for white noise: R above them happens by chance in so many per cent of steady samples. */
export interface RCritical {
  readonly filters: RFilters;
  readonly median: number;
  readonly percent80: number;
  readonly percent90: number;
  readonly percent95: number;
  readonly percent99: number;
}

const filters = (value: number, variance: number, difference: number): RFilters => ({
  value,
  variance,
  difference,
});

/** Critical values by two million samples of white noise (methods.md §1.9, our own trial). */
export const criticalValues: readonly RCritical[] = [
  {
    filters: filters(0.2, 0.1, 0.1),
    median: 1,
    percent80: 1.19,
    percent90: 1.31,
    percent95: 1.43,
    percent99: 1.72,
  },
  {
    filters: filters(0.1, 0.1, 0.1),
    median: 1,
    percent80: 1.2,
    percent90: 1.35,
    percent95: 1.49,
    percent99: 1.83,
  },
  {
    filters: filters(0.05, 0.05, 0.05),
    median: 1,
    percent80: 1.14,
    percent90: 1.24,
    percent95: 1.32,
    percent99: 1.52,
  },
];

/**
 * Ratio of two estimates of variance, about 1 at steady state and far above while the signal travels.
 *
 * Not the default test of steadiness: it assumes uncorrelated noise, and closed-loop, damped and rebuilt data are
 * not. Use it on data thinned until neighbouring differences are uncorrelated.
 *
 * @param values in time order; a NaN keeps the filters as they are and gives NaN
 * @returns R after each value; NaN for the first
 * Source: Cao & Rhinehart 1995 (the previous filtered value stands in ν²); methods.md §1.9
 */
export function rStatistic(values: Float64Array, { value, variance, difference }: RFilters): Float64Array {
  const R = new Float64Array(values.length).fill(NaN);
  let filtered = NaN;
  let previous = NaN;
  let nu2 = 0;
  let delta2 = 0;
  for (let i = 0; i < values.length; i++) {
    const x = values[i] as number;
    if (Number.isNaN(x)) continue;
    if (Number.isNaN(filtered)) {
      filtered = x;
      previous = x;
      continue;
    }
    nu2 = variance * (x - filtered) ** 2 + (1 - variance) * nu2;
    filtered = value * x + (1 - value) * filtered;
    delta2 = difference * (x - previous) ** 2 + (1 - difference) * delta2;
    previous = x;
    R[i] = ((2 - value) * nu2) / delta2;
  }
  return R;
}

/** Samples the filters need before R means anything (§1.9). */
export function runIn({ value, variance, difference }: RFilters): number {
  return Math.ceil(3 / Math.min(value, variance, difference));
}
