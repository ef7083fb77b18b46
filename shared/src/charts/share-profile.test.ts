import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { profileAt, profileBetween, shareProfile, sharesOutside, smoothShares } from './share-profile.js';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

/** Area under a profile by trapezoids, in shares of time. */
function areaUnder(profile: readonly { x: number; y: number }[]): number {
  return sum(
    profile.slice(1).map((place, i) => {
      const before = profile[i] ?? place;
      return ((place.y + before.y) / 2) * (place.x - before.x);
    }),
  );
}

const anyShares = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 1, maxLength: 101 });

describe('the profile of shares of time', () => {
  test('smoothing keeps all of the time, also at the ends of travel', () => {
    fc.assert(
      fc.property(anyShares, (shares) => {
        expect(sum(smoothShares(shares))).toBeCloseTo(sum(shares), 9);
      }),
    );
  });

  test('the area drawn is the time measured', () => {
    fc.assert(
      fc.property(anyShares, (shares) => {
        expect(areaUnder(shareProfile(shares))).toBeCloseTo(sum(shares), 9);
      }),
    );
  });

  test('a valve wide open all the time stays within 5 % of the end', () => {
    const shares = Array.from({ length: 100 }, (_, i) => (i === 99 ? 1 : 0));
    const smooth = smoothShares(shares);
    expect(sum(smooth.slice(95))).toBeCloseTo(1, 12);
    expect(smooth.indexOf(Math.max(...smooth))).toBe(99);
  });

  test('cutting at the band loses nothing and adds nothing', () => {
    const profile = shareProfile(Array.from({ length: 100 }, (_, i) => (i % 7) / 300));
    const pieces = [
      profileBetween(profile, 0, 33.3),
      profileBetween(profile, 33.3, 71),
      profileBetween(profile, 71, 100),
    ];
    expect(sum(pieces.map(areaUnder))).toBeCloseTo(areaUnder(profile), 9);
  });

  test('no shares, or no time in them, give no profile', () => {
    expect(shareProfile([])).toEqual([]);
    expect(shareProfile([0, 0, NaN])).toEqual([]);
    expect(profileAt([], 50)).toBe(0);
  });

  test('time outside the band counts a bin that the band cuts by its part outside', () => {
    const even = Array.from({ length: 100 }, () => 0.01);
    const outside = sharesOutside(even, { low: 10.5, high: 90.25 });
    expect(outside.below).toBeCloseTo(0.105, 12);
    expect(outside.above).toBeCloseTo(0.0975, 12);
  });
});
