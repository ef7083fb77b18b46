import { describe, expect, it } from 'vitest';
import reference from '../../reference/seat-leakage.json' with { type: 'json' };
import { defaultLimits } from './limits.js';
import { type LeakageClass, leakageClasses, leakageShare } from './leakage-class.js';
import { CvPerKv } from './units/unit-table.js';

describe('seat leakage classes of ANSI/FCI 70-2 (shared/reference/seat-leakage.json)', () => {
  it('have the published shares of rated capacity, and none for the classes given by bore', () => {
    for (const name of leakageClasses) {
      const published = reference.classes.find((c) => c.id === name);
      expect(leakageShare(name)).toBe(published?.max_fraction_of_rated_capacity ?? null);
    }
  });

  it('give the leaks of the worked cases in Cv, Kv and gal/min of water', () => {
    const cases = reference.cases.filter((c) => c.rated_Cv !== undefined);
    expect(cases).toHaveLength(3);
    for (const { rated_Cv = NaN, dP_psi = NaN, leakage_class, expected } of cases) {
      const leak = rated_Cv * (leakageShare(leakage_class as LeakageClass) ?? NaN);
      expect(leak).toBeCloseTo(expected.leak_Cv ?? NaN, 12);
      expect(leak * Math.sqrt(dP_psi)).toBeCloseTo(expected.leak_gpm ?? NaN, 9);
      // the standard rounds 1.1561 to 1.156
      expect(Math.abs(leak / CvPerKv / (expected.leak_Kv ?? NaN) - 1)).toBeLessThan(1e-4);
    }
  });

  it('start where a passing valve is raised: class II is the raise threshold', () => {
    expect(defaultLimits.findings.kinds['Passing when shut'].raise).toBe(leakageShare('II'));
  });
});
