import { describe, expect, test } from 'vitest';
import { travelScale, travelTicks } from './travel-scale.js';

describe('the travel axis', () => {
  test('runs from 0 to 100 % whatever was visited', () => {
    const x = travelScale(8, 312);
    expect([x(0), x(50), x(100)]).toEqual([8, 160, 312]);
  });

  test('draws travel outside 0 to 100 % at the end it passed', () => {
    const x = travelScale(8, 312);
    expect([x(-3), x(104)]).toEqual([8, 312]);
  });

  test('has fewer marks where there is less room, always with both ends', () => {
    const values = (width: number) => travelTicks(0, width).map((tick) => tick.value);
    expect(values(600)).toEqual([0, 10, 20, 30, 40, 50, 60, 70, 80, 90, 100]);
    expect(values(300)).toEqual([0, 25, 50, 75, 100]);
    expect(values(100)).toEqual([0, 50, 100]);
  });
});
