import { type History, type Series, type SignalRole } from '../core/series.js';
import { seededRandom } from '../core/statistics/seeded-random.js';
import { flowThrough, resistanceOf } from './flow.js';
import { archive } from './historian.js';
import { type Loop, type Spell } from './loop-settings.js';
import { dutyByMinute } from './set-point.js';
import { normal, wanderer } from './smooth-noise.js';
import { moveStem } from './stick.js';
import { coefficientAt, trimTable } from './trim.js';

/** What was simulated: the recorded signals in the core's units, and what nobody at the plant could see. */
export interface Simulated {
  readonly history: History;
  /** full scale of the flow meter, m³/h */
  readonly flowSpan: number;
  readonly truth: {
    /** mean capacity factor over the record: drift and step */
    readonly capacity: number;
    /** 5th, 50th and 95th percentile of the true stem in service, % */
    readonly travel: { readonly p5: number; readonly p50: number; readonly p95: number };
  };
}

/** s: stem behind the positioner, and the meter behind the flow */
const stemLag = 2;
const meterLag = 3;
const integralTime = 20;

/**
 * Runs one closed loop at a step of 1 s and keeps what its historian would: set point, PI controller, positioner with
 * a stem that sticks, trim, line, meter. The same settings give the same bits.
 *
 * Source: methods.md §12.1
 */
export function simulate(loop: Loop): Simulated {
  const random = seededRandom(loop.seed);
  const { valve, line, historian } = loop;
  const seconds = Math.round(loop.days * 86_400);
  const trim = trimTable(valve, random);
  const nominal = trimTable({ ...valve, ripple: 0, shift: 0 }, random);
  const resistance = resistanceOf(line, valve.ratedCoefficient);
  const flowAt = (table: Float64Array, travel: number) =>
    flowThrough(coefficientAt(table, travel, 0), line.dropShut, resistance, line.density);
  const flowSpan = niceSpan(1.1 * flowAt(nominal, 100));
  const duty = dutyByMinute(loop.duty, Math.ceil(seconds / 60) + 1, random);
  const middle = (loop.duty.low + loop.duty.high) / 2;
  const processGain = ((flowAt(nominal, middle + 5) - flowAt(nominal, middle - 5)) / 10 / flowSpan) * 100;
  const gain = (0.35 * loop.tuning) / Math.max(0.2, processGain);

  const scans = Math.floor(seconds / historian.scan);
  const columns = recordedColumns(historian.roles, scans);
  const histogram = new Float64Array(1001);
  const supply = wanderer(random, 4 * 60);
  const back = wanderer(random, 7 * 60);
  const fS = (valve.stick.S + valve.stick.J) / 2;
  const fD = (valve.stick.S - valve.stick.J) / 2;
  const passing = valve.passing * valve.ratedCoefficient;
  const choked = valve.FL * valve.FL;

  let demand = duty[0] as number;
  const stem = { position: demand, residual: 0, demand };
  let position = demand;
  let plug = demand;
  let measured = flowAt(nominal, demand);
  let errorBefore = 0;
  let integral = demand;
  let drop = line.dropShut;
  let backDrift = 0;
  let capacitySum = 0;

  for (let s = 0; s < seconds; s++) {
    if (s % 60 === 0) {
      const supplyDrift = line.disturbance * line.dropShut * supply();
      backDrift = 0.5 * line.disturbance * line.dropShut * back();
      drop = line.dropShut + supplyDrift - backDrift;
    }
    const shut = isIn(loop.shutdowns, s);
    const wanted = duty[Math.floor(s / 60)] as number;
    const swing = loop.swing
      ? loop.swing.amplitude * flowSpan * Math.sin((2 * Math.PI * s) / loop.swing.period)
      : 0;
    const setPoint = Math.max(0, flowAt(nominal, wanted) + swing);
    if (shut) {
      demand = integral = 0;
      errorBefore = 0;
    } else if (loop.duty.kind === 'constant demand') demand = wanted;
    else {
      const error = (100 * (setPoint - measured)) / flowSpan;
      integral = clip(integral + (gain / integralTime) * error + gain * (error - errorBefore));
      errorBefore = error;
      demand = integral;
    }
    moveStem(stem, demand, fS, fD);
    position += (stem.position - position) / stemLag;
    if (demand <= 0 && position < 0.5) position = 0;
    if (position - plug > valve.play / 2) plug = position - valve.play / 2;
    else if (plug - position > valve.play / 2) plug = position + valve.play / 2;
    if (position === 0) plug = 0;
    const capacity = capacityAt(loop, s, seconds);
    capacitySum += capacity;
    const C = capacity * coefficientAt(trim, plug, passing);
    let flow = flowThrough(C, drop, resistance, line.density);
    const downstream = line.destination + backDrift + 0.4 * resistance * flow * flow;
    const upstream = downstream + Math.max(0, drop - resistance * flow * flow);
    const mostDrop = choked * (upstream - 0.95 * line.vapourPressure);
    if (upstream - downstream > mostDrop) flow *= Math.sqrt(mostDrop / (upstream - downstream));
    const noise = loop.meterNoise * flowSpan * normal(random);
    measured += (flow + noise * Math.sqrt(2 * meterLag) - measured) / meterLag;
    if (!shut) histogram[Math.round(position * 10)] = (histogram[Math.round(position * 10)] as number) + 1;

    if (s % historian.scan === 0) {
      const i = s / historian.scan;
      if (i >= scans) continue;
      record(columns, i, {
        demand,
        position: position + (position === 0 ? 0 : valve.positionError),
        flow: Math.max(0, measured),
        setPoint: shut ? 0 : setPoint,
        processValue: Math.max(0, measured),
        upstreamPressure: upstream * (1 + 0.0008 * normal(random)),
        downstreamPressure: downstream * (1 + 0.0008 * normal(random)),
        mode: shut ? 0 : 1,
        temperature: 293,
        density: line.density,
      });
    }
  }
  freeze(columns, loop);
  return {
    history: archived(columns, loop, flowSpan),
    flowSpan,
    truth: { capacity: capacitySum / seconds, travel: percentiles(histogram) },
  };
}

