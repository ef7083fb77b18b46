import { describe, expect, it } from 'vitest';
import { aSheet } from '../sample-record.js';
import { specifiedCurve } from './specified-curve.js';

describe('the curve a sheet specifies', () => {
  it('is absent where the sheet names no characteristic', () => {
    expect(specifiedCurve(aSheet({ characteristic: null }))).toBeNull();
  });

  it('uses the sheet’s rangeability', () => {
    expect(specifiedCurve(aSheet({ rangeability: 30 }))?.(0.5)).toBeCloseTo(1 / Math.sqrt(30), 12);
  });

  it('falls back on R 50 where the rangeability is missing or senseless', () => {
    expect(specifiedCurve(aSheet({ rangeability: null }))?.(0)).toBeCloseTo(0.02, 12);
    expect(specifiedCurve(aSheet({ rangeability: 0.5 }))?.(0)).toBeCloseTo(0.02, 12);
  });

  const table = [
    { travel: 0, coefficient: 0 },
    { travel: 10, coefficient: 2 },
    { travel: 50, coefficient: 10 },
    { travel: 100, coefficient: 50 },
  ];

  it('meets the rows of a table and rises between them', () => {
    const curve = specifiedCurve(aSheet({ characteristic: 'table', table }));
    for (const row of table.slice(1)) expect(curve?.(row.travel / 100)).toBeCloseTo(row.coefficient / 50, 12);
    let last = 0;
    for (let h = 0.01; h <= 1; h += 0.01) {
      const phi = curve?.(h) ?? NaN;
      expect(phi).toBeGreaterThanOrEqual(last);
      last = phi;
    }
  });

  it('joins a row of zero by a straight line in C', () => {
    const curve = specifiedCurve(aSheet({ characteristic: 'table', table }));
    expect(curve?.(0.05)).toBeCloseTo(1 / 50, 12);
  });

  it('refuses a table without two positive rows', () => {
    expect(specifiedCurve(aSheet({ characteristic: 'table', table: table.slice(0, 2) }))).toBeNull();
    expect(specifiedCurve(aSheet({ characteristic: 'table', table: null }))).toBeNull();
  });

  it('takes rows in any order and the first of two at one travel', () => {
    const shuffled = [table[3], table[1], table[2], { travel: 50, coefficient: 99 }].filter(
      (r) => r !== undefined,
    );
    expect(specifiedCurve(aSheet({ characteristic: 'table', table: shuffled }))?.(0.5)).toBeCloseTo(0.2, 12);
  });
});
