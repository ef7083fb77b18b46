import { describe, expect, test } from 'vitest';
import { assess } from '../core/assess.js';
import { aSheet } from '../core/sample-record.js';
import { aLoop } from './a-loop.js';
import { type Loop } from './loop-settings.js';
import { simulate } from './simulate.js';

/** The sheet of aLoop's valve: what was bought is what is there. */
const sheetOf = (loop: Loop, flowSpan: number) =>
  aSheet({
    characteristic: loop.valve.kind,
    rangeability: loop.valve.parameter,
    ratedCoefficient: loop.valve.ratedCoefficient,
    flowSpan,
  });

function assessed(loop: Loop, span?: { from: number; to: number; since?: number }) {
  const { history, flowSpan, truth } = simulate(loop);
  const valve = { tag: 'FV-1', dataSheet: sheetOf(loop, flowSpan) };
  const whole = { from: loop.start, to: loop.start + loop.days * 86_400 };
  return { assessment: assess(valve, history, span ?? whole), truth };
}

describe('an assessed loop of known truth', () => {
  // Bars of methods.md §12.4: capacity ratio within 3 %, travel percentiles within 1 % travel.
  test.each([1, 2, 3])('gives back the capacity and the travel of a healthy valve, seed %d', (seed) => {
    const { assessment, truth } = assessed(aLoop({ seed, days: 10 }));
    expect(assessment.findings.map(({ kind }) => kind)).toEqual([]);
    expect(Math.abs((assessment.deviation?.capacityRatio?.value ?? NaN) - 1)).toBeLessThan(0.03);
    expect(Math.abs((assessment.range?.p5 ?? NaN) - truth.travel.p5)).toBeLessThan(1);
    expect(Math.abs((assessment.range?.p95 ?? NaN) - truth.travel.p95)).toBeLessThan(1);
    expect(assessment.characteristic?.kind).toBe('equal percentage');
  });

  test('follows drift back beyond its window when asked, and keeps the rest to the window', () => {
    const plain = aLoop();
    const loop = aLoop({
      days: 30,
      valve: { ...plain.valve, step: { at: 10 * 86_400, factor: 0.9 } },
    });
    const window = { from: loop.start + 20 * 86_400, to: loop.start + 30 * 86_400 };
    const short = assessed(loop, window).assessment;
    const long = assessed(loop, { ...window, since: loop.start }).assessment;
    expect(long.window).toEqual(short.window);
    expect(short.drift?.steps ?? []).toEqual([]);
    const [step] = long.drift?.steps ?? [];
    expect(step?.change).toBeCloseTo(Math.log(0.9), 1);
    expect(Math.abs((step?.at ?? 0) - loop.start - 10 * 86_400)).toBeLessThan(86_400);
  });
});
