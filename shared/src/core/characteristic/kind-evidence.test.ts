import { describe, expect, it } from 'vitest';
import { type CharacteristicKind, characteristicKinds } from '../data-sheet.js';
import { defaultLimits } from '../limits.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { kindEvidence, likeliest } from './kind-evidence.js';
import { relativeCoefficient } from './models.js';
import { type TravelBins } from './travel-bins.js';

/** Bins every 2 % of travel of a trim that departs from its law in three slow waves. */
function trim(
  kind: CharacteristicKind,
  from: number,
  to: number,
  seed: number,
  departure: number,
): TravelBins {
  const random = seededRandom(seed);
  const waves = [1, 2, 3].map((k) => ({
    k,
    size: departure * (random() + random() - 1),
    phase: 6.3 * random(),
  }));
  const count = Math.round((to - from) / 0.02) + 1;
  const h = Float64Array.from({ length: count }, (_, i) => from + 0.02 * i);
  const y = h.map((x) => {
    const away = waves.reduce((sum, w) => sum + w.size * Math.sin(8 * w.k * x + w.phase), 0);
    return Math.log(50 * relativeCoefficient(kind, x, kind === 'equal percentage' ? 40 : null)) + away;
  });
  return {
    count,
    h,
    y,
    spread: new Float64Array(count).fill(0.01),
    weight: new Float64Array(count).fill(1e4),
    windows: new Int32Array(count).fill(40),
    periods: new Int32Array(count).fill(10),
    used: new Int32Array(),
    binOf: new Int32Array(),
    totalPeriods: 10 * count,
  };
}
const evidenceOf = (bins: TravelBins) => kindEvidence(bins, defaultLimits)(bins.y);

describe('evidence for a kind', () => {
  it('adds up to one', () => {
    const total = [...evidenceOf(trim('linear', 0.3, 0.6, 1, 0.02)).values()].reduce((a, b) => a + b, 0);
    expect(total).toBeCloseTo(1, 12);
  });

  it.each(characteristicKinds)(
    'names “%s” over 40 %% of travel, whatever the trim’s own departures',
    (kind) => {
      for (let seed = 1; seed <= 20; seed++) {
        const { kind: named, probability } = likeliest(evidenceOf(trim(kind, 0.3, 0.7, seed, 0.02)));
        expect(named).toBe(kind);
        expect(probability).toBeGreaterThan(0.95);
      }
    },
  );

  it('is seldom sure, and then right, over 20 % of travel', () => {
    let sure = 0;
    let wrong = 0;
    for (const kind of characteristicKinds)
      for (let seed = 1; seed <= 25; seed++) {
        const found = likeliest(evidenceOf(trim(kind, 0.4, 0.6, seed, 0.04)));
        if (found.probability < 0.95) continue;
        sure++;
        if (found.kind !== kind) wrong++;
      }
    expect(sure).toBeLessThan(100);
    expect(wrong).toBeLessThanOrEqual(1);
  });
});
