import { describe, expect, test } from 'vitest';
import { movementBars } from './movement-bars.js';

const size = { width: 600, height: 300 };
const start = Date.UTC(2026, 8, 1) / 1000;
const aDay = (i: number, travel = 1000, reversals = 200) => ({ day: start + i * 86_400, travel, reversals });

describe('the movement bars', () => {
  test('a day without service keeps its place and has no bar', () => {
    const { travel } = movementBars([aDay(0), aDay(1), aDay(3)], size, 'UTC');
    const [a, b, d] = travel.bars.map((bar) => bar.x);
    expect((d ?? 0) - (b ?? 0)).toBeCloseTo(2 * ((b ?? 0) - (a ?? 0)), 6);
  });

  test('bars stand on the bottom of their panel and do not touch', () => {
    const { reversals } = movementBars([aDay(0, 1, 100), aDay(1, 1, 200)], size, 'UTC');
    const [a, b] = reversals.bars;
    expect((a?.y ?? 0) + (a?.height ?? 0)).toBeCloseTo(reversals.plot.bottom, 9);
    expect(b?.height).toBeCloseTo(2 * (a?.height ?? 0), 9);
    expect((a?.x ?? 0) + (a?.width ?? 0)).toBeLessThan(b?.x ?? 0);
  });

  test('the words under the axis are in the site’s zone', () => {
    const days = [aDay(0), aDay(1)];
    const utc = movementBars(days, size, 'UTC').timeTicks.map((tick) => tick.text);
    const west = movementBars(days, size, 'America/Los_Angeles').timeTicks.map((tick) => tick.text);
    expect(utc[0]).toBe('1 Sept');
    expect(west[0]).toBe('31 Aug');
  });

  test.each([
    ['no day', []],
    ['one day', [aDay(0)]],
    ['a day that is not a number', [aDay(NaN)]],
  ])('%s: no NaN in the drawing', (_, days) => {
    expect(JSON.stringify(movementBars(days, size, 'UTC'))).not.toMatch(/NaN|null/);
  });
});
