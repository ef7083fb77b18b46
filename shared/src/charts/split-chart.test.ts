import { describe, expect, test } from 'vitest';
import { splitChart } from './split-chart.js';

const size = { width: 600, height: 260 };

describe('the split chart', () => {
  test('the falling line of a dead band lies above the rising one', () => {
    const { places } = splitChart(
      [40, 50, 60].map((at) => ({ at, up: at - 1, down: at + 1 })),
      size,
    );
    expect(places.every((place) => place.down.y < place.up.y)).toBe(true);
  });

  test('the axes cover what was visited, so that a dead band of 2 % is seen', () => {
    const { places, plot } = splitChart(
      [40, 50, 60].map((at) => ({ at, up: at - 1, down: at + 1 })),
      size,
    );
    const gap = (places[1]?.up.y ?? 0) - (places[1]?.down.y ?? 0);
    expect(gap / (plot.bottom - plot.top)).toBeGreaterThan(0.05);
  });

  test.each([
    ['no place', []],
    ['one place', [{ at: 50, up: 49, down: 51 }]],
    ['a place that is not a number', [{ at: 50, up: NaN, down: 51 }]],
  ])('%s: no NaN in the drawing', (_, lines) => {
    const drawing = splitChart(lines, size);
    expect(JSON.stringify(drawing)).not.toMatch(/NaN|null/);
    expect(drawing.up).toBe('');
  });
});
