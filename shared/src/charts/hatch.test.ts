import { describe, expect, test } from 'vitest';
import { hatchUnder } from './hatch.js';

const numbers = (path: string) => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);

describe('hatching', () => {
  test('stays between the line and the baseline', () => {
    const line = [
      { x: 0, y: 40 },
      { x: 20, y: 10 },
      { x: 40, y: 40 },
    ];
    const places = numbers(hatchUnder(line, 40, 4));
    expect(places.length).toBeGreaterThan(8);
    for (let i = 0; i < places.length; i += 2) {
      const [x = 0, y = 0] = [places[i], places[i + 1]];
      const edge = x <= 20 ? 40 - 1.5 * x : 10 + 1.5 * (x - 20);
      expect(y).toBeGreaterThanOrEqual(edge - 0.1);
      expect(y).toBeLessThanOrEqual(40.1);
    }
  });

  test('a flat line on the baseline, or no line, has no strokes', () => {
    expect(hatchUnder([], 40, 4)).toBe('');
    expect(
      hatchUnder(
        [
          { x: 0, y: 40 },
          { x: 30, y: 40 },
        ],
        40,
        4,
      ),
    ).toBe('');
  });
});
