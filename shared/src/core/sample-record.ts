import { type DataSheet } from './data-sheet.js';
import { type History, type Series, type Span } from './series.js';
import { seededRandom } from './statistics/seeded-random.js';

/** Small records with a known valve in them, for tests of the core: plain steps of travel, no loop. */

/** A data sheet of an equal-percentage globe valve, Kv 50, R 40, in cold water; any part may be overridden. */
export function aSheet(overrides: Partial<DataSheet> = {}): DataSheet {
  return {
    characteristic: 'equal percentage',
    ratedCoefficient: 50,
    rangeability: 40,
    table: null,
    style: 'globe',
    fluid: {
      phase: 'liquid',
      density: 999.1,
      vapourPressure: 2,
      criticalPressure: 22_064,
      viscosity: 1,
      molarMass: null,
      specificHeatRatio: null,
      compressibility: null,
      temperature: 288,
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
    flowSpan: 100,
    designCases: [],
    ...overrides,
  };
}

/** A series from columns; good throughout unless said. */
export function aSeries(
  time: ArrayLike<number>,
  value: ArrayLike<number>,
  good: ArrayLike<number> = new Uint8Array(time.length).fill(1),
): Series {
  return { time: Float64Array.from(time), value: Float64Array.from(value), good: Uint8Array.from(good) };
}

/** Monday 2024-01-01 00:00 UTC. */
export const aStart = 1_704_067_200;

export interface RecordPlan {
  readonly days: number;
  /** s */
  readonly scan: number;
  /** % travel the valve is moved over, a new travel every `hold` seconds */
  readonly from: number;
  readonly to: number;
  readonly hold: number;
  /** Φ(h), and capacity against Kv 50 */
  readonly law: (h: number) => number;
  readonly capacity: number;
  /** relative noise of the flow */
  readonly noise: number;
  readonly seed: number;
}

/** The record of a valve moved from travel to travel, with both pressures near 10 and 6 bar(a). */
export function aRecord(plan: Partial<RecordPlan> = {}): History {
  const p: RecordPlan = {
    days: 6,
    scan: 30,
    from: 30,
    to: 75,
    hold: 1_800,
    law: (h) => 40 ** (h - 1),
    capacity: 1,
    noise: 0.004,
    seed: 1,
    ...plan,
  };
  const random = seededRandom(p.seed);
  const n = Math.floor((p.days * 86_400) / p.scan);
  const column = () => new Float64Array(n);
  const [time, travel, flow, upstream, downstream] = [column(), column(), column(), column(), column()];
  let x = (p.from + p.to) / 2;
  for (let i = 0; i < n; i++) {
    if ((i * p.scan) % p.hold < p.scan) x = p.from + (p.to - p.from) * random();
    const P1 = 1_000 + 30 * Math.sin(i / 900);
    const P2 = 600 + 20 * Math.sin(i / 700);
    const C = 50 * p.capacity * p.law(x / 100);
    time[i] = aStart + i * p.scan;
    // a little life in the readings, so that nothing looks frozen
    travel[i] = x + 0.1 * (random() - 0.5);
    flow[i] = 0.1 * C * Math.sqrt(P1 - P2) * (1 + 2 * p.noise * (random() + random() - 1));
    upstream[i] = P1 + random() - 0.5;
    downstream[i] = P2 + random() - 0.5;
  }
  return {
    position: aSeries(time, travel),
    demand: aSeries(time, travel),
    flow: aSeries(time, flow),
    upstreamPressure: aSeries(time, upstream),
    downstreamPressure: aSeries(time, downstream),
  };
}

/** The span of days from the start of a sample record. */
export function daysFromStart(days: number): Span {
  return { from: aStart, to: aStart + days * 86_400 };
}
