import { describe, expect, test } from 'vitest';
import { curveAt, curveBetween } from './curve-between.js';

const curve = [0, 10, 20, 30].map((travel) => ({ travel, value: travel * 2, low: travel, high: travel * 3 }));

describe('a piece of a curve', () => {
  test('ends exactly where asked, every figure interpolated', () => {
    expect(curveBetween(curve, 5, 15)).toEqual([
      { travel: 5, value: 10, low: 5, high: 15 },
      { travel: 10, value: 20, low: 10, high: 30 },
      { travel: 15, value: 30, low: 15, high: 45 },
    ]);
  });

  test('never reaches beyond the curve itself', () => {
    expect(curveBetween(curve, 25, 60).at(-1)?.travel).toBe(30);
    expect(curveBetween(curve, 40, 60)).toEqual([]);
    expect(curveAt(curve, -1)).toBeNull();
  });

  test('of a reversed or empty span is a place at most', () => {
    expect(curveBetween(curve, 20, 20)).toHaveLength(1);
    expect(curveBetween([], 0, 100)).toEqual([]);
  });

  test('passes over places with a figure that is not finite', () => {
    const odd = [...curve.slice(0, 2), { travel: 15, value: NaN, low: 1, high: 1 }, ...curve.slice(2)];
    expect(curveBetween(odd, 0, 30).map((place) => place.travel)).toEqual([0, 10, 20, 30]);
  });
});
