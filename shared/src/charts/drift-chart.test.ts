import { describe, expect, test } from 'vitest';
import { driftChart } from './drift-chart.js';

const size = { width: 600, height: 260 };
const month = 30.4 * 86_400;
const reference = { from: 0, to: 2 * month };
const aPlace = (i: number, change: number, half = 0.02) => ({
  at: i * month,
  change,
  low: change - half,
  high: change + half,
  windows: 100,
});

describe('the drift chart', () => {
  test('a change of ln capacity is shown in % of capacity', () => {
    const { places } = driftChart({ reference, series: [aPlace(3, Math.log(0.9))], steps: [] }, size, 'UTC');
    expect(places[0]?.percent).toBeCloseTo(-10, 9);
  });

  test('marks a month as changed only where its whole interval is on one side of zero', () => {
    const { places } = driftChart(
      { reference, series: [aPlace(3, 0.01), aPlace(4, 0.03), aPlace(5, -0.03)], steps: [] },
      size,
      'UTC',
    );
    expect(places.map((place) => place.beyond)).toEqual([false, true, true]);
  });

  test('places the step between the months it parts', () => {
    const { places, steps } = driftChart(
      { reference, series: [aPlace(3, 0), aPlace(4, -0.1)], steps: [{ at: 3.5 * month, change: -0.1 }] },
      size,
      'UTC',
    );
    expect(steps[0]?.x).toBeGreaterThan(places[0]?.x ?? Infinity);
    expect(steps[0]?.x).toBeLessThan(places[1]?.x ?? -Infinity);
  });

  test.each([
    ['no month', []],
    ['one month', [aPlace(3, 0.1)]],
    ['a month that is not a number', [aPlace(3, NaN)]],
  ])('%s: no NaN in the drawing, even without a reference period', (_, series) => {
    const nowhere = { from: NaN, to: NaN };
    for (const one of [reference, nowhere]) {
      const drawing = driftChart({ reference: one, series, steps: [] }, size, 'UTC');
      expect(JSON.stringify(drawing)).not.toMatch(/NaN|null/);
    }
  });
});
