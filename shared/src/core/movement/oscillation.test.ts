import { describe, expect, it } from 'vitest';
import { type Oscillation } from '../assessment.js';
import { defaultLimits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { loopSample } from './loop-sample.js';
import { oscillationOf } from './oscillation.js';

interface Course {
  readonly days: number;
  readonly scan?: number;
  readonly period?: number;
  readonly amplitude?: number;
  /** mean time between set-point steps of up to ±20 %, s */
  readonly stepEvery?: number;
  /** standard deviation of a wandering of two hours */
  readonly wander?: number;
  readonly daily?: number;
  /** oscillates only in this share of the record, from its start */
  readonly part?: number;
  readonly seed?: number;
}

/** A travel made of its parts: oscillation, steps, wandering, daily course, noise. */
function aCourse(course: Course): Prepared {
  const { days, scan = 10, period = 600, amplitude = 0, stepEvery = 1e12, wander = 0.5 } = course;
  const { daily = 0, part = 1, seed = 1 } = course;
  const random = seededRandom(seed);
  const normal = () => random() + random() + random() + random() - 2;
  const count = Math.floor((days * 86_400) / scan);
  const keep = Math.exp(-scan / 7_200);
  let level = 50;
  let wandering = 0;
  const travel = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const t = i * scan;
    if (random() < scan / stepEvery) level = 30 + 40 * random();
    wandering = keep * wandering + wander * Math.sqrt(3 * (1 - keep * keep)) * normal();
    const swing = t < part * days * 86_400 ? amplitude * Math.sin((2 * Math.PI * t) / period + 1) : 0;
    const load = daily * Math.max(-1, Math.min(1, 2.5 * Math.sin((2 * Math.PI * t) / 86_400)));
    travel[i] = level + wandering + swing + load + 0.05 * normal();
  }
  const base = loopSample({ days: 0.02, scan });
  const state = new Uint8Array(count).fill(valveState.inService);
  const none = {
    flow: null,
    upstreamPressure: null,
    downstreamPressure: null,
    setPoint: null,
    processValue: null,
  };
  return { ...base, ...none, count, travel, position: travel, demand: travel, state };
}

const look = (prepared: Prepared, sticking = false) =>
  oscillationOf(prepared, new Uint8Array(prepared.count).fill(1), sticking, defaultLimits);
function found(prepared: Prepared): Oscillation {
  const oscillation = look(prepared);
  if (oscillation === null || 'reason' in oscillation) throw new Error('no oscillation');
  return oscillation;
}

describe('an oscillation of the travel', () => {
  it.each([
    [60, 3],
    [75, 3],
    [120, 3],
    [300, 3],
    [600, 5],
    [1_800, 7],
    [3_600, 14],
    [7_200, 30],
    [14_400, 30],
    [21_600, 30],
  ])(
    'of %d s is found with its period within a twentieth and its amplitude between set-point steps',
    (period, days) => {
      for (const seed of [1, 2, 3]) {
        const oscillation = found(aCourse({ days, period, amplitude: 1.5, stepEvery: 10_800, seed }));
        expect(oscillation.share).toBeGreaterThan(0.5);
        expect(Math.abs(oscillation.period / period - 1)).toBeLessThan(0.05);
        expect(oscillation.amplitude).toBeGreaterThan(1);
        expect(oscillation.amplitude).toBeLessThan(2);
      }
    },
  );

  it('is found at the pace of the record: 12 s in twenty minutes at 1 s, 18 min in two days at 180 s', () => {
    expect(found(aCourse({ days: 1 / 72, scan: 1, period: 12, amplitude: 2 })).period).toBeCloseTo(12, 0);
    const slow = found(aCourse({ days: 2, scan: 180, period: 1_080, amplitude: 2 }));
    expect(Math.abs(slow.period / 1_080 - 1)).toBeLessThan(0.05);
  });

  it('that comes in one third of the time is found in about a third of the blocks', () => {
    const { share } = found(aCourse({ days: 12, period: 400, amplitude: 3, part: 1 / 3 }));
    expect(share).toBeGreaterThan(0.28);
    expect(share).toBeLessThan(0.4);
  });
});

describe('what is no oscillation', () => {
  it.each([
    { days: 30, stepEvery: 10_800, wander: 3 },
    { days: 30, stepEvery: 1_800, wander: 1 },
    { days: 30, wander: 5 },
    { days: 30, daily: 15, wander: 0.5 },
    { days: 30, daily: 20, wander: 2, stepEvery: 20_000 },
  ])('steps, wandering and the daily course of the load are not called one: %o', (course) => {
    for (const seed of [1, 2, 3, 4]) {
      const oscillation = look(aCourse({ ...course, seed }));
      if (oscillation === null) continue;
      expect('share' in oscillation && oscillation.share).toBeLessThan(0.2);
    }
  });

  it('a period of less than five scans is not named', () => {
    expect(look(aCourse({ days: 3, scan: 10, period: 25, amplitude: 3 }))).toBeNull();
  });

  it('a record too short for thirty of its shortest cycles is refused', () => {
    expect(look(aCourse({ days: 0.01, scan: 10, period: 60, amplitude: 3 }))).toMatchObject({
      reason: 'record-too-short',
    });
  });
});

describe('whose oscillation it is', () => {
  const swinging = () => aCourse({ days: 4, period: 600, amplitude: 3 });
  const wave = (prepared: Prepared, size: number) =>
    Float64Array.from({ length: prepared.count }, (_, i) => 40 + size * Math.sin((2 * Math.PI * i) / 60));

  it('comes from outside where the set point swings with it', () => {
    const prepared = swinging();
    const driven = { ...prepared, setPoint: wave(prepared, 4), processValue: wave(prepared, 5) };
    expect(look(driven)).toMatchObject({ cause: 'outside' });
    const still = { ...driven, setPoint: new Float64Array(prepared.count).fill(40) };
    expect(look(still)).toMatchObject({ cause: 'not decided' });
  });

  it('is the line’s where demand opposes the pressure drop and the flow does not follow the travel', () => {
    const prepared = swinging();
    const steady = new Float64Array(prepared.count).fill(200);
    const against = prepared.travel.map((x) => 500 - 10 * (x - 50));
    const lined = {
      ...prepared,
      upstreamPressure: against,
      downstreamPressure: steady,
      flow: wave(prepared, -1),
    };
    expect(look(lined)).toMatchObject({ cause: 'line' });
    const led = { ...lined, flow: prepared.travel.slice() };
    expect(look(led)).toMatchObject({ cause: 'not decided' });
  });

  it('is the valve’s where it sticks', () => {
    expect(look(swinging(), true)).toMatchObject({ cause: 'valve' });
  });

  it('is the loop’s where the travel rests in manual', () => {
    const prepared = swinging();
    const half = prepared.count >> 1;
    const travel = prepared.travel.slice();
    travel.fill(50, half);
    const mode = new Float64Array(prepared.count).fill(1).fill(0, half);
    const state = prepared.state.slice();
    for (let i = half; i < prepared.count; i++) state[i] = valveState.inService | valveState.manual;
    const usable = new Uint8Array(prepared.count).fill(1).fill(0, half);
    const held = { ...prepared, travel, position: travel, demand: travel, mode, state };
    expect(oscillationOf(held, usable, false, defaultLimits)).toMatchObject({ cause: 'loop' });
  });
});
