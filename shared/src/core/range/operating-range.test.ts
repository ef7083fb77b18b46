import { describe, expect, it } from 'vitest';
import { type DataSheet } from '../data-sheet.js';
import { defaultLimits } from '../limits.js';
import { prepare } from '../preparation/prepare.js';
import { aSeries, aSheet, aStart, daysFromStart } from '../sample-record.js';
import { type History } from '../series.js';
import { operatingRange } from './operating-range.js';

/** Travel held at each value for hours, in turn, one sample a minute; or stored only when it changes. */
function held(parts: readonly (readonly [travel: number, hours: number])[]): History {
  const travel = parts.flatMap(([x, hours]) =>
    Array.from({ length: hours * 60 }, (_, i) => x + 0.01 * (i % 2)),
  );
  const time = travel.map((_, i) => aStart + 60 * i);
  return { position: aSeries(time, travel), demand: aSeries(time, travel), flow: aSeries(time, travel) };
}

function rangeOf(history: History, days: number, sheet: DataSheet = aSheet()) {
  const prepared = prepare(history, sheet, daysFromStart(days), defaultLimits);
  if ('judged' in prepared) throw new Error(prepared.reason);
  return operatingRange(prepared, sheet, null, defaultLimits);
}

describe('operating range', () => {
  it('weights by time, not by stored rows (methods.md §12.5)', () => {
    // 95 % for 600 s, then 50 % for 3 000 s, in four stored rows
    const position = aSeries([aStart, aStart + 599.9, aStart + 600, aStart + 3_600], [95, 95, 50, 50]);
    const range = rangeOf({ position }, 1);
    expect(range?.aboveHigh).toBeCloseTo(0.1667, 3);
  });

  it('gives percentiles of travel within a fiftieth of a per cent', () => {
    const range = rangeOf(held(Array.from({ length: 100 }, (_, i) => [i + 0.5, 1] as const).slice(3, 98)), 5);
    expect(Math.abs((range?.p50 ?? NaN) - 50.5)).toBeLessThan(0.03);
    expect(range?.ridge).toHaveLength(100);
    expect(range?.ridge.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 9);
  });

  it.each([
    ['oversized', [[12, 90]] as const],
    [
      'oversized',
      [
        [8, 20],
        [25, 70],
      ] as const,
    ],
    [
      'undersized',
      [
        [60, 80],
        [95, 10],
      ] as const,
    ],
    [
      'rangeability not enough',
      [
        [5, 30],
        [95, 60],
      ] as const,
    ],
    [
      'well sized',
      [
        [40, 50],
        [60, 40],
      ] as const,
    ],
    [
      'acceptable',
      [
        [40, 50],
        [85, 40],
      ] as const,
    ],
  ])('calls a valve %s', (verdict, parts) => {
    expect(rangeOf(held(parts), 4)?.verdict).toBe(verdict);
  });

  it('has no verdict below three running days, only numbers', () => {
    const range = rangeOf(held([[12, 60]]), 3);
    expect(range?.judged).toBe(false);
    expect(range?.verdict).toBeNull();
    expect(range?.p50).toBeCloseTo(12, 1);
  });

  it('uses the band of the sheet before that of the style', () => {
    expect(rangeOf(held([[20, 90]]), 4, aSheet({ designBand: { low: 30, high: 60 } }))?.belowLow).toBe(1);
    expect(rangeOf(held([[15, 90]]), 4, aSheet({ style: 'butterfly' }))?.band).toEqual({ low: 20, high: 70 });
  });

  it('counts a valve at its seat that still passes, and one wide open, as pinned', () => {
    const range = rangeOf(
      {
        ...held([
          [50, 60],
          [0.3, 20],
          [99.6, 20],
        ]),
        flow: held([
          [50, 60],
          [20, 20],
          [99, 20],
        ]).flow,
      },
      5,
    );
    expect(range?.atSeat).toBeCloseTo(0.2, 1);
    expect(range?.atOpen).toBeCloseTo(0.2, 1);
    expect(range?.pinned).toBeCloseTo(0.4, 1);
  });

  it('does not call a valve held open by hand pinned', () => {
    const history = held([
      [50, 40],
      [99.6, 40],
    ]);
    const mode = aSeries([aStart, aStart + 40 * 3_600], [1, 0]);
    expect(rangeOf({ ...history, mode }, 4)?.pinned).toBe(0);
  });

  it('counts time wide open with the set point not reached as short', () => {
    const history = held([
      [50, 50],
      [98, 50],
    ]);
    const time = [aStart, aStart + 50 * 3_600];
    const setPoint = aSeries(time, [50, 105]);
    const range = rangeOf({ ...history, setPoint, processValue: history.flow }, 5);
    expect(range?.short).toBeCloseTo(0.5, 1);
    expect(rangeOf(history, 5)?.short).toBeNull();
  });

  it('leaves the minutes after a start out, and gives the verdict without the days after it too', () => {
    const range = rangeOf(
      held([
        [0, 10],
        [5, 30],
        [50, 100],
      ]),
      6,
    );
    expect(range?.belowLow).toBeGreaterThan(0.1);
    expect(range?.verdict).toBe('oversized');
    expect(range?.verdictAfterStarts).toBe('well sized');
  });

  it('does not exist for a valve that was shut throughout', () => {
    expect(rangeOf(held([[0, 90]]), 4)).toBeNull();
  });
});
