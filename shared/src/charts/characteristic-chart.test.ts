import { describe, expect, test } from 'vitest';
import { characteristicChart, type DrawnCharacteristic } from './characteristic-chart.js';

const size = { width: 760, height: 500 };
const numbers = (path: string) => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
const across = (path: string) => numbers(path).filter((_, i) => i % 2 === 0);
const curve = (from: number, to: number, rated: number) =>
  Array.from({ length: to - from + 1 }, (_, i) => {
    const value = rated * 50 ** ((from + i) / 100 - 1);
    return { travel: from + i, value, low: value * 0.9, high: value * 1.1 };
  });

function aCharacteristic(part: Partial<DrawnCharacteristic> = {}): DrawnCharacteristic {
  return {
    span: { from: 30, to: 60 },
    points: [30, 40, 50, 60].map((travel) => ({ travel, value: travel / 2, count: travel })),
    curve: curve(20, 70, 80),
    specified: curve(0, 100, 100),
    ...part,
  };
}
const aRidge = {
  shares: Array.from({ length: 100 }, () => 0.01),
  band: { low: 20, high: 80 },
  p5: 5,
  p50: 50,
  p95: 95,
};

describe('the characteristic chart', () => {
  test('draws the fit over the travel visited and nothing further', () => {
    const { fitted, fittedBand, plot } = characteristicChart(aCharacteristic(), null, size, 'linear');
    const x = (travel: number) => plot.left + ((plot.right - plot.left) * travel) / 100;
    expect(Math.min(...across(fitted))).toBeCloseTo(x(30), 2);
    expect(Math.max(...across(fitted))).toBeCloseTo(x(60), 2);
    expect(Math.min(...across(fittedBand))).toBeCloseTo(x(30), 2);
    expect(Math.max(...across(fittedBand))).toBeCloseTo(x(60), 2);
  });

  test('dots the fit 5 % of travel beyond and no further, though the curve goes on', () => {
    const { beyondFitted, plot } = characteristicChart(aCharacteristic(), null, size, 'linear');
    const x = (travel: number) => plot.left + ((plot.right - plot.left) * travel) / 100;
    expect(Math.min(...across(beyondFitted))).toBeCloseTo(x(25), 2);
    expect(Math.max(...across(beyondFitted))).toBeCloseTo(x(65), 2);
  });

  test('the specified curve is a straight line on a log axis where it is equal percentage', () => {
    const places = numbers(characteristicChart(aCharacteristic(), null, size, 'log').specified);
    const y = (i: number) => places[2 * i + 1] ?? NaN;
    expect(y(50)).toBeCloseTo((y(0) + y(100)) / 2, 1);
  });

  test('points grow with the number of windows behind them', () => {
    const radii = characteristicChart(aCharacteristic(), null, size, 'linear').points.map((p) => p.radius);
    expect(radii).toEqual([...radii].sort((a, b) => a - b));
    expect(radii.at(-1)).toBe(5.5);
  });

  test('the ridge shares the travel axis', () => {
    const { ridge, plot } = characteristicChart(aCharacteristic(), aRidge, size, 'linear');
    expect([ridge?.left, ridge?.right]).toEqual([plot.left, plot.right]);
  });

  test('names of percentiles that nearly meet are moved apart', () => {
    const close = { ...aRidge, p5: 97, p50: 98, p95: 99 };
    const [a, b, c] = characteristicChart(aCharacteristic(), close, size, 'linear').percentileNames;
    expect((b?.x ?? 0) - (a?.x ?? 0)).toBeGreaterThanOrEqual(54);
    expect((c?.x ?? 0) - (b?.x ?? 0)).toBeGreaterThanOrEqual(54);
    expect(c?.x).toBeLessThanOrEqual(size.width - 20);
  });

  test('names stand on opposite sides of the curves', () => {
    const { asFoundLabel, specifiedLabel, place } = characteristicChart(
      aCharacteristic(),
      null,
      size,
      'linear',
    );
    expect(asFoundLabel?.y).toBeGreaterThan(place(60, 80 * 50 ** -0.4).y);
    expect(specifiedLabel?.y).toBeLessThan(place(82, 100 * 50 ** -0.18).y);
  });

  test.each<[string, DrawnCharacteristic]>([
    ['nothing at all', { span: { from: 0, to: 0 }, points: [], curve: [], specified: [] }],
    [
      'a single point',
      aCharacteristic({
        span: { from: 40, to: 40 },
        points: [{ travel: 40, value: 9, count: 1 }],
        curve: [],
      }),
    ],
    ['zero and negative values', aCharacteristic({ points: [{ travel: 3, value: 0, count: 4 }] })],
    [
      'figures that are not finite',
      aCharacteristic({
        points: [{ travel: 40, value: NaN, count: NaN }],
        curve: [{ travel: 40, value: Infinity, low: NaN, high: NaN }],
      }),
    ],
    ['an installed basis without a specified curve', aCharacteristic({ specified: [] })],
  ])('%s never puts NaN in a path, on either axis', (_, characteristic) => {
    for (const axis of ['linear', 'log'] as const) {
      const geometry = characteristicChart(characteristic, null, size, axis);
      const paths = JSON.stringify({ ...geometry, ridge: 0, asFoundLabel: 0, specifiedLabel: 0 });
      expect(paths).not.toMatch(/NaN|null|Infinity/);
    }
  });
});
