import { describe, expect, it } from 'vitest';
import strd from '../../../reference/nist-strd.json' with { type: 'json' };
import reference from '../../../reference/statistics.json' with { type: 'json' };
import { effectiveCount, lagAutocorrelation } from './autocorrelation.js';
import { moments } from './moments.js';
import { normalQuantile } from './normal-quantile.js';
import { normalCumulative } from './normal.js';
import { studentQuantile, studentTwoSided } from './student.js';
import { welch } from './welch.js';

interface Quantile {
  f: string;
  p: number;
  df?: number;
  value: number;
}
const quantiles = (reference.cases.find((c) => c.id === 'distributions')?.expected ??
  []) as unknown as Quantile[];
const two = reference.cases.find((c) => c.id === 'two_samples') as unknown as {
  data: { a: number[]; b: number[] };
  expected: { welch_t: number; welch_df: number; welch_p: number; sd_a: number };
};

describe('distributions against R (shared/reference/statistics.json)', () => {
  it('quantiles of the normal distribution agree to 1e-9, and its cumulative inverts them', () => {
    for (const { p, value } of quantiles.filter((q) => q.f === 'normal quantile')) {
      expect(normalQuantile(p)).toBeCloseTo(value, 9);
      expect(normalCumulative(value)).toBeCloseTo(p, 12);
      expect(normalQuantile(1 - p)).toBeCloseTo(-value, 9);
    }
    expect(normalQuantile(0)).toBeNaN();
  });

  // the stored quantiles come from an iteration that stops some 4e-9 short
  it('quantiles of Student’s t agree to 1e-8', () => {
    const ts = quantiles.filter((q) => q.f === 't quantile');
    expect(ts.length).toBeGreaterThan(10);
    for (const { p, df, value } of ts) {
      expect(Math.abs(studentQuantile(p, df as number) / value - 1)).toBeLessThan(1e-8);
      expect(studentTwoSided(value, df as number)).toBeCloseTo(2 * (1 - p), 8);
    }
  });

  it('Welch’s test of two samples gives R’s t, degrees of freedom and p', () => {
    const { data, expected } = two;
    const found = welch(data.b, data.a);
    expect(found.t).toBeCloseTo(expected.welch_t, 9);
    expect(found.degrees).toBeCloseTo(expected.welch_df, 9);
    expect(Math.abs(found.p / expected.welch_p - 1)).toBeLessThan(1e-9);
    expect(moments(data.a).deviation).toBeCloseTo(expected.sd_a, 12);
    // one sample counted as fewer independent values: the same difference, a wider interval
    const fewer = welch(data.b, data.a, [6, 5]);
    expect(fewer.difference).toBe(found.difference);
    expect(fewer.high - fewer.low).toBeGreaterThan(1.5 * (found.high - found.low));
  });

  it('samples without any spread differ surely or not at all', () => {
    expect(welch([1, 1, 1], [2, 2, 2])).toMatchObject({ p: 0, difference: 1 });
    expect(welch([1, 1, 1], [1, 1, 1])).toMatchObject({ p: 1, difference: 0 });
    expect(welch([1], [2, 3]).p).toBeNaN();
  });
});

describe('autocorrelation', () => {
  const series = reference.cases.find((c) => c.id === 'series') as unknown as {
    data: { y: number[] };
    expected: { acf_1_to_10: number[]; effective_sample_size_ar1: number };
  };
  it('agrees with R acf at lags 1 to 10 to 1e-9', () => {
    series.expected.acf_1_to_10.forEach((value, k) => {
      expect(lagAutocorrelation(series.data.y, k + 1)).toBeCloseTo(value, 9);
    });
    const r1 = lagAutocorrelation(series.data.y, 1);
    expect(effectiveCount(60, r1)).toBeCloseTo(series.expected.effective_sample_size_ar1, 9);
  });
  it('of a constant series is not a number', () => {
    expect(lagAutocorrelation([2, 2, 2], 1)).toBeNaN();
    expect(lagAutocorrelation([2], 1)).toBeNaN();
  });
});

describe('NIST StRD univariate problems', () => {
  for (const set of strd.datasets) {
    if (set.kind !== 'univariate') continue;
    it(`${set.name}: mean to 12 digits, deviation and lag-1 autocorrelation to 8`, () => {
      const data = set.data as number[];
      const certified = set as unknown as {
        certified_mean: number;
        certified_standard_deviation: number;
        certified_lag1_autocorrelation: number;
      };
      const found = moments(data);
      const relative = (value: number, wanted: number) => Math.abs(value - wanted) / Math.abs(wanted || 1);
      expect(relative(found.mean, certified.certified_mean)).toBeLessThan(1e-12);
      expect(relative(found.deviation, certified.certified_standard_deviation)).toBeLessThan(1e-8);
      expect(relative(lagAutocorrelation(data, 1), certified.certified_lag1_autocorrelation)).toBeLessThan(
        1e-8,
      );
    });
  }
});
