import { describe, expect, test } from 'vitest';
import { deviationChart } from './deviation-chart.js';

const size = { width: 600, height: 240 };

describe('the deviation chart', () => {
  test('tells bins beyond the tolerance, on either side, from those within', () => {
    const { bins } = deviationChart(
      [
        { travel: 30, percent: 5, tolerance: 12 },
        { travel: 40, percent: -13, tolerance: 12 },
        { travel: 50, percent: 12, tolerance: 12 },
        { travel: 60, percent: 20, tolerance: 11 },
      ],
      size,
    );
    expect(bins.map((bin) => bin.beyond)).toEqual([false, true, false, true]);
  });

  test('more than specified lies above the zero line', () => {
    const { bins, zero } = deviationChart([{ travel: 30, percent: 5, tolerance: 12 }], size);
    expect(bins[0]?.y).toBeLessThan(zero);
  });

  test.each([
    ['no bins', []],
    ['one bin', [{ travel: 30, percent: 5, tolerance: 12 }]],
    ['a bin that is not a number', [{ travel: 30, percent: NaN, tolerance: 12 }]],
  ])('%s: no NaN in the drawing', (_, bins) => {
    expect(JSON.stringify(deviationChart(bins, size))).not.toMatch(/NaN|null/);
  });
});
