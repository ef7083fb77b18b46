import { describe, expect, test } from 'vitest';
import { aLoop } from './a-loop.js';
import { simulate } from './simulate.js';

describe('a simulated loop', () => {
  test('gives the same bits for the same settings', () => {
    const once = simulate(aLoop({ days: 1 }));
    const again = simulate(aLoop({ days: 1 }));
    expect(again).toEqual(once);
    expect(simulate(aLoop({ days: 1, seed: 2 }))).not.toEqual(once);
  });

  test('keeps the flow at its set point when the valve can pass it', () => {
    const { history, flowSpan } = simulate(aLoop({ days: 2 }));
    const flow = history.flow;
    const setPoint = history.setPoint;
    if (!flow || !setPoint) throw new Error('not recorded');
    let near = 0;
    for (let i = 0; i < flow.time.length; i++)
      if (Math.abs((flow.value[i] as number) - (setPoint.value[i] as number)) < 0.03 * flowSpan) near += 1;
    expect(near / flow.time.length).toBeGreaterThan(0.9);
  });

  test('works the valve in the travel its duty asks for', () => {
    const { truth } = simulate(aLoop({ days: 2, duty: { kind: 'steps', low: 30, high: 60 } }));
    expect(truth.travel.p5).toBeGreaterThan(25);
    expect(truth.travel.p95).toBeLessThan(66);
  });

  test('obeys the flow equation at every scan: Q = Kv √(ΔP/SG)', () => {
    const { history } = simulate(
      aLoop({ days: 1, meterNoise: 0, duty: { kind: 'constant demand', low: 50, high: 50 } }),
    );
    const { flow, upstreamPressure: p1, downstreamPressure: p2 } = history;
    if (!flow || !p1 || !p2) throw new Error('not recorded');
    const last = flow.time.length - 1;
    const drop = ((p1.value[last] as number) - (p2.value[last] as number)) / 100;
    // equal percentage, R 40, at half travel: Kv 50·40^−½
    expect((flow.value[last] as number) / Math.sqrt(drop)).toBeCloseTo(50 * 40 ** -0.5, 1);
  });
});
