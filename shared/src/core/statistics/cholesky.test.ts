import { describe, expect, it } from 'vitest';
import { invertPositive } from './cholesky.js';

describe('inverse of a positive definite matrix', () => {
  it('times the matrix is the identity, and the determinant is right', () => {
    const M = Float64Array.of(4, 2, 0.6, 2, 5, 1, 0.6, 1, 3);
    const found = invertPositive(M, 3);
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++) {
        let sum = 0;
        for (let k = 0; k < 3; k++) sum += (M[i * 3 + k] as number) * (found?.inverse[k * 3 + j] as number);
        expect(sum).toBeCloseTo(i === j ? 1 : 0, 12);
      }
    // 4(15 − 1) − 2(6 − 0.6) + 0.6(2 − 3) = 44.6
    expect(found?.logDeterminant).toBeCloseTo(Math.log(44.6), 12);
  });

  it('does not exist for a matrix that is not positive definite', () => {
    expect(invertPositive(Float64Array.of(1, 2, 2, 1), 2)).toBeNull();
    expect(invertPositive(Float64Array.of(NaN), 1)).toBeNull();
  });
});
