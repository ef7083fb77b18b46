import { type Prepared, valveState } from '../preparation/prepared.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { type History } from '../series.js';
import { seededRandom } from '../statistics/seeded-random.js';

/** A closed flow loop for tests: what ails the valve and what disturbs it. Travel in %, times in s. */
export interface LoopSample {
  readonly days: number;
  readonly scan?: number;
  readonly seed?: number;
  /** two-parameter stick model between demand and stem (He et al. 2007): fS = fD is a dead band of 2·fS */
  readonly fS?: number;
  readonly fD?: number;
  /** between stem and plug */
  readonly play?: number;
  readonly offset?: number;
  /** controller gain, % demand per % of span, and reset time */
  readonly gain?: number;
  readonly reset?: number;
  /** supply pressure: standard deviation as a share, correlation time */
  readonly disturbance?: number;
  readonly disturbanceTime?: number;
  /** amplitude of a swing of the supply in % of travel it takes to hold the flow, and its period */
  readonly swing?: number;
  readonly swingPeriod?: number;
  /** mean time between set-point steps, and their range in % travel about 50 */
  readonly stepEvery?: number;
  readonly range?: number;
  /** daily course of the load, % travel */
  readonly daily?: number;
  readonly flowNoise?: number;
  readonly positionNoise?: number;
  readonly withPosition?: boolean;
  readonly start?: number;
}

/** Stem under the two-parameter stick model: rests until the wanted change exceeds fS (then lags fD behind). */
export function stickStep(
  stem: number,
  left: number,
  change: number,
  fS: number,
  fD: number,
): { stem: number; left: number } {
  const wanted = left + change;
  if (Math.abs(wanted) <= fS) return { stem, left: wanted };
  const sign = Math.sign(wanted);
  return { stem: stem + wanted - sign * fD, left: sign * fD };
}

const lnRangeability = Math.log(30);

/**
 * Simulates the loop at 1 s and hands back what preparation would: equal-percentage trim, measured pressures, PI
 * control of flow, supply pressure wandering as a first-order process.
 */
export function loopSample(sample: LoopSample): Prepared {
  const {
    days,
    scan = 10,
    seed = 1,
    fS = 0.1,
    fD = 0.1,
    play = 0,
    offset = 0,
    gain = 0.4,
    reset = 30,
    disturbance = 0.03,
    disturbanceTime = 7_200,
    swing = 0,
    swingPeriod = 600,
    stepEvery = 14_400,
    range = 40,
    daily = 0,
    flowNoise = 0.004,
    positionNoise = 0.03,
    withPosition = true,
    start = 1_750_000_000,
  } = sample;
  const random = seededRandom(seed);
  const normal = () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
  const count = Math.floor((days * 86_400) / scan);
  const column = () => new Float64Array(count);
  const out = {
    demand: column(),
    position: column(),
    flow: column(),
    P1: column(),
    P2: column(),
    SP: column(),
  };
  const relative = (x: number) => Math.exp(lnRangeability * (x / 100 - 1));
  let u = 50;
  let integral = 50;
  let stem = 50;
  let left = 0;
  let plug = 50;
  let lagged = 50;
  let wander = 0;
  let measured = 100 * relative(50);
  let target = 50;
  const keep = Math.exp(-1 / disturbanceTime);
  const push = disturbance * Math.sqrt(1 - keep * keep);
  for (let i = 0, t = 0; i < count; i++) {
    for (let s = 0; s < scan; s++, t++) {
      if (random() < 1 / stepEvery) target = 50 + range * (random() - 0.5);
      wander = keep * wander + push * normal();
      const swung = swing * Math.sin((2 * Math.PI * t) / swingPeriod);
      const drop = 100 * (1 + wander) * Math.exp((-2 * lnRangeability * swung) / 100);
      const setPoint = 100 * relative(target + daily * dailyCourse(t));
      const error = ((setPoint - measured) / setPoint) * (100 / lnRangeability);
      integral = Math.min(110, Math.max(-10, integral + (gain * error) / reset));
      const asked = Math.min(100, Math.max(0, integral + gain * error));
      const moved = stickStep(stem, left, asked - u, fS, fD);
      u = asked;
      stem = Math.min(100, Math.max(0, moved.stem));
      left = moved.left;
      lagged += (stem - lagged) / 2;
      if (lagged - plug > play / 2) plug = lagged - play / 2;
      else if (plug - lagged > play / 2) plug = lagged + play / 2;
      const flow = 100 * relative(plug) * Math.sqrt(drop / 100);
      measured += (flow - measured) / 3;
      if (s < scan - 1) continue;
      out.demand[i] = u;
      out.position[i] = Math.round((lagged + offset + positionNoise * normal()) * 100) / 100;
      out.flow[i] = measured * (1 + flowNoise * normal());
      out.P1[i] = 200 + drop;
      out.P2[i] = 200;
      out.SP[i] = setPoint;
    }
  }
  const travel = withPosition ? out.position : out.demand;
  return {
    start,
    step: scan,
    count,
    travel,
    travelSource: withPosition ? 'position' : 'demand',
    demand: out.demand,
    position: withPosition ? out.position : null,
    flow: out.flow,
    flowBasis: 'volume',
    flowSpan: 100,
    upstreamPressure: out.P1,
    downstreamPressure: out.P2,
    temperature: null,
    density: null,
    setPoint: out.SP,
    processValue: out.flow,
    mode: null,
    state: new Uint8Array(count).fill(valveState.inService),
    lag: { seconds: 0, identified: false },
    resolution: { travel: 0.02, flow: null },
    spacing: { travel: scan, flow: scan, demand: scan },
    samplesSeen: count,
    samplesUsed: count,
    leftOut: {},
    frozen: [],
    warnings: [],
  };
}

/** A load that is up by day and down by night, with ramps: between −1 and 1. */
function dailyCourse(t: number): number {
  return Math.max(-1, Math.min(1, 3 * Math.sin((2 * Math.PI * t) / 86_400)));
}

/** Windows that say only whether pressures are measured. */
export function noWindows(source: SteadyWindows['source']): SteadyWindows {
  const none = new Float64Array(0);
  const numbers = new Int32Array(0);
  return {
    count: 0,
    time: none,
    h: none,
    flow: none,
    pressureDrop: none,
    upstreamPressure: none,
    coefficient: none,
    L: none,
    choked: new Uint8Array(0),
    slot: numbers,
    day: numbers,
    seconds: 300,
    slotSeconds: 7_200,
    source,
    line: null,
    leftOut: {},
  };
}

/** The loop as a historian would have recorded it, sample by sample. */
export function historyOf(prepared: Prepared): History {
  const time = Float64Array.from({ length: prepared.count }, (_, i) => prepared.start + i * prepared.step);
  const good = new Uint8Array(prepared.count).fill(1);
  const roles = [
    'demand',
    'position',
    'flow',
    'upstreamPressure',
    'downstreamPressure',
    'setPoint',
    'processValue',
  ] as const;
  return Object.fromEntries(
    roles.flatMap((role) => {
      const value = prepared[role];
      return value === null ? [] : [[role, { time, value, good }]];
    }),
  );
}
