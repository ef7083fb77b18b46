import { describe, expect, it } from 'vitest';
import strd from '../../../reference/nist-strd.json' with { type: 'json' };
import reference from '../../../reference/statistics.json' with { type: 'json' };
import { aicc } from './aicc.js';
import { linearLeastSquares } from './linear-least-squares.js';
import { nonlinearLeastSquares } from './nonlinear-least-squares.js';

interface Problem {
  name: string;
  kind: string;
  data: number[][];
  certified: number[];
  certified_sd: number[];
  residual_sum_of_squares: number;
  start2?: number[];
}
const problems = strd.datasets as unknown as Problem[];
const relative = (value: number, wanted: number) =>
  wanted === 0 ? Math.abs(value) : Math.abs(value / wanted - 1);
const column = (set: Problem, j: number) => set.data.map((row) => row[j] as number);

describe('NIST StRD linear problems', () => {
  /** Longley's columns nearly depend on each other, Wampler's are powers to the fifth. */
  const tolerance: Record<string, number> = { Longley: 1e-9, Wampler1: 1e-9, Wampler3: 1e-9 };
  for (const set of problems.filter((p) => p.kind === 'linear')) {
    it(`${set.name}: coefficients and their deviations to nine digits`, () => {
      const x = column(set, 1);
      const ones = x.map(() => 1);
      const columns =
        set.name === 'NoInt1'
          ? [x]
          : set.name.startsWith('Wampler')
            ? [0, 1, 2, 3, 4, 5].map((power) => x.map((v) => v ** power))
            : [ones, ...(set.data[0] as number[]).slice(1).map((_, j) => column(set, j + 1))];
      const fit = linearLeastSquares(columns, column(set, 0));
      expect(fit).not.toBeNull();
      set.certified.forEach((value, j) => {
        expect(relative(fit?.coefficients[j] ?? NaN, value)).toBeLessThan(tolerance[set.name] ?? 1e-10);
      });
      set.certified_sd.forEach((value, j) => {
        // zero residuals: the certified deviations are 0
        expect(relative(fit?.standardErrors[j] ?? NaN, value)).toBeLessThan(value === 0 ? 1e-6 : 1e-9);
      });
      if (set.residual_sum_of_squares > 0)
        expect(relative(fit?.rss ?? NaN, set.residual_sum_of_squares)).toBeLessThan(1e-9);
    });
  }

  it('columns that depend on each other, or outnumber the points, have no answer', () => {
    const dependent = [
      [1, 1, 1],
      [2, 2, 2],
    ];
    expect(linearLeastSquares(dependent, [1, 2, 3])).toBeNull();
    expect(linearLeastSquares([[1], [2]], [1])).toBeNull();
    expect(() => linearLeastSquares([[1, 2]], [1])).toThrow(RangeError);
  });
});

type Model = (b: Float64Array, x: readonly number[]) => number;
const at = (values: ArrayLike<number>, i: number) => values[i - 1] as number;
const cubic = (b: Float64Array, x: number, powers: number, from: number) => {
  let sum = 0;
  for (let k = 0; k <= powers; k++) sum += at(b, from + k) * x ** k;
  return sum;
};
const rational =
  (above: number, below: number): Model =>
  (b, [x = NaN]) => {
    let divisor = 1;
    for (let k = 1; k <= below; k++) divisor += at(b, above + 1 + k) * x ** k;
    return cubic(b, x, above, 1) / divisor;
  };
