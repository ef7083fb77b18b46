import { describe, expect, it } from 'vitest';
import { timeAxis } from './time-scale.js';

const at = (instant: string) => Date.parse(instant) / 1000;

describe('timeAxis', () => {
  it('names the hour where ticks are closer than a day, so that no two ticks read alike', () => {
    const { ticks } = timeAxis(at('2026-11-23T00:00:00Z'), at('2026-11-26T00:00:00Z'), 0, 900, 'Europe/Oslo');
    const words = ticks.map(({ text }) => text);
    expect(new Set(words).size).toBe(words.length);
    expect(words).toContain('23 Nov, 13:00');
  });

  it('names days alone where ticks are days apart', () => {
    const { ticks } = timeAxis(at('2026-11-01T00:00:00Z'), at('2026-11-29T00:00:00Z'), 0, 700, 'Europe/Oslo');
    expect(ticks.every(({ text }) => /^\d+ Nov$/.test(text))).toBe(true);
  });
});
