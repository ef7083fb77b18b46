import { describe, expect, it } from 'vitest';
import reference from '../../../reference/inherent-characteristics.json' with { type: 'json' };
import { characteristicKinds } from '../data-sheet.js';
import { coefficientTolerance } from './compare-with-sheet.js';
import {
  equalPercentage,
  equalPercentageThroughZero,
  exponentialThrough,
  linear,
  modifiedParabolic,
  quickOpening,
  relativeCoefficient,
  travelForCoefficient,
} from './models.js';

interface Table {
  readonly id: string;
  readonly R?: number;
  readonly phi0?: number;
  readonly h: readonly number[];
  readonly phi: readonly number[];
  readonly percent_change_of_phi_per_1_percent_travel?: number;
}
const tables = reference.inherent as readonly Table[];

describe('published inherent characteristics (closed forms of IEC 60534-2-4 evaluated to 40 digits)', () => {
  const lawOf = (table: Table): ((h: number) => number) | null => {
    if (/^equal-percentage-R\d+$/.test(table.id)) return (h) => equalPercentage(h, table.R ?? NaN);
    if (table.id === 'linear-phi0-0.02') return (h) => linear(h, 50);
    if (table.id === 'quick-opening-square-root') return (h) => quickOpening(h, 2);
    return null;
  };
  const known = tables.filter((table) => lawOf(table) !== null);

  it('covers four equal-percentage laws, the linear one with its foot, and the square root', () => {
    expect(known.map((t) => t.id)).toHaveLength(6);
  });

  it.each(known.map((t) => [t.id, t] as const))('%s is met to rounding', (_, table) => {
    const law = lawOf(table);
    table.h.forEach((h, i) => expect(law?.(h)).toBeCloseTo(table.phi[i] ?? NaN, 13));
  });

  it.each(known.filter((t) => t.percent_change_of_phi_per_1_percent_travel).map((t) => [t.id, t] as const))(
    '%s has its per-cent step',
    (_, table) => {
      const two = [20, 80].map((travel) => ({
        travel,
        coefficient: equalPercentage(travel / 100, table.R ?? NaN),
      }));
      const exponential = exponentialThrough(two[0] as (typeof two)[0], two[1] as (typeof two)[0]);
      expect(exponential.percentStep).toBeCloseTo(
        table.percent_change_of_phi_per_1_percent_travel ?? NaN,
        10,
      );
    },
  );
});

describe('two-point exponential (methods.md §12.5)', () => {
  const found = exponentialThrough({ travel: 20, coefficient: 5 }, { travel: 80, coefficient: 40 });

  it('gives κ, per-cent step, foot, rated coefficient and rangeability of (20 %, 5) and (80 %, 40)', () => {
    expect(found.kappa).toBeCloseTo(0.03465736, 8);
    expect(found.percentStep).toBeCloseTo(3.52649, 5);
    expect(found.A).toBeCloseTo(2.5, 10);
    expect(found.ratedCoefficient).toBeCloseTo(80, 10);
    expect(found.rangeability).toBeCloseTo(32, 10);
  });

  it('knows nothing from a coefficient of zero or two points at one travel', () => {
    expect(
      exponentialThrough({ travel: 0, coefficient: 0 }, { travel: 80, coefficient: 40 }).kappa,
    ).toBeNaN();
    expect(exponentialThrough({ travel: 5, coefficient: 1 }, { travel: 5, coefficient: 2 }).kappa).toBeNaN();
  });

  it('keeps a falling curve falling, for the caller to refuse', () => {
    expect(
      exponentialThrough({ travel: 20, coefficient: 40 }, { travel: 80, coefficient: 5 }).kappa,
    ).toBeLessThan(0);
  });
});

describe('laws', () => {
  it('open fully at full travel', () => {
    for (const kind of characteristicKinds) expect(relativeCoefficient(kind, 1, null)).toBeCloseTo(1, 14);
    expect(equalPercentageThroughZero(1, 30)).toBeCloseTo(1, 14);
  });

  it('pass through zero where they are said to', () => {
    expect(equalPercentageThroughZero(0, 30)).toBe(0);
    expect(modifiedParabolic(0)).toBe(0);
    expect(quickOpening(0, 2)).toBe(0);
  });

  it('are unknown outside 0 to 1 of travel', () => {
    for (const kind of characteristicKinds) {
      expect(relativeCoefficient(kind, -0.01, null)).toBeNaN();
      expect(relativeCoefficient(kind, 1.01, null)).toBeNaN();
    }
  });

  it('are undone by their inverse', () => {
    for (const kind of characteristicKinds)
      for (const h of [0.05, 0.2, 0.5, 0.77, 1])
        expect(travelForCoefficient(kind, relativeCoefficient(kind, h, null), null)).toBeCloseTo(h, 12);
  });

  it('have no travel for a coefficient they do not reach', () => {
    expect(travelForCoefficient('equal percentage', 0.001, 50)).toBeNaN();
    expect(travelForCoefficient('linear', 1.2, null)).toBeNaN();
  });
});

describe('tolerance of a stated coefficient', () => {
  it('is that of IEC 60534-2-4 (formula from memory; values of methods.md §12.5)', () => {
    const expected: [number, number][] = [
      [1, 10],
      [0.5, 11.49],
      [0.136, 14.9],
      [0.1, 15.85],
      [0.02, 21.87],
    ];
    for (const [phi, percent] of expected) expect(coefficientTolerance(phi)).toBeCloseTo(percent, 2);
  });

  it('agrees with the reference evaluation of the deviation limit to rounding', () => {
    const limit = reference.definitions.find((d) => d.id === 'deviation-limit') as {
      values: { phi: number; allowed_percent: number }[];
    };
    for (const { phi, allowed_percent } of limit.values)
      expect(coefficientTolerance(phi)).toBeCloseTo(allowed_percent, 12);
  });
});
