import { describe, expect, it } from 'vitest';
import { sortedFinite, sortedQuantile } from '../statistics/quantile.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { criticalValues, rStatistic, runIn } from './r-statistic.js';

function noise(n: number, correlation = 0): Float64Array {
  const random = seededRandom(11);
  const values = new Float64Array(n);
  let last = 0;
  for (let i = 0; i < n; i++) {
    const white = Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
    last = correlation * last + white;
    values[i] = last;
  }
  return values;
}

describe('R-statistic', () => {
  it('gives the worked values of methods.md §12.5', () => {
    const R = rStatistic(Float64Array.of(10, 10.2, 9.9, 10.1, 10), {
      value: 0.2,
      variance: 0.1,
      difference: 0.1,
    });
    expect(R[0]).toBeNaN();
    [1.8, 0.7943, 0.678, 0.6429].forEach((expected, i) => expect(R[i + 1]).toBeCloseTo(expected, 4));
  });

  it.each(criticalValues.map((c) => [c.filters.value, c] as const))(
    'at λ1 = %s exceeds its tabulated values as often as it should on white noise',
    (_, critical) => {
      const R = sortedFinite(rStatistic(noise(300_000), critical.filters).slice(runIn(critical.filters)));
      expect(sortedQuantile(R, 0.5)).toBeCloseTo(critical.median, 1);
      expect(sortedQuantile(R, 0.9)).toBeCloseTo(critical.percent90, 1);
      expect(sortedQuantile(R, 0.95)).toBeCloseTo(critical.percent95, 1);
    },
  );

  it('calls nearly all correlated noise a transient, which is why it is not the default', () => {
    const R = sortedFinite(rStatistic(noise(100_000, 0.5), { value: 0.2, variance: 0.1, difference: 0.1 }));
    expect(sortedQuantile(R, 0.5)).toBeCloseTo(1.62, 1);
  });

  it('rises far above 1 on a ramp', () => {
    const ramp = noise(500).map((v, i) => v + i);
    const R = rStatistic(ramp, { value: 0.1, variance: 0.1, difference: 0.1 });
    expect(R[499]).toBeGreaterThan(10);
  });

  it('passes over what is not known', () => {
    const R = rStatistic(Float64Array.of(10, NaN, 10.2), { value: 0.2, variance: 0.1, difference: 0.1 });
    expect(R[1]).toBeNaN();
    expect(R[2]).toBeCloseTo(1.8, 12);
  });
});
