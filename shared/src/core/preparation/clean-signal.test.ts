import { describe, expect, it } from 'vitest';
import { cleanSignal } from './clean-signal.js';

const bounds = { low: -5, high: 105 };
const span = { from: 0, to: 100 };

describe('cleanSignal', () => {
  it('is a programmer’s mistake with columns of different length', () => {
    const series = { time: new Float64Array(3), value: new Float64Array(2), good: new Uint8Array(3) };
    expect(() => cleanSignal(series, span, bounds)).toThrow(RangeError);
  });

  it('leaves its argument as it was', () => {
    const value = Float64Array.of(1, 999, 3);
    cleanSignal({ time: Float64Array.of(0, 1, 2), value, good: Uint8Array.of(1, 1, 1) }, span, bounds);
    expect([...value]).toEqual([1, 999, 3]);
  });

  it('drops samples without a time and refuses infinite values', () => {
    const clean = cleanSignal(
      {
        time: Float64Array.of(0, NaN, 2, Infinity),
        value: Float64Array.of(1, 2, Infinity, 4),
        good: Uint8Array.of(1, 1, 1, 1),
      },
      span,
      bounds,
    );
    expect([...clean.time]).toEqual([0, 2]);
    expect([...clean.value]).toEqual([1, NaN]);
    expect(clean.bad).toBe(1);
  });
});
