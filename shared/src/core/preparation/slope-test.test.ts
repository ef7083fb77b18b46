import { describe, expect, it } from 'vitest';
import { seededRandom } from '../statistics/seeded-random.js';
import { slopeTest } from './slope-test.js';

const time = Float64Array.from({ length: 60 }, (_, i) => 5 * i);
const noise = (seed: number) => {
  const random = seededRandom(seed);
  return Float64Array.from(time, () => random() + random() - 1);
};

describe('slope test of a window', () => {
  it('calls white noise steady about nineteen times in twenty', () => {
    let steady = 0;
    for (let seed = 0; seed < 400; seed++) if (slopeTest(time, noise(seed), 10).steady) steady++;
    expect(steady / 400).toBeGreaterThan(0.9);
  });

  it('is not steady on a ramp that matters, however slow', () => {
    const ramp = noise(1).map((v, i) => v + 0.1 * i);
    expect(slopeTest(time, ramp, 2).steady).toBe(false);
    expect(slopeTest(time, ramp, 2).change).toBeCloseTo(5.9, 0);
  });

  it('counts correlated samples as fewer', () => {
    const white = noise(3);
    const slow = white.slice();
    for (let i = 1; i < slow.length; i++) slow[i] = 0.9 * (slow[i - 1] as number) + (white[i] as number);
    const apart = noise(4).map((v, i) => v + 0.02 * i);
    const together = slow.map((v, i) => v + 0.02 * i);
    expect(Math.abs(slopeTest(time, together, 9).t)).toBeLessThan(Math.abs(slopeTest(time, apart, 9).t));
  });

  it('says nothing of three samples', () => {
    expect(slopeTest(time.slice(0, 3), noise(1).slice(0, 3), 1).steady).toBe(false);
  });
});
