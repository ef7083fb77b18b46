import { describe, expect, it } from 'vitest';
import { type Movement } from '../assessment.js';
import { defaultLimits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { aSheet } from '../sample-record.js';
import { loopSample, type LoopSample, noWindows, stickStep } from './loop-sample.js';
import { movementOf } from './movement.js';

const moved = (prepared: Prepared): Movement =>
  movementOf(prepared, noWindows('measured'), aSheet(), defaultLimits);
const looped = (sample: LoopSample): Movement => moved(loopSample(sample));

function band(split: Movement['demandToPosition']): number {
  if ('reason' in split) throw new Error(split.reason);
  return split.deadBand;
}
function jumps(movement: Movement) {
  if ('reason' in movement.jumps) throw new Error(movement.jumps.reason);
  return movement.jumps;
}

describe('the two-parameter stick model behind these tests', () => {
  it('first moves at 53.5, to 52.5, for fS 3, fD 1 and a ramp of 0.5 a step (methods.md §12.5; He et al. 2007)', () => {
    let at = { stem: 50, left: 0 };
    let u = 50;
    while (at.stem === 50) {
      u += 0.5;
      at = stickStep(at.stem, at.left, 0.5, 3, 1);
    }
    expect(u).toBe(53.5);
    expect(at.stem).toBe(52.5);
  });
});

describe('a dead band between demand and stem', () => {
  it.each([
    [2, { days: 6, fS: 1, fD: 1 }],
    [4, { days: 6, fS: 2, fD: 2 }],
    [2, { days: 6, fS: 1, fD: 1, scan: 60 }],
    [4, { days: 20, fS: 2, fD: 2, stepEvery: 1e9 }],
  ])('of %d per cent is read within 0.3, in its own link only: %o', (truth, sample) => {
    const movement = looped(sample);
    expect(Math.abs(band(movement.demandToPosition) - truth)).toBeLessThan(0.3);
    expect(band(movement.positionToFlow)).toBeLessThan(0.6);
  });

  it('shows between demand and flow where the position is not recorded', () => {
    const movement = looped({ days: 6, fS: 2, fD: 2, withPosition: false });
    expect(Math.abs(band(movement.demandToFlow) - 4)).toBeLessThan(0.4);
    expect(movement.demandToPosition).toMatchObject({ reason: 'demand-only' });
  });

  it('makes no jumps', () => {
    expect(jumps(looped({ days: 6, fS: 2, fD: 2 })).share).toBeLessThan(0.15);
  });
});

describe('play between stem and plug', () => {
  it.each([2, 4])('of %d per cent is read within 0.2, and none between demand and stem', (play) => {
    const movement = looped({ days: 6, play });
    expect(Math.abs(band(movement.positionToFlow) - play)).toBeLessThan(0.2);
    expect(band(movement.demandToPosition)).toBeLessThan(0.6);
  });

  it('is read the same in any unit of flow, and at any date', () => {
    const loop = loopSample({ days: 5, play: 2 });
    const other = {
      ...loop,
      start: loop.start + 777_600,
      flow: (loop.flow as Float64Array).map((q) => 4.403 * q),
      flowSpan: 4.403 * loop.flowSpan,
    };
    expect(band(moved(other).positionToFlow)).toBeCloseTo(band(moved(loop).positionToFlow), 9);
  });
});

describe('a healthy loop', () => {
  it.each([
    { days: 6 },
    { days: 6, disturbance: 0.1, seed: 2 },
    { days: 6, positionNoise: 0.15, seed: 3 },
    { days: 6, stepEvery: 1_800, range: 25, seed: 4 },
    { days: 6, daily: 15, stepEvery: 1e9, seed: 5 },
    { days: 6, scan: 60, seed: 6 },
  ])('shows no dead band, no jumps, no hunting and no mismatch: %o', (sample) => {
    const movement = looped(sample);
    expect(band(movement.demandToPosition)).toBeLessThan(0.6);
    expect(band(movement.positionToFlow)).toBeLessThan(0.6);
    if ('share' in movement.jumps) expect(movement.jumps.share).toBeLessThan(0.02);
    expect(movement.oscillation).toBeNull();
    expect(movement.mismatch).toMatchObject({ characterised: false });
    if ('offset' in movement.mismatch) expect(Math.abs(movement.mismatch.offset)).toBeLessThan(0.3);
    expect(movement.travelPerDay).toBeLessThan(1_000);
  });
});

describe('a sticking stem', () => {
  it.each([
    [2, 1],
    [3, 1],
    [4, 2],
    [6, 4],
  ])('with S %d and J %d jumps by J, and S is read from its slips within a tenth', (S, J) => {
    const found = jumps(looped({ days: 6, fS: (S + J) / 2, fD: (S - J) / 2 }));
    expect(Math.abs(found.median - J)).toBeLessThan(0.1);
    expect(found.share).toBeGreaterThan(0.5);
    expect(Math.abs((found.stickBand?.value ?? NaN) - S)).toBeLessThan(0.1 * S);
  });

  it('cannot be told at a scan of 60 s, and says so', () => {
    expect(looped({ days: 3, fS: 3, fD: 1, scan: 60 }).jumps).toEqual({
      judged: false,
      reason: 'sampled-too-slowly',
      figures: { spacing: 60, needed: 10 },
    });
  });

  it('is told the same when travel is mirrored', () => {
    const loop = loopSample({ days: 4, fS: 3, fD: 1 });
    const turn = (v: Float64Array | null) => (v as Float64Array).map((x) => 100 - x);
    const mirrored = {
      ...loop,
      demand: turn(loop.demand),
      position: turn(loop.position),
      travel: turn(loop.travel),
    };
    const one = moved(loop);
    const other = moved(mirrored);
    expect(jumps(other).count).toBe(jumps(one).count);
    expect(jumps(other).median).toBeCloseTo(jumps(one).median, 6);
    expect(jumps(other).stickBand?.value).toBeCloseTo(jumps(one).stickBand?.value ?? NaN, 6);
    expect(other.reversalsPerDay).toBe(one.reversalsPerDay);
    expect(Math.abs(band(other.demandToPosition) - band(one.demandToPosition))).toBeLessThan(0.1);
  });

  it('is named as the cause where it makes the loop hunt', () => {
    expect(looped({ days: 10, fS: 5, fD: 1 }).oscillation).toMatchObject({ cause: 'valve' });
  });
});

describe('a stem that stands elsewhere than asked', () => {
  it('shows its offset within 0.1 %, with the same sign every day', () => {
    const { mismatch } = looped({ days: 5, offset: -3 });
    expect(mismatch).toMatchObject({ sameSignDays: 1, characterised: false });
    if ('offset' in mismatch) {
      expect(mismatch.offset).toBeCloseTo(3, 1);
      expect(mismatch.slope).toBeCloseTo(1, 2);
    }
  });

  it('is a characterised signal where the difference follows a curve of demand', () => {
    const loop = loopSample({ days: 5 });
    const position = (loop.position as Float64Array).map((x) => (100 * (20 ** (x / 100) - 1)) / 19);
    expect(moved({ ...loop, position, travel: position }).mismatch).toMatchObject({ characterised: true });
  });
});

describe('a record that says nothing', () => {
  it('is refused with its reason: one closing sweep, no slow samples, a valve out of service', () => {
    const count = 1_200;
    const sweep = Float64Array.from({ length: count }, (_, i) => Math.max(30, 80 - i / 60));
    const base = loopSample({ days: 1_200 / 86_400, scan: 1 });
    const closing = { ...base, demand: null, position: sweep, travel: sweep };
    expect(moved(closing).positionToFlow).toMatchObject({ reason: 'one-direction-only' });
    const fast = Float64Array.from({ length: count }, (_, i) => 50 + 20 * Math.sin(i / 20));
    expect(moved({ ...base, demand: fast, position: fast, travel: fast }).demandToPosition).toMatchObject({
      reason: 'too-few-slow-samples',
    });
    const out = moved({ ...base, state: new Uint8Array(base.count) });
    expect(out.oscillation).toMatchObject({ reason: 'valve-not-in-service' });
    expect(out.reversalsPerDay).toBe(0);
  });
});
