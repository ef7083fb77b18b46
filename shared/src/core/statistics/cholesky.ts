/**
 * Inverse and log determinant of a symmetric positive definite matrix, by Cholesky factors.
 *
 * @param matrix n × n, rows one after another
 * @returns null where the matrix is not positive definite
 */
export function invertPositive(
  matrix: Float64Array,
  n: number,
): { readonly inverse: Float64Array; readonly logDeterminant: number } | null {
  const L = new Float64Array(n * n);
  let logDeterminant = 0;
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = matrix[i * n + j] as number;
      for (let k = 0; k < j; k++) sum -= (L[i * n + k] as number) * (L[j * n + k] as number);
      if (i === j) {
        if (!(sum > 0)) return null;
        L[i * n + i] = Math.sqrt(sum);
        logDeterminant += Math.log(sum);
      } else L[i * n + j] = sum / (L[j * n + j] as number);
    }
  }
  // rows of the inverse of L, then their products
  const low = new Float64Array(n * n);
  for (let c = 0; c < n; c++) {
    low[c * n + c] = 1 / (L[c * n + c] as number);
    for (let i = c + 1; i < n; i++) {
      let sum = 0;
      for (let k = c; k < i; k++) sum -= (L[i * n + k] as number) * (low[k * n + c] as number);
      low[i * n + c] = sum / (L[i * n + i] as number);
    }
  }
  const inverse = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = 0;
      for (let k = i; k < n; k++) sum += (low[k * n + i] as number) * (low[k * n + j] as number);
      inverse[i * n + j] = sum;
      inverse[j * n + i] = sum;
    }
  }
  return { inverse, logDeterminant };
}
