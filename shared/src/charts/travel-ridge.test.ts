import { describe, expect, test } from 'vitest';
import { footHeight, fullShare, travelRidge, type Ridge } from './travel-ridge.js';

const box = { left: 10, right: 310, top: 2, bottom: 44 };
const numbers = (path: string) => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);

function aRidge(part: Partial<Ridge> = {}): Ridge {
  const shares = Array.from({ length: 100 }, (_, i) => (i >= 40 && i < 60 ? 0.05 : 0));
  return { shares, band: { low: 10, high: 90 }, p5: 41, p50: 50, p95: 59, ...part };
}

describe('the travel ridge', () => {
  test('puts percentiles and bracket where they are on the 0 to 100 % axis', () => {
    const ridge = travelRidge(aRidge(), box);
    expect(ridge.percentiles.map((percentile) => Math.round(percentile.x))).toEqual([133, 160, 187]);
    expect(ridge.bracket).toBe('M40.0,38V43H280.0V38');
    expect(ridge.baseline).toBe(44 - footHeight);
  });

  test('draws nothing beyond the band for a valve that kept within it', () => {
    const ridge = travelRidge(aRidge(), box);
    expect(ridge.beyond).toBe('');
    expect(ridge.hatch).toBe('');
    expect(ridge.outside).toEqual({ below: 0, above: 0 });
  });

  test('does not colour a trace of time beyond the band that would be a hair high', () => {
    const shares = Array.from({ length: 100 }, (_, i) => (i === 50 ? 0.9999 : 0.000_001));
    const ridge = travelRidge(aRidge({ shares }), box);
    expect(ridge.beyond).toBe('');
    expect(ridge.outside.below).toBeCloseTo(0.000_01, 9);
  });

  test('draws the part above the band apart, hatched, starting at the band', () => {
    const ridge = travelRidge(aRidge({ band: { low: 10, high: 50 } }), box);
    const across = numbers(ridge.beyond).filter((_, i) => i % 2 === 0);
    expect(Math.min(...across)).toBe(160);
    expect(ridge.hatch).not.toBe('');
    expect(ridge.outside.above).toBeCloseTo(0.5, 12);
    expect(ridge.outside.below).toBe(0);
  });

  test('the same share has the same height in every row', () => {
    const few = travelRidge(aRidge(), box);
    const many = travelRidge(
      aRidge({ shares: Array.from({ length: 100 }, (_, i) => (i < 20 ? 0.05 : 0)) }),
      box,
    );
    const top = (edge: readonly { y: number }[]) => Math.min(...edge.map((place) => place.y));
    expect(top(few.edge)).toBeCloseTo(top(many.edge), 9);
  });

  test('height goes with the root of the share, so a quarter of the full share is half as high', () => {
    const ridge = travelRidge(aRidge({ shares: Array.from({ length: 100 }, () => fullShare / 4) }), box);
    expect(ridge.edge[50]?.y).toBeCloseTo(ridge.baseline - (ridge.baseline - box.top) / 2, 9);
  });

  test('a peak taller than the drawing is cut at the top, and where is said', () => {
    const ridge = travelRidge(
      aRidge({ shares: Array.from({ length: 100 }, (_, i) => (i === 49 ? 1 : 0)) }),
      box,
    );
    expect(Math.min(...ridge.edge.map((place) => place.y))).toBe(box.top);
    expect(ridge.cuts).toEqual([10 + 3 * 49.5]);
    expect(travelRidge(aRidge(), box).cuts).toEqual([]);
  });

  test('a band that makes no sense marks nothing as beyond it', () => {
    for (const band of [
      { low: 80, high: 20 },
      { low: NaN, high: NaN },
    ]) {
      const ridge = travelRidge(aRidge({ band }), box);
      expect(ridge.beyond).toBe('');
      expect(ridge.bracket).not.toContain('NaN');
    }
  });

  test.each([
    ['no assessment', null],
    ['no shares', aRidge({ shares: [] })],
    ['one share', aRidge({ shares: [1] })],
    ['shares that are not numbers', aRidge({ shares: [NaN, Infinity, -1] })],
    ['percentiles that are not numbers', aRidge({ p5: NaN, p50: NaN, p95: NaN })],
  ])('%s never puts NaN in a path', (_, ridge) => {
    expect(JSON.stringify(travelRidge(ridge, box))).not.toMatch(/NaN|Infinity|null/);
  });
});
