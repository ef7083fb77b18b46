import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { archive } from './historian.js';

const settings = { scan: 10, tolerance: 0.5, longest: 3_600, decimals: 6 };

describe('the historian', () => {
  test('a straight line between stored points misses no dropped scan by more than its tolerance', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 2, maxLength: 200 }),
        (values) => {
          const scans = Float64Array.from(values);
          const { time, value } = archive(0, scans, settings);
          let k = 0;
          for (let i = 0; i < scans.length; i++) {
            const t = 10 * i;
            while (k + 1 < time.length - 1 && (time[k + 1] as number) < t) k++;
            const [t0, t1] = [time[k] as number, time[Math.min(k + 1, time.length - 1)] as number];
            const [v0, v1] = [value[k] as number, value[Math.min(k + 1, time.length - 1)] as number];
            const line = t1 === t0 ? v0 : v0 + ((v1 - v0) * (t - t0)) / (t1 - t0);
            expect(Math.abs(line - (scans[i] as number))).toBeLessThanOrEqual(0.5 + 1e-5);
          }
        },
      ),
    );
  });

  test('a constant signal is stored at its ends and once in the longest time', () => {
    const { time } = archive(0, new Float64Array(1000).fill(7), settings);
    expect([...time]).toEqual([0, 3600, 7200, 9990]);
  });

  test('without tolerance every scan is kept', () => {
    const { time } = archive(0, new Float64Array(50).fill(7), { ...settings, tolerance: 0 });
    expect(time.length).toBe(50);
  });
});
