import { expect, test } from 'vitest';
import { assess } from '../core/assess.js';
import { aSheet } from '../core/sample-record.js';
import { aLoop } from './a-loop.js';
import { simulate } from './simulate.js';

const plain = aLoop();

/** A controller that answers a noisy meter, seen every ten seconds; the plug follows, play apart. */
function splitOf(play: number, meterNoise: number) {
  const loop = aLoop({
    days: 5,
    meterNoise,
    valve: { ...plain.valve, play },
    historian: { ...plain.historian, scan: 10, tolerance: 0.0015 },
  });
  const { history, flowSpan } = simulate(loop);
  const dataSheet = aSheet({ rangeability: 40, ratedCoefficient: 50, flowSpan });
  const { movement, findings } = assess({ tag: 'FV-1', dataSheet }, history, {
    from: loop.start,
    to: loop.start + loop.days * 86_400,
  });
  const split = movement?.positionToFlow;
  return {
    deadBand: split && 'deadBand' in split ? split.deadBand : NaN,
    kinds: findings.map(({ kind }) => kind),
  };
}

// methods.md §12.3 holds healthy valves with 2 % of noise below 0.54 % of travel; this loop answers noise harder
test('noise a controller answers is not taken for play between stem and flow', () => {
  const { deadBand, kinds } = splitOf(0, 0.015);
  expect(deadBand).toBeLessThan(1);
  expect(kinds).not.toContain('Lost motion');
});

test('play behind usual noise is found', () => {
  const { deadBand, kinds } = splitOf(4, 0.004);
  expect(Math.abs(deadBand - 4)).toBeLessThan(0.8);
  expect(kinds).toContain('Lost motion');
});
