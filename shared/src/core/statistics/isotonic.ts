/**
 * Least-squares non-decreasing sequence by pooling adjacent violators (Barlow et al. 1972).
 *
 * @param weights same length, positive
 * @returns fitted values, same length
 * @example isotonic([1, 3, 2], [1, 1, 1]) // 1, 2.5, 2.5
 */
export function isotonic(y: ArrayLike<number>, weights: ArrayLike<number>): Float64Array {
  const n = y.length;
  const level = new Float64Array(n);
  const weight = new Float64Array(n);
  const size = new Int32Array(n);
  let blocks = 0;
  for (let i = 0; i < n; i++) {
    level[blocks] = y[i] as number;
    weight[blocks] = weights[i] as number;
    size[blocks] = 1;
    blocks++;
    while (blocks > 1 && (level[blocks - 2] as number) > (level[blocks - 1] as number)) {
      const w = (weight[blocks - 2] as number) + (weight[blocks - 1] as number);
      level[blocks - 2] =
        ((level[blocks - 2] as number) * (weight[blocks - 2] as number) +
          (level[blocks - 1] as number) * (weight[blocks - 1] as number)) /
        w;
      weight[blocks - 2] = w;
      size[blocks - 2] = (size[blocks - 2] as number) + (size[blocks - 1] as number);
      blocks--;
    }
  }
  const fitted = new Float64Array(n);
  let at = 0;
  for (let b = 0; b < blocks; b++)
    for (let k = 0; k < (size[b] as number); k++) fitted[at++] = level[b] as number;
  return fitted;
}
