import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Drift } from '../assessment.js';
import { defaultLimits } from '../limits.js';
import { noWindows } from '../movement/loop-sample.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { aSheet } from '../sample-record.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { driftOf } from './drift.js';

const day = 86_400;
const start = Date.UTC(2025, 0, 1) / 1_000;
const lnR = Math.log(30);

interface WindowPlan {
  readonly days: number;
  /** s between windows */
  readonly every: number;
  /** ln capacity against share of the record */
  readonly change: (share: number) => number;
  /** slow error of the meter: standard deviation in ln, and its correlation time in s */
  readonly wobble?: number;
  readonly wobbleTime?: number;
  /** travel span, 1 */
  readonly span?: number;
  readonly seed?: number;
  readonly kept?: (time: number) => boolean;
}

/** Windows of a valve under control: as its capacity falls, the controller opens it. */
function aRun(plan: WindowPlan): SteadyWindows {
  const { days, every, change, wobble = 0.006, wobbleTime = 6 * 3_600, span = 0.4, seed = 1 } = plan;
  const random = seededRandom(seed);
  const normal = () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
  const keep = Math.exp(-every / wobbleTime);
  let slow = wobble * normal();
  let duty = 0.5;
  const time: number[] = [];
  const h: number[] = [];
  const L: number[] = [];
  for (let t = every / 2; t < days * day; t += every) {
    slow = keep * slow + wobble * Math.sqrt(1 - keep * keep) * normal();
    if (random() < every / 14_400) duty = 0.5 + span * (random() - 0.5);
    if (random() < 0.3 || plan.kept?.(t) === false) continue;
    const m = change(t / (days * day));
    const travel = duty - m / lnR + 0.005 * normal();
    time.push(start + t);
    h.push(travel);
    L.push(lnR * (travel - 1) + 0.02 * Math.sin(25 * travel) + m + slow + 0.006 * normal());
  }
  return {
    ...noWindows('measured'),
    count: time.length,
    time: Float64Array.from(time),
    h: Float64Array.from(h),
    L: Float64Array.from(L),
    choked: new Uint8Array(time.length),
  };
}

const look = (windows: SteadyWindows) => driftOf(windows, aSheet(), defaultLimits);
function drifted(windows: SteadyWindows): Drift {
  const drift = look(windows);
  if ('reason' in drift) throw new Error(drift.reason);
  return drift;
}
function trend(drift: Drift) {
  if ('reason' in drift.trend) throw new Error(drift.trend.reason);
  return drift.trend;
}
const seeds = Array.from({ length: 20 }, (_, i) => 1 + 7_919 * i);

describe('a valve that wears or fouls within the year', () => {
  it.each([
    ['a gain of 10 per cent', 0.095],
    ['a loss of 10 per cent', -0.105],
  ])('%s is read without the fifth that one curve for the whole year would swallow', (_, change) => {
    const errors = seeds.slice(0, 6).map((seed) => {
      const found = trend(
        drifted(aRun({ days: 365, every: 3_600, change: (share) => change * share, seed })),
      );
      expect(found.confirmed).toBe(true);
      return found.change - change;
    });
    // a month's middle stands half a month inside the year, so a twelfth is outside the series
    const mean = errors.reduce((sum, e) => sum + e, 0) / errors.length;
    expect(Math.abs(mean + change / 24)).toBeLessThan(0.005);
  });

  it('is found at 4 per cent in at least nine of ten valves, by repeatability', () => {
    const found = seeds.filter((seed) => {
      const run = aRun({ days: 365, every: 3_600, change: (share) => 0.039 * share, seed });
      const { confirmed, change } = trend(drifted(run));
      return confirmed && change >= defaultLimits.findings.driftChange.raise;
    });
    expect(found.length).toBeGreaterThanOrEqual(18);
  });

  it('is found from three days of each month', () => {
    const run = aRun({
      days: 365,
      every: 900,
      change: (share) => -0.105 * share,
      kept: (t) => (t / day) % 30.4 < 3,
    });
    expect(drifted(run).by).toBe('month');
    expect(trend(drifted(run)).confirmed).toBe(true);
  });
});

describe('a healthy valve', () => {
  it.each([6 * 3_600, 5 * day])(
    'whose meter wobbles by 2 per cent over %d s is not said to drift or step',
    (wobbleTime) => {
      for (const seed of seeds) {
        const drift = drifted(
          aRun({ days: 365, every: 3_600, change: () => 0, wobble: 0.02, wobbleTime, seed }),
        );
        expect(trend(drift).confirmed).toBe(false);
        expect(drift.steps).toEqual([]);
      }
    },
  );

  it('does not drift or step within a month, two days or an hour either', () => {
    for (const seed of seeds) {
      for (const [days, every] of [
        [30, 900],
        [2, 540],
        [1 / 24, 6],
      ] as const) {
        const run = aRun({ days, every, change: () => 0, wobble: 0.003, seed });
        const drift = look(run);
        if ('reason' in drift) continue;
        expect(trend(drift).confirmed).toBe(false);
        expect(drift.steps).toEqual([]);
      }
    }
  });
});

