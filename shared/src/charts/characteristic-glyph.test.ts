import { describe, expect, test } from 'vitest';
import { characteristicGlyph } from './characteristic-glyph.js';

const numbers = (path: string) => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
const curve = (...travels: number[]) => travels.map((travel) => ({ travel, value: travel / 100 }));

describe('the characteristic glyph', () => {
  test('draws as found only over the travel visited', () => {
    const { asFound, specified } = characteristicGlyph(
      { basis: 'inherent', specified: curve(0, 50, 100), asFound: curve(40, 60) },
      40,
    );
    expect(numbers(specified)).toEqual([2.5, 37.5, 20, 20, 37.5, 2.5]);
    expect(numbers(asFound)).toEqual([16.5, 23.5, 23.5, 16.5]);
  });

  test('a single place is a dot, not a line', () => {
    const { asFound, dot } = characteristicGlyph(
      { basis: 'inherent', specified: [], asFound: curve(50) },
      40,
    );
    expect(asFound).toBe('');
    expect(dot).toEqual({ x: 20, y: 20 });
  });

  test('nothing known draws nothing, and what is not a number is left out', () => {
    expect(characteristicGlyph(null, 40)).toMatchObject({ specified: '', asFound: '', dot: null });
    const odd = { travel: 50, value: NaN };
    const glyph = characteristicGlyph(
      { basis: 'inherent', specified: [odd], asFound: [odd, ...curve(10, 20)] },
      40,
    );
    expect(JSON.stringify(glyph)).not.toMatch(/NaN/);
    expect(glyph.asFound).not.toBe('');
  });
});