const saturating: Model = (b, [x = NaN]) => at(b, 1) * (1 - Math.exp(-at(b, 2) * x));
const models: Record<string, Model> = {
  Misra1a: saturating,
  BoxBOD: saturating,
  Chwirut2: (b, [x = NaN]) => Math.exp(-at(b, 1) * x) / (at(b, 2) + at(b, 3) * x),
  DanWood: (b, [x = NaN]) => at(b, 1) * x ** at(b, 2),
  Lanczos3: (b, [x = NaN]) => [1, 3, 5].reduce((sum, j) => sum + at(b, j) * Math.exp(-at(b, j + 1) * x), 0),
  MGH17: (b, [x = NaN]) => at(b, 1) + at(b, 2) * Math.exp(-x * at(b, 4)) + at(b, 3) * Math.exp(-x * at(b, 5)),
  Hahn1: rational(3, 3),
  Thurber: rational(3, 3),
  Kirby2: rational(2, 2),
  Nelson: (b, [x1 = NaN, x2 = NaN]) => at(b, 1) - at(b, 2) * x1 * Math.exp(-at(b, 3) * x2),
  Eckerle4: (b, [x = NaN]) => (at(b, 1) / at(b, 2)) * Math.exp(-0.5 * ((x - at(b, 3)) / at(b, 2)) ** 2),
  Rat42: (b, [x = NaN]) => at(b, 1) / (1 + Math.exp(at(b, 2) - at(b, 3) * x)),
};

describe('NIST StRD nonlinear problems, from their second start', () => {
  for (const set of problems.filter((p) => p.kind === 'nonlinear')) {
    it(`${set.name}: parameters to six digits, their deviations to five`, () => {
      const model = models[set.name] as Model;
      const x = set.data.map((row) => row.slice(1));
      const y = column(set, 0).map((v) => (set.name === 'Nelson' ? Math.log(v) : v));
      const fit = nonlinearLeastSquares((b) => x.map((row) => model(b, row)), y, set.start2 ?? []);
      // Lanczos3's residuals are 1e-5 of its data: four digits of it are what its rounding leaves
      const digits = set.name === 'Lanczos3' ? 1e-4 : 1e-6;
      set.certified.forEach((value, j) => {
        expect(relative(fit?.parameters[j] ?? NaN, value)).toBeLessThan(digits);
      });
      set.certified_sd.forEach((value, j) => {
        expect(relative(fit?.standardErrors[j] ?? NaN, value)).toBeLessThan(10 * digits);
      });
      expect(relative(fit?.rss ?? NaN, set.residual_sum_of_squares)).toBeLessThan(1e-6);
    });
  }

  it('a start that gives no finite value is refused', () => {
    expect(nonlinearLeastSquares((b) => [at(b, 1), NaN, 0], [1, 2, 3], [1])).toBeNull();
  });
});

interface CharacteristicCase {
  data: { h: number[]; c: number[] };
  expected: Record<string, { rss: number; n: number; K: number; aicc: number }>;
}

describe('AICc', () => {
  it.each(reference.cases.filter((c) => c.id.startsWith('characteristic_')).map((c) => [c.id, c] as const))(
    '%s: differs from R’s by the Gaussian constant n(1 + ln 2π) only',
    (_, c) => {
      const { expected } = c as unknown as CharacteristicCase;
      const fits = Object.values(expected).filter((fit) => Number.isFinite(fit.aicc));
      expect(fits.length).toBeGreaterThan(4);
      for (const { n, rss, K, aicc: wanted } of fits)
        expect(aicc(n, rss, K) + n * (1 + Math.log(2 * Math.PI))).toBeCloseTo(wanted, 6);
    },
  );

  it('is infinite where the points leave no room for the parameters', () => {
    expect(aicc(4, 1, 3)).toBe(Infinity);
    expect(aicc(10, 0, 2, 0.005)).toBeLessThan(-90);
  });
});

describe('least squares on the tables of shared/reference/statistics.json', () => {
  it('gives R’s parameters and errors of an exponential characteristic', () => {
    const c = reference.cases.find((one) => one.id === 'characteristic_eq') as unknown as {
      data: { h: number[]; c: number[] };
      expected: { exponential: { parameters: { A: number; k: number }; se: { A: number; k: number } } };
    };
    const fit = nonlinearLeastSquares(
      (b) => c.data.h.map((h) => at(b, 1) * Math.exp(at(b, 2) * h)),
      c.data.c,
      [4, 3],
    );
    const { parameters, se } = c.expected.exponential;
    expect(relative(fit?.parameters[0] ?? NaN, parameters.A)).toBeLessThan(1e-6);
    expect(relative(fit?.parameters[1] ?? NaN, parameters.k)).toBeLessThan(1e-6);
    expect(relative(fit?.standardErrors[1] ?? NaN, se.k)).toBeLessThan(1e-5);
  });
});
