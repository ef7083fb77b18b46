/** A linear fit: coefficients, their standard errors, and what is left. */
export interface LinearFit {
  readonly coefficients: Float64Array;
  readonly standardErrors: Float64Array;
  /** sum of squared residuals */
  readonly rss: number;
  readonly degreesOfFreedom: number;
}

/**
 * Linear least squares by Householder's triangularisation of the scaled columns, with one refinement on the residuals.
 *
 * Normal equations lose half of the digits on columns that nearly depend on each other; this keeps nine or more on the
 * certified problems it is tested with.
 *
 * @param columns one array a coefficient, all as long as y (a column of ones for an intercept)
 * @param y at least as many values as columns
 * @returns null where the columns depend on each other; standard errors NaN without degrees of freedom
 */
export function linearLeastSquares(
  columns: readonly ArrayLike<number>[],
  y: ArrayLike<number>,
): LinearFit | null {
  const n = y.length;
  const m = columns.length;
  if (columns.some((column) => column.length !== n)) throw new RangeError('columns and y differ in length');
  if (n < m) return null;
  const scale = columns.map((column) => norm(column, 0));
  if (scale.some((s) => !(s > 0))) return null;
  const triangular = triangularise(
    columns.map((column, j) => Float64Array.from(column, (v) => v / (scale[j] as number))),
  );
  if (triangular === null) return null;
  const solution = new Float64Array(m);
  let residual = Float64Array.from(y);
  for (let pass = 0; pass < 3; pass++) {
    const correction = triangular.solve(residual);
    for (let j = 0; j < m; j++) solution[j] = (solution[j] as number) + (correction[j] as number);
    residual = Float64Array.from(y, (v, i) => exactResidual(v, columns, scale, solution, i));
  }
  const rss = norm(residual, 0) ** 2;
  const degreesOfFreedom = n - m;
  const variances = triangular.inverseDiagonal();
  const sigma = Math.sqrt(rss / degreesOfFreedom);
  return {
    coefficients: solution.map((v, j) => v / (scale[j] as number)),
    standardErrors: variances.map((v, j) =>
      degreesOfFreedom > 0 ? (sigma * Math.sqrt(v)) / (scale[j] as number) : NaN,
    ),
    rss,
    degreesOfFreedom,
  };
}

function norm(values: ArrayLike<number>, from: number): number {
  let sum = 0;
  for (let i = from; i < values.length; i++) sum += (values[i] as number) ** 2;
  return Math.sqrt(sum);
}

/** y less its fit at row i, summed with compensation, so that refinement has something to work with. */
function exactResidual(
  y: number,
  columns: readonly ArrayLike<number>[],
  scale: readonly number[],
  solution: Float64Array,
  i: number,
): number {
  let sum = y;
  let lost = 0;
  for (let j = 0; j < columns.length; j++) {
    const term =
      -(((columns[j] as ArrayLike<number>)[i] as number) / (scale[j] as number)) * (solution[j] as number);
    const next = sum + term;
    lost += Math.abs(sum) >= Math.abs(term) ? sum - next + term : term - next + sum;
    sum = next;
  }
  return sum + lost;
}

/** Householder reflections of the columns, which are used up. */
function triangularise(columns: Float64Array[]) {
  const m = columns.length;
  const reflectors: Float64Array[] = [];
  const R = columns.map(() => new Float64Array(m));
  for (let k = 0; k < m; k++) {
    const column = columns[k] as Float64Array;
    const length = norm(column, k);
    if (!(length > 1e-13)) return null;
    const v = column.slice();
    v.fill(0, 0, k);
    v[k] = (v[k] as number) + Math.sign((v[k] as number) || 1) * length;
    const size = norm(v, k);
    for (let i = k; i < v.length; i++) v[i] = (v[i] as number) / size;
    reflectors.push(v);
    for (let j = k; j < m; j++) reflect(columns[j] as Float64Array, v, k);
    for (let j = k; j < m; j++) (R[k] as Float64Array)[j] = (columns[j] as Float64Array)[k] as number;
  }
  const r = (i: number, j: number) => (R[i] as Float64Array)[j] as number;
  const backSubstitute = (right: Float64Array) => {
    const x = new Float64Array(m);
    for (let i = m - 1; i >= 0; i--) {
      let sum = right[i] as number;
      for (let j = i + 1; j < m; j++) sum -= r(i, j) * (x[j] as number);
      x[i] = sum / r(i, i);
    }
    return x;
  };
  return {
    solve(right: Float64Array): Float64Array {
      const turned = right.slice();
      reflectors.forEach((v, k) => {
        reflect(turned, v, k);
      });
      return backSubstitute(turned);
    },
    /** diagonal of (AᵀA)⁻¹ */
    inverseDiagonal(): Float64Array {
      const diagonal = new Float64Array(m);
      for (let k = 0; k < m; k++) {
        const unit = new Float64Array(m);
        unit[k] = 1;
        const x = backSubstitute(unit);
        for (let i = 0; i < m; i++) diagonal[i] = (diagonal[i] as number) + (x[i] as number) ** 2;
      }
      return diagonal;
    },
  };
}

function reflect(values: Float64Array, v: Float64Array, from: number): void {
  let dot = 0;
  for (let i = from; i < v.length; i++) dot += (v[i] as number) * (values[i] as number);
  for (let i = from; i < v.length; i++) values[i] = (values[i] as number) - 2 * dot * (v[i] as number);
}
