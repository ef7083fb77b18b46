import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dimensionOf, lacksState, unitOf } from './unit-of.js';
import { columnToCore, fromCore, toCore, type Unit } from './unit.js';
import { unitTable } from './unit-table.js';

const unit = (text: string) => unitOf(text) as Unit;

describe('units of the trade', () => {
  // NIST Special Publication 811 (2008), Appendix B, for the factors; the pairs are worked from it (from memory)
  const pairs: [number, string, number][] = [
    [1, 'm3/h', 1],
    [1, 'm³/h', 1],
    [100, 'l/min', 6],
    [1, 'gpm', 0.2271247],
    [1000, 'bbl/d', 6.624479],
    [1, 't/h', 1000],
    [1, 'lb/h', 0.45359237],
    [2, 'kg/s', 7200],
    [1, 'Nm3/h', 1],
    [1, 'Sm3/h', 0.9479438],
    [1, 'kscmh', 947.9438],
    [1, 'scfh', 0.02679102],
    [1, 'scfm', 1.607461],
    [1, 'MMSCFD', 1116.2924],
    [2, 'bar(g)', 301.325],
    [2, 'barg', 301.325],
    [2, 'Bar a', 200],
    [500, 'mbar(g)', 151.325],
    [100, 'kPa(g)', 201.325],
    [0.5, 'MPa', 500],
    [0, 'psig', 101.325],
    [14.6959488, 'psia', 101.325],
    [1000, 'mmH2O', 9.80665],
    [1, 'kgf/cm2', 98.0665],
    [1, 'kg/cm2g', 199.3915],
    [1, 'atm', 101.325],
    [25, '°C', 298.15],
    [25, 'degC', 298.15],
    [77, '°F', 298.15],
    [300, 'K', 300],
    [1, 'g/cm3', 1000],
    [62.42796, 'lb/ft3', 1000],
    [42, '%', 42],
    [0.42, 'fraction', 42],
    [4, 'mA', 0],
    [20, '4-20 mA', 100],
    [115.6, 'Cv', 100],
  ];
  it.each(pairs)('%d %s is %d in the units of methods.md §0', (value, text, expected) => {
    expect(toCore(value, unit(text))).toBeCloseTo(
      expected,
      Math.max(0, 5 - Math.ceil(Math.log10(expected + 1))),
    );
  });

  it('counts gauge pressures from the site barometer', () => {
    expect(toCore(1, unit('barg'), { barometricPressure: 85 })).toBe(185);
    expect(fromCore(185, unit('barg'), { barometricPressure: 85 })).toBe(1);
  });

  it('reads a pressure that states neither gauge nor absolute as absolute, and says so', () => {
    for (const text of ['bar', 'psi', 'kPa', 'mmH2O'])
      expect(unitOf(text)).toMatchObject({ gauge: false, doubtful: true });
    for (const text of ['bara', 'psi(a)', 'atm', 'barg'])
      expect(unitOf(text)).toMatchObject({ doubtful: false });
  });

  it('refuses normal and standard flows without a state, and knows why', () => {
    for (const text of ['std m3/h', 'slpm', 'Standard m³/h']) {
      expect(unitOf(text)).toBeNull();
      expect(lacksState(text)).toBe(true);
    }
    expect(unitOf('m3/h (15 °C)')?.factor).toBe(unitOf('Sm3/h')?.factor);
    expect(lacksState('furlong')).toBe(false);
  });

  it('knows no unit in words that only look like one', () => {
    for (const text of ['', ' ', 'g', 'a', '(g)', 'furlong', 'm3', 'kelvin(g)', '%a', 'tag', 'constructor'])
      expect(unitOf(text), text).toBeNull();
    expect(dimensionOf('t/h')).toBe('mass flow');
  });

  it('has one meaning for every spelling', () => {
    const spellings = unitTable.flatMap((row) => row.spellings);
    expect(new Set(spellings).size).toBe(spellings.length);
    for (const row of unitTable)
      for (const text of [row.name, ...row.spellings])
        expect(unitOf(text), text).toMatchObject({ name: row.name, dimension: row.dimension });
  });

  it('comes back to the value it started from', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...unitTable),
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        (row, value) => {
          const u = unit(row.name);
          expect(fromCore(toCore(value, u), u)).toBeCloseTo(value, 6);
        },
      ),
    );
  });

  it('converts a column like its values, leaves NaN, and does not copy what is right already', () => {
    const column = Float64Array.of(1, NaN, 3);
    expect([...columnToCore(column, unit('barg'))]).toEqual([201.325, NaN, 401.325]);
    expect(columnToCore(column, unit('m3/h'))).toBe(column);
    expect([...column]).toEqual([1, NaN, 3]);
  });
});
