import { expect, test } from 'vitest';
import { defaultLimits } from '../limits.js';
import { trendOf } from './trend.js';

test('a year told by its months has changed by twelve twelfths, not by the eleven between their middles', () => {
  const month = 30.4375 * 86_400;
  const time = Array.from({ length: 12 }, (_, i) => (i + 0.5) * month);
  const change = time.map((t) => (0.06 * t) / (12 * month));
  expect(trendOf({ time, change }, 0.03, defaultLimits).change).toBeCloseTo(0.06, 12);
});