describe('a step of capacity', () => {
  it.each([
    ['of −6 per cent in month 7 of a year', 365, 3_600, 0.583, -0.062, 'month'],
    ['of −12 per cent on day 12 of 30', 30, 600, 0.4, -0.128, 'day'],
    ['of +10 per cent two thirds into two days', 2, 540, 2 / 3, 0.095, 'hour'],
    ['of −8 per cent at minute 40 of an hour', 1 / 24, 6, 2 / 3, -0.083, 'minute'],
  ])('%s is found once, with its size and its time', (_, days, every, at, change, by) => {
    for (const seed of seeds.slice(0, 5)) {
      const run = aRun({ days, every, change: (share) => (share > at ? change : 0), wobble: 0.003, seed });
      const drift = drifted(run);
      expect(drift.by).toBe(by);
      expect(drift.steps).toHaveLength(1);
      expect(Math.abs((drift.steps[0]?.change ?? NaN) - change)).toBeLessThan(0.015 + 0.1 * Math.abs(change));
      expect(Math.abs((drift.steps[0]?.at ?? NaN) - start - at * days * day)).toBeLessThan(0.02 * days * day);
    }
  });

  it('is not made of a slow drift', () => {
    expect(drifted(aRun({ days: 365, every: 3_600, change: (share) => 0.15 * share })).steps).toEqual([]);
  });
});

describe('the capacity series', () => {
  const plan = { days: 300, every: 3_600, change: (share: number) => -0.08 * share };

  it('is zero over its reference period, with intervals that hold the truth', () => {
    const { series, reference } = drifted(aRun(plan));
    expect((reference.to - reference.from) / day).toBeCloseTo(60, 6);
    const before = series.filter((point) => point.at <= reference.to);
    expect(Math.abs(before.reduce((sum, point) => sum + point.change, 0))).toBeLessThan(0.005);
    for (const point of series) {
      expect(point.low).toBeLessThan(point.change);
      expect(point.high).toBeGreaterThan(point.change);
    }
  });

  it('is the same in any unit of the coefficient and at any whole number of days later', () => {
    const run = aRun({ ...plan, days: 100 });
    const other = { ...run, L: run.L.map((v) => v + 1.4821), time: run.time.map((t) => t + 70 * day) };
    const one = drifted(run);
    const two = drifted(other);
    expect(two.series.length).toBe(one.series.length);
    two.series.forEach((point, i) => expect(point.change).toBeCloseTo(one.series[i]?.change ?? NaN, 6));
  });

  it('is refused where the travel of one time is never that of another', () => {
    const run = aRun({ days: 300, every: 3_600, change: () => 0, span: 0 });
    const apart = run.time.map((t) => 0.1 + 0.07 * new Date(1_000 * t).getUTCMonth());
    expect(look({ ...run, h: apart })).toMatchObject({ reason: 'months-not-connected' });
  });

  it('is refused for too few windows', () => {
    expect(look(aRun({ days: 1, every: 7_200, change: () => 0 }))).toMatchObject({
      reason: 'too-few-windows',
    });
  });
});

describe('any windows at all', () => {
  it('give a drift or a refusal, and never throw', () => {
    const number = fc.oneof(fc.double({ noNaN: false }), fc.constantFrom(0, 0.5, 1, NaN, Infinity, 1e300));
    const windows = fc.integer({ min: 0, max: 120 }).chain((n) =>
      fc.record({
        spacing: fc.array(fc.double({ min: 1, max: 1e6, noNaN: true }), { minLength: n, maxLength: n }),
        h: fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: n, maxLength: n }),
        L: fc.array(number, { minLength: n, maxLength: n }),
      }),
    );
    fc.assert(
      fc.property(windows, ({ spacing, h, L }) => {
        let at = start;
        const time = Float64Array.from(spacing, (s) => (at += s));
        const drift = look({
          ...noWindows('measured'),
          count: time.length,
          time,
          h: Float64Array.from(h),
          L: Float64Array.from(L),
          choked: new Uint8Array(time.length),
        });
        expect('reason' in drift || drift.series.length > 0).toBe(true);
      }),
      { numRuns: 300, seed: 7 },
    );
  });
});
