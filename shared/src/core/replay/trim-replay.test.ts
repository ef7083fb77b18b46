import { describe, expect, it } from 'vitest';
import { linear, relativeCoefficient, travelForCoefficient } from '../characteristic/models.js';
import { type DataSheet } from '../data-sheet.js';
import { flowThrough, type LineModel } from '../flow-coefficient/line-model.js';
import { defaultLimits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { quantile } from '../statistics/quantile.js';
import { seededRandom } from '../statistics/seeded-random.js';
import { type DutySummary, dutySummary } from './duty-summary.js';
import { ladderAbout, suggestTrim } from './suggest-trim.js';
import { replayTrim, type TrimCandidate, type TrimReplay } from './trim-replay.js';

const density = 999.1;
const line: LineModel = { a: 430, b: 0.075, from: 0, to: 75, flat: false };
const supply = 900;

function aSheet(over: Partial<DataSheet> = {}): DataSheet {
  return {
    characteristic: 'equal percentage',
    ratedCoefficient: 80,
    rangeability: 50,
    table: null,
    style: 'globe',
    fluid: {
      phase: 'liquid',
      density,
      vapourPressure: 3,
      criticalPressure: 22064,
      viscosity: null,
      molarMass: null,
      specificHeatRatio: null,
      compressibility: null,
      temperature: null,
    },
    FL: 0.9,
    xT: null,
    Fd: null,
    valveSize: null,
    pipeSize: null,
    trip: false,
    criticality: 'normal',
    designBand: null,
    flowBasis: 'volume',
    flowSpan: 75,
    designCases: [],
    ...over,
  };
}

/** Days of a loop that holds its flow: flows wander between 15 and 55 m³/h; the trim only decides the travel. */
function aDuty(days: number, noise = 0) {
  const random = seededRandom(12);
  const count = days * 1440;
  let target = 30;
  const flow = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    if (i % 90 === 0) target = 15 + 40 * random();
    flow[i] = (i === 0 ? target : (flow[i - 1] as number)) * 0.97 + 0.03 * target;
  }
  const drop = flow.map((q) => line.a - line.b * q * q);
  const required = flow.map((q, i) => (10 * q) / Math.sqrt(drop[i] as number));
  const noisy = (column: Float64Array, share: number) =>
    column.map((v) => v * (1 + share * (random() - 0.5)));
  const travel = required.map((C) => 100 * travelForCoefficient('equal percentage', C / 80, 50));
  const prepared: Prepared = {
    start: 0,
    step: 60,
    count,
    travel,
    travelSource: 'position',
    demand: null,
    position: null,
    flow: noisy(flow, noise),
    flowBasis: 'volume',
    flowSpan: 75,
    upstreamPressure: noisy(
      flow.map(() => supply),
      noise / 20,
    ),
    downstreamPressure: drop.map((d) => supply - d),
    temperature: null,
    density: null,
    setPoint: null,
    processValue: null,
    mode: null,
    state: new Uint8Array(count).fill(valveState.inService),
    lag: { seconds: 0, identified: false },
    resolution: { travel: null, flow: null },
    spacing: { travel: 60, flow: 60, demand: null },
    samplesSeen: count,
    samplesUsed: count,
    leftOut: {},
    frozen: [],
    warnings: [],
  };
  return { prepared, required, travel };
}

const summarise = (prepared: Prepared, sheet = aSheet()) =>
  dutySummary(prepared, sheet, defaultLimits) as DutySummary;

function aCandidate(over: Partial<TrimCandidate> = {}): TrimCandidate {
  return {
    characteristic: 'linear',
    ratedCoefficient: 60,
    rangeability: null,
    table: null,
    travelLow: 0,
    travelHigh: 100,
    ...over,
  };
}
const run = (duty: DutySummary, over: Partial<TrimCandidate> = {}) =>
  replayTrim(duty, aCandidate(over)) as TrimReplay;

const { prepared, required, travel } = aDuty(10, 0.02);
const duty = summarise(prepared);

