/**
 * Mean and standard deviation (n − 1) by an updating formula, which keeps its digits on large numbers (Welford 1962).
 *
 * @returns NaN mean where empty, NaN deviation below two values
 * @example moments([1, 2, 3]) // { mean: 2, deviation: 1 }
 */
export function moments(values: ArrayLike<number>): { readonly mean: number; readonly deviation: number } {
  let mean = 0;
  let squares = 0;
  for (let i = 0; i < values.length; i++) {
    const away = (values[i] as number) - mean;
    mean += away / (i + 1);
    squares += away * ((values[i] as number) - mean);
  }
  return {
    mean: values.length > 0 ? mean : NaN,
    deviation: values.length > 1 ? Math.sqrt(squares / (values.length - 1)) : NaN,
  };
}
