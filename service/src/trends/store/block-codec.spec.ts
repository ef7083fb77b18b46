import { type Series } from '@tailrace/shared/core/series';
import fc from 'fast-check';
import { decodeBlock, encodeBlock } from './block-codec.js';

const aSeries = (time: number[], value: number[], good: number[]): Series => ({
  time: Float64Array.from(time),
  value: Float64Array.from(value),
  good: Uint8Array.from(good),
});

/** The same bits, NaN and −0 told apart. */
function expectSame(a: Series, b: Series): void {
  expect(b.good).toEqual(a.good);
  const bits = (column: Float64Array) =>
    [...column].map((x) => (Number.isNaN(x) ? 'NaN' : Object.is(x, -0) ? '-0' : x));
  expect(bits(b.time)).toEqual(bits(a.time));
  expect(bits(b.value)).toEqual(bits(a.value));
}

const column = (value: fc.Arbitrary<number>) =>
  fc.array(fc.tuple(fc.integer({ min: 1, max: 86_400_000 }), value, fc.integer({ min: 0, max: 1 })), {
    minLength: 1,
    maxLength: 300,
  });

const build = (rows: [number, number, number][], divisor: number): Series => {
  let ms = 1_700_000_000_000;
  return aSeries(
    rows.map(([step]) => (ms += step) / divisor),
    rows.map(([, value]) => value),
    rows.map(([, , good]) => good),
  );
};

describe('a block of samples', () => {
  it.each([
    ['decimal text', fc.integer({ min: -10_000_000, max: 10_000_000 }).map((i) => i / 1000)],
    ['any double, NaN, infinities and −0 among them', fc.double()],
    ['whole numbers to the edge of what a double holds', fc.maxSafeInteger()],
    [
      'decimals with missing values',
      fc.oneof(
        fc.constant(NaN),
        fc.integer().map((i) => i / 100),
      ),
    ],
  ])('comes back to the bit: %s', (_, value) => {
    fc.assert(
      fc.property(column(value), (rows) => {
        const series = build(rows, 1000);
        expectSame(series, decodeBlock(encodeBlock(series), series.time.length));
      }),
    );
  });

  it('keeps times finer than a millisecond', () => {
    const series = build(
      [
        [1, 5, 1],
        [2, 6, 0],
        [3, 7, 1],
      ],
      1024.7,
    );
    expectSame(series, decodeBlock(encodeBlock(series), 3));
  });

  it('takes under two and a half bytes a sample for ten-second data with three decimals', () => {
    const n = 4096;
    const series = aSeries(
      Array.from({ length: n }, (_, i) => 1_700_000_000 + 10 * i),
      Array.from(
        { length: n },
        (_, i) => Math.round(50_000 + 800 * Math.sin(i / 40) + 60 * Math.sin(i * 1.7)) / 1000,
      ),
      Array.from({ length: n }, () => 1),
    );
    expect(encodeBlock(series).length / n).toBeLessThan(2.5);
  });
});