describe('trim replay', () => {
  it('gives the present trim the travel it really had, within 0.5 %', () => {
    const found = run(duty, { characteristic: 'equal percentage', ratedCoefficient: 80, rangeability: 50 });
    for (const [p, { value }] of [
      [0.05, found.p5],
      [0.5, found.p50],
      [0.95, found.p95],
    ] as const)
      expect(Math.abs(value - quantile(travel, p))).toBeLessThan(0.5);
  });

  it.each(['linear', 'quick opening', 'modified parabolic', 'equal percentage'] as const)(
    'foretells the travel of another trim (%s), within 0.5 %',
    (characteristic) => {
      const found = run(duty, { characteristic, ratedCoefficient: 70 });
      const truth = required.map((C) => 100 * travelForCoefficient(characteristic, C / 70, null));
      expect(Math.abs(found.p5.value - quantile(truth, 0.05))).toBeLessThan(0.5);
      expect(Math.abs(found.p50.value - quantile(truth, 0.5))).toBeLessThan(0.5);
      expect(Math.abs(found.p95.value - quantile(truth, 0.95))).toBeLessThan(0.5);
      expect(found.ridge.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 9);
      const band = truth.filter((x) => x > 90).length / truth.length;
      expect(Math.abs(found.aboveHigh - band)).toBeLessThan(0.01);
    },
  );

  it('does so from the line model where no pressures are recorded, with a wider interval', () => {
    const designCases = [
      { name: 'least', flow: 20, upstreamPressure: supply, downstreamPressure: supply - 400 },
      { name: 'most', flow: 60, upstreamPressure: supply, downstreamPressure: supply - 160 },
    ];
    const sheet = aSheet({ designCases });
    const modelled = summarise({ ...prepared, upstreamPressure: null, downstreamPressure: null }, sheet);
    expect(modelled.source).toBe('modelled');
    const truth = required.map((C) => 100 * travelForCoefficient('linear', C / 60, null));
    const found = run(modelled);
    expect(Math.abs(found.p50.value - quantile(truth, 0.5))).toBeLessThan(0.5);
    expect(found.p50.high - found.p50.low).toBeGreaterThan(3 * (run(duty).p50.high - run(duty).p50.low));
    expect(found.designCases.map((c) => c.name)).toEqual(['least', 'most']);
    expect(found.designCases[1]?.required).toBeCloseTo(600 / Math.sqrt(160), 2);
    expect(found.designCases[1]?.travel).toBeCloseTo(
      100 * travelForCoefficient('linear', 47.43 / 60, null),
      1,
    );
    expect(run(modelled, { ratedCoefficient: 40 }).designCases[1]?.travel).toBeNull();
  });

  it('counts duty the candidate cannot pass, and duty too small for it to control', () => {
    const small = run(duty, { ratedCoefficient: 20 });
    const share = required.filter((C) => C > 20).length / required.length;
    expect(Math.abs(small.short - share)).toBeLessThan(0.01);
    expect(run(duty, { ratedCoefficient: 20, travelHigh: 50 }).short).toBeGreaterThan(small.short);
    expect(run(duty, { ratedCoefficient: 5000 }).belowControl).toBeGreaterThan(0.99);
    expect(run(duty).short).toBe(0);
  });

  it('has the installed gain of the closed form of §5.4, within 2 %', () => {
    const { gain } = run(duty);
    expect(gain?.points.length).toBeGreaterThan(20);
    for (const { travel: at, gain: found } of gain?.points ?? []) {
      const slope = (60 * (linear(0.6) - linear(0.4))) / 0.2;
      const C = 60 * relativeCoefficient('linear', at / 100, null);
      const truth = (flowThrough(line, C, 0.1).slope * slope) / 75;
      expect(Math.abs(found / truth - 1)).toBeLessThan(0.02);
    }
  });

  it('carries a year of duty in under 100 kB', () => {
    expect(JSON.stringify(duty).length).toBeLessThan(30_000);
    expect(duty.secondsByBin.length).toBeLessThanOrEqual(601);
    expect(duty.partial).toBe(true);
  });

  it('is refused for trip valves and without flow, fluid or pressures', () => {
    const reason = (over: Partial<Prepared>, sheet = aSheet()) =>
      dutySummary({ ...prepared, ...over }, sheet, defaultLimits);
    expect(reason({}, aSheet({ trip: true }))).toMatchObject({ reason: 'trip-valve' });
    expect(reason({ flow: null })).toMatchObject({ reason: 'no-flow' });
    expect(reason({}, aSheet({ fluid: null }))).toMatchObject({ reason: 'no-fluid-data' });
    expect(reason({ downstreamPressure: null })).toMatchObject({ reason: 'no-pressures' });
    expect(replayTrim(duty, aCandidate({ characteristic: 'table' }))).toMatchObject({ judged: false });
  });
});

describe('the suggested trim', () => {
  it('is the smallest that works below 80 % travel and passes the design cases', () => {
    const suggested = suggestTrim(duty, aSheet(), ladderAbout(80));
    expect(suggested?.replay.p95.value).toBeLessThanOrEqual(80);
    expect(suggested?.replay.short).toBe(0);
    const { characteristic, ratedCoefficient } = suggested?.candidate as TrimCandidate;
    const smaller = run(duty, { characteristic, ratedCoefficient: ratedCoefficient / 1.6, rangeability: 50 });
    expect(smaller.p95.value > 80 || smaller.short > 0).toBe(true);
  });

  it('evens the gain where the line takes most of the drop', () => {
    const suggested = suggestTrim(duty, aSheet({ characteristic: null }), ladderAbout(80));
    const ratios = (['linear', 'equal percentage', 'quick opening'] as const).map(
      (characteristic) => run(duty, { characteristic, ratedCoefficient: 80 }).gain?.ratio ?? Infinity,
    );
    expect(suggested?.replay.gain?.ratio).toBeLessThanOrEqual(1.1 * Math.min(...ratios) + 0.5);
  });

  it('is none where no rung passes the duty', () => {
    expect(suggestTrim(duty, aSheet(), [1, 2])).toBeNull();
  });
});
