import { describe, expect, it } from 'vitest';
import { dailyMovement } from './daily-movement.js';
import { wayOf, zigZag } from './zig-zag.js';

const all = (n: number) => new Uint8Array(n).fill(1);

describe('the zig-zag of a signal', () => {
  it('dates a turn at the furthest point, once the signal has come back by the threshold', () => {
    const x = Float64Array.of(50, 52, 53, 52.6, 53.4, 52.2, 50, 50.5, 51.5);
    const legs = zigZag(x, all(x.length), 1);
    expect([...legs.from]).toEqual([0, 4, 6]);
    expect([...legs.to]).toEqual([4, 6, 8]);
    expect([...legs.direction]).toEqual([1, -1, 1]);
    expect([...legs.afterReversal]).toEqual([0, 1, 1]);
    expect(wayOf(legs, x)).toBeCloseTo(3.4 + 3.4 + 1.5, 12);
  });

  it('counts no way and no turn for noise below the threshold', () => {
    const x = Float64Array.from({ length: 200 }, (_, i) => 50 + 0.4 * (i % 2));
    expect(zigZag(x, all(200), 0.5).count).toBe(0);
  });

  it('never joins what lies on both sides of a gap', () => {
    const x = Float64Array.of(50, 53, NaN, 40, 37);
    const legs = zigZag(x, all(5), 1);
    expect(legs.count).toBe(2);
    expect([...legs.afterReversal]).toEqual([0, 0]);
    expect(wayOf(legs, x)).toBe(6);
  });

  it('turns every direction round when the travel is mirrored, and keeps the way', () => {
    const x = Float64Array.from({ length: 500 }, (_, i) => 50 + 10 * Math.sin(i / 9) + 3 * Math.sin(i / 2));
    const up = zigZag(x, all(500), 1);
    const mirrored = x.map((v) => 100 - v);
    const down = zigZag(mirrored, all(500), 1);
    expect([...down.direction]).toEqual([...up.direction].map((d) => -d));
    expect(wayOf(down, mirrored)).toBeCloseTo(wayOf(up, x), 9);
  });
});

describe('movement by day', () => {
  it('gives reversals and way per 24 h in service, not per day of the calendar', () => {
    const n = 2 * 8_640;
    const x = Float64Array.from({ length: n }, (_, i) => 50 + 5 * Math.sin((2 * Math.PI * i) / 360));
    const usable = all(n).fill(0, n / 2);
    const moved = dailyMovement(zigZag(x, usable, 1), x, usable, { start: 0, step: 10, count: n });
    expect(moved.reversalsPerDay).toBeCloseTo(48, -1);
    expect(moved.travelPerDay).toBeCloseTo(48 * 10, -2);
    expect(moved.perDay).toHaveLength(2);
    expect(moved.perDay[1]).toEqual({ day: 86_400, reversals: 0, travel: 0 });
  });
});
