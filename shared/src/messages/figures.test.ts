import { describe, expect, test } from 'vitest';
import { capacityChange, duration, number, share } from './figures.js';

describe('figures in prose', () => {
  test('a small share keeps a decimal so that it does not read as nothing', () => {
    expect(share(0.004)).toBe('0.4\u00a0%');
    expect(share(0.31)).toBe('31\u00a0%');
    expect(share(0)).toBe('0\u00a0%');
  });

  test('thousands are set apart and the minus sign is a minus sign', () => {
    expect(number(-12345.6, 1)).toBe('−12\u202f345.6');
    expect(number(-0.01)).toBe('0');
  });

  test('a figure that is not known is a dash, never a number', () => {
    expect(number(NaN)).toBe('–');
    expect(duration(Infinity)).toBe('–');
  });

  test('a time is given in the unit a reader would choose', () => {
    expect(duration(90)).toBe('90\u00a0s');
    expect(duration(600)).toBe('10\u00a0min');
    expect(duration(10_800)).toBe('3.0\u00a0h');
    expect(duration(30 * 86_400)).toBe('30\u00a0days');
  });

  test('a change of ln capacity reads as a percentage of capacity', () => {
    expect(capacityChange(Math.log(0.85))).toBe('15\u00a0%');
  });
});
