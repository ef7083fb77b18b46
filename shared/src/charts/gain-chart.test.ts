import { describe, expect, test } from 'vitest';
import { gainChart } from './gain-chart.js';

const size = { width: 600, height: 240 };
const points = [
  { travel: 30, gain: 0.6 },
  { travel: 50, gain: 1.4 },
];

describe('the gain chart', () => {
  test('shows the gain wanted where gain is absolute, 0.5 under 2', () => {
    const { wanted, points: drawn } = gainChart(points, true, size);
    expect(wanted?.top).toBeLessThan(wanted?.bottom ?? 0);
    expect(drawn.every((point) => point.y > (wanted?.top ?? 0) && point.y < (wanted?.bottom ?? 0))).toBe(
      true,
    );
  });

  test('shows no wanted gain where only its shape is known', () => {
    expect(gainChart(points, false, size).wanted).toBeNull();
  });

  test('a single point has no line, and what is not a number is left out', () => {
    const odd = gainChart(
      [
        { travel: 30, gain: NaN },
        { travel: 40, gain: 1 },
      ],
      true,
      size,
    );
    expect(odd.line).toBe('');
    expect(odd.points).toHaveLength(1);
    expect(JSON.stringify(gainChart([], true, size))).not.toMatch(/NaN/);
  });
});
