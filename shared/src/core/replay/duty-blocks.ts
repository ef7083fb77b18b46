import { type DataSheet } from '../data-sheet.js';
import { flowCoefficient } from '../flow-coefficient/flow-coefficient.js';
import { type LineModel } from '../flow-coefficient/line-model.js';
import { type Limits } from '../limits.js';
import { type CutWindows } from '../preparation/cut-windows.js';
import { modelledPressures } from '../preparation/modelled-pressures.js';
import { type Prepared, valveState } from '../preparation/prepared.js';

/** What the valve had to do in each minute or so in service: columns of one length. */
export interface DutyBlocks {
  readonly count: number;
  /** s a block stands for */
  readonly seconds: number;
  /** unit of the flow basis */
  readonly flow: Float64Array;
  /** kPa(a) */
  readonly upstreamPressure: Float64Array;
  /** kPa */
  readonly drop: Float64Array;
  /** Kv needed for that flow at that drop: it does not depend on the trim that is in */
  readonly required: Float64Array;
  readonly choked: Uint8Array;
  readonly temperature: Float64Array;
  readonly density: Float64Array;
  readonly source: 'measured' | 'modelled';
  readonly line: LineModel | null;
  /** s in service of which no required coefficient is known */
  readonly unknownSeconds: number;
  /** s with the valve wide open: the flow then may be less than was wanted */
  readonly openSeconds: number;
}

const blockSeconds = 60;

/**
 * The duty of a record in blocks of a minute (one grid step where that is longer): all time in service, steady or not,
 * because travel percentiles are of all time.
 *
 * @returns null where no flow, no fluid, or neither pressures nor a line model are known
 * Source: methods.md §5.4 (1)
 */
export function dutyBlocks(prepared: Prepared, sheet: DataSheet, limits: Limits): DutyBlocks | null {
  if (prepared.flow === null || sheet.fluid === null) return null;
  const cut = meanBlocks(prepared, limits);
  const bothMeasured = prepared.upstreamPressure !== null && prepared.downstreamPressure !== null;
  const pressures = bothMeasured
    ? {
        source: 'measured' as const,
        line: null,
        upstreamPressure: cut.upstreamPressure,
        drop: cut.upstreamPressure.map((p, i) => p - (cut.downstreamPressure[i] as number)),
      }
    : modelledPressures(cut, sheet);
  if (pressures === null || pressures.source === 'none') return null;
  const required = new Float64Array(cut.count);
  const choked = new Uint8Array(cut.count);
  let unknown = 0;
  for (let i = 0; i < cut.count; i++) {
    const upstreamPressure = pressures.upstreamPressure[i] as number;
    const found = flowCoefficient(
      {
        flow: cut.flow[i] as number,
        upstreamPressure,
        downstreamPressure: upstreamPressure - (pressures.drop[i] as number),
        temperature: cut.temperature[i] as number,
        density: cut.density[i] as number,
      },
      sheet,
      limits.stress.chokedShare,
    );
    required[i] = found.coefficient > 0 ? found.coefficient : NaN;
    choked[i] = found.choked ? 1 : 0;
    if (!(found.coefficient > 0)) unknown++;
  }
  return {
    count: cut.count,
    seconds: cut.length.seconds,
    flow: cut.flow,
    upstreamPressure: pressures.upstreamPressure,
    drop: pressures.drop,
    required,
    choked,
    temperature: cut.temperature,
    density: cut.density,
    source: pressures.source,
    line: pressures.line,
    unknownSeconds: unknown * cut.length.seconds + cut.unknownSeconds,
    openSeconds: cut.openSeconds,
  };
}

const columns = ['flow', 'upstreamPressure', 'downstreamPressure', 'temperature', 'density'] as const;
/** % of travel from which a valve is wide open (methods.md §5.1) */
const wideOpen = 99;

/** Means over blocks of time in service; a block is kept if half of it is in service with a flow worth reading. */
function meanBlocks(
  prepared: Prepared,
  limits: Limits,
): CutWindows & { readonly unknownSeconds: number; readonly openSeconds: number } {
  const points = Math.max(1, Math.round(blockSeconds / prepared.step));
  const seconds = points * prepared.step;
  const possible = Math.ceil(prepared.count / points);
  const out = Object.fromEntries(columns.map((name) => [name, new Float64Array(possible)])) as Record<
    (typeof columns)[number],
    Float64Array
  >;
  const time = new Float64Array(possible);
  const h = new Float64Array(possible);
  const leastFlow = limits.windows.flowLowShare * prepared.flowSpan;
  const barred = valveState.settling | valveState.frozen | valveState.outage;
  let n = 0;
  let unknown = 0;
  let open = 0;
  for (let w = 0; w < possible; w++) {
    const from = w * points;
    const to = Math.min(prepared.count, from + points);
    let inService = 0;
    for (let i = from; i < to; i++) {
      const state = prepared.state[i] as number;
      if ((state & valveState.inService) !== 0 && (state & barred) === 0) inService++;
    }
    if (2 * inService < to - from) continue;
    const travel = meanOf(prepared.travel, from, to);
    if (travel >= wideOpen) open++;
    for (const name of columns) out[name][n] = meanOf(prepared[name], from, to);
    if (!((out.flow[n] as number) >= leastFlow)) {
      unknown++;
      continue;
    }
    time[n] = prepared.start + ((from + to - 1) / 2) * prepared.step;
    h[n] = travel / 100;
    n++;
  }
  return {
    count: n,
    length: { seconds, slotSeconds: seconds, leastShare: 0 },
    time: time.subarray(0, n),
    h: h.subarray(0, n),
    flow: out.flow.subarray(0, n),
    upstreamPressure: out.upstreamPressure.subarray(0, n),
    downstreamPressure: out.downstreamPressure.subarray(0, n),
    temperature: out.temperature.subarray(0, n),
    density: out.density.subarray(0, n),
    slot: new Int32Array(n),
    day: new Int32Array(n),
    leftOut: {},
    unknownSeconds: unknown * seconds,
    openSeconds: open * seconds,
  };
}

function meanOf(column: Float64Array | null, from: number, to: number): number {
  if (column === null) return NaN;
  let sum = 0;
  let n = 0;
  for (let i = from; i < to; i++) {
    const v = column[i] as number;
    if (Number.isNaN(v)) continue;
    sum += v;
    n++;
  }
  return n > 0 ? sum / n : NaN;
}