type Columns = Map<SignalRole, Float64Array>;

function recordedColumns(roles: readonly SignalRole[], scans: number): Columns {
  return new Map(roles.map((role) => [role, new Float64Array(scans)]));
}

function record(columns: Columns, i: number, values: Record<SignalRole, number>): void {
  for (const [role, column] of columns) column[i] = values[role];
}

function clip(travel: number): number {
  return Math.min(100, Math.max(0, travel));
}

function isIn(spells: readonly Spell[], s: number): boolean {
  return spells.some(({ from, to }) => s >= from && s < to);
}

function capacityAt({ valve }: Loop, s: number, seconds: number): number {
  const step = valve.step !== null && s >= valve.step.at ? valve.step.factor : 1;
  return step * (1 + (valve.drift * s) / seconds);
}

/** A transmitter that freezes goes on saying what it last said. */
function freeze(columns: Columns, { frozen, historian }: Loop): void {
  for (const { role, from, to } of frozen) {
    const column = columns.get(role);
    if (!column) continue;
    const first = Math.round(from / historian.scan);
    column.fill(column[first] as number, first, Math.round(to / historian.scan));
  }
}

const decimals: Partial<Record<SignalRole, number>> = { mode: 0, demand: 2, position: 2, flow: 3 };
const steps: ReadonlySet<SignalRole> = new Set(['mode', 'setPoint']);

function archived(columns: Columns, { start, historian }: Loop, flowSpan: number): History {
  const history: Partial<Record<SignalRole, Series>> = {};
  const { scan, longest } = historian;
  for (const [role, column] of columns) {
    const span =
      role === 'demand' || role === 'position'
        ? 100
        : role === 'flow' || role === 'setPoint'
          ? flowSpan
          : 500;
    const tolerance = steps.has(role) ? 1e-9 : historian.tolerance * span;
    history[role] = archive(start, column, {
      scan,
      tolerance: historian.tolerance === 0 ? 0 : tolerance,
      longest,
      decimals: decimals[role] ?? 2,
    });
  }
  return history;
}

function percentiles(histogram: Float64Array): Simulated['truth']['travel'] {
  const total = histogram.reduce((sum, n) => sum + n, 0);
  const at = (share: number) => {
    let sum = 0;
    for (let i = 0; i < histogram.length; i++) {
      sum += histogram[i] as number;
      if (sum >= share * total) return i / 10;
    }
    return NaN;
  };
  return { p5: at(0.05), p50: at(0.5), p95: at(0.95) };
}

/** A meter range somebody would choose: 1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8 times a power of ten. */
function niceSpan(least: number): number {
  const power = 10 ** Math.floor(Math.log10(least));
  const step = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10].find((s) => s * power >= least) ?? 10;
  return step * power;
}
