import { describe, expect, test } from 'vitest';
import { linearValues, logValues } from './value-scale.js';

describe('the value axis', () => {
  test('linear: starts at zero, ends on a round number, low end at the bottom', () => {
    const y = linearValues([12, 87], 300, 20);
    expect(y.domain).toEqual([0, 100]);
    expect([y.place(0), y.place(100)]).toEqual([300, 20]);
    expect(y.ticks.map((tick) => tick.text)).toContain('60');
  });

  test('log: marks 1, 2 and 5 of each decade', () => {
    const y = logValues([2, 130], 300, 20);
    expect(y.ticks.map((tick) => tick.value)).toEqual([2, 5, 10, 20, 50, 100]);
  });

  test('log: equal fractions are equal lengths', () => {
    const y = logValues([1, 100], 300, 20);
    expect(y.place(2) - y.place(4)).toBeCloseTo(y.place(20) - y.place(40), 9);
  });

  test('log: under one decade still has marks to read by', () => {
    const marks = logValues([21, 48], 300, 20).ticks.map((tick) => tick.value);
    expect(marks).toEqual([20, 30, 40, 50]);
  });

  test('log: a curve that starts near zero takes three decades at most', () => {
    const [low, high] = logValues([1e-9, 100], 300, 20).domain;
    expect(high / low).toBeLessThan(1300);
  });

  test('log: zero and less lie at the bottom', () => {
    const y = logValues([0, -4, 10], 300, 20);
    expect([y.place(0), y.place(-4)]).toEqual([300, 300]);
  });

  test.each([
    ['nothing', []],
    ['one zero', [0]],
    ['one value', [7]],
    ['the same value twice', [-3, -3]],
    ['nothing finite', [NaN, Infinity]],
  ])('%s still makes an axis', (_, values) => {
    for (const y of [
      linearValues(values, 300, 20),
      linearValues(values, 300, 20, []),
      logValues(values, 300, 20),
    ]) {
      expect(Number.isFinite(y.place(1))).toBe(true);
      expect(y.domain[1]).toBeGreaterThan(y.domain[0]);
      expect(y.ticks.every((tick) => Number.isFinite(tick.at))).toBe(true);
    }
  });
});
