import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { type History, type SignalRole, type Span } from '../series.js';
import { withoutCrossed } from './crossed-pressures.js';
import { frozenSpells } from './frozen.js';
import { lagBetween, shifted } from './lag.js';
import { type Grid, type Prepared, valveState } from './prepared.js';
import { rebuildHeld, rebuildLinear } from './rebuild.js';
import { type RecordedSignal, type RecordedSignals, recordedSignals } from './recorded-signals.js';
import { valveStates } from './valve-states.js';

type Columns = { -readonly [K in SignalRole]?: Float64Array };

/**
 * The record of one valve made ready for every later chapter: cleaned, rebuilt on one grid at the signals' own
 * pace, its state known at each point, frozen spells cut out, flow moved by its lag.
 *
 * @param history recorded signals, units of methods.md §0
 * @param span window, s UTC
 * @returns a refusal where there are no samples, or no travel of sufficient quality
 * Source: methods.md §1
 */
export function prepare(
  history: History,
  sheet: DataSheet,
  span: Span,
  limits: Limits,
): Prepared | CannotJudge {
  const recorded = recordedSignals(history, sheet, span, limits);
  const { signals } = recorded;
  const warnings = [...recorded.warnings];
  if (recorded.seen === 0) return cannotJudge('no-samples');
  const travelRole = hasValues(signals.position) ? 'position' : 'demand';
  const travelSignal = signals[travelRole];
  if (travelSignal === undefined || !hasValues(travelSignal)) {
    const refused = warnings.find((w) => w.code === 'position-quality' || w.code === 'demand-quality');
    return refused ? cannotJudge('signal-quality', refused.figures) : cannotJudge('no-travel-signal');
  }

  const grid = gridOf(recorded, travelSignal);
  const columns = rebuildAll(recorded, grid, limits);
  const leftOut = { ...recorded.leftOut };
  refuseCrossedPressures(columns, grid, limits, leftOut, warnings);

  const travel = columns[travelRole] as Float64Array;
  const frozen = cutFrozen(columns, travelRole, grid, recorded.flowSpan, limits);
  const state = valveStates(
    {
      travel,
      demand: columns.demand ?? null,
      flow: columns.flow ?? null,
      mode: columns.mode ?? null,
      processValue: columns.processValue ?? null,
    },
    grid,
    stateRules(grid, recorded.flowSpan, limits),
  );
  for (const spell of frozen.spells) {
    const reason = spell.bit === valveState.frozen ? 'frozen' : 'outage';
    leftOut[reason] = (leftOut[reason] ?? 0) + spell.to - spell.from;
    for (let i = spell.from; i < spell.to; i++)
      state[i] = ((state[i] as number) & ~valveState.inService) | spell.bit;
  }

  const lag = alignFlow(columns, travel, state, grid, limits, warnings);
  return {
    ...grid,
    travel,
    travelSource: travelRole,
    demand: columns.demand ?? null,
    position: travelRole === 'position' ? travel : null,
    flow: columns.flow ?? null,
    flowBasis: sheet.flowBasis,
    flowSpan: recorded.flowSpan,
    upstreamPressure: columns.upstreamPressure ?? null,
    downstreamPressure: columns.downstreamPressure ?? null,
    temperature: columns.temperature ?? null,
    density: columns.density ?? null,
    setPoint: columns.setPoint ?? null,
    processValue: columns.processValue ?? null,
    mode: columns.mode ?? null,
    state,
    lag,
    resolution: {
      travel: travelSignal.resolution,
      flow: signals.flow?.resolution ?? null,
    },
    spacing: {
      travel: travelSignal.pace.scan || grid.step,
      flow: signals.flow ? signals.flow.pace.scan || grid.step : null,
      demand: signals.demand ? signals.demand.pace.scan || grid.step : null,
    },
    samplesSeen: recorded.seen,
    samplesUsed: recorded.used,
    leftOut,
    frozen: frozen.spells
      .filter((spell) => spell.bit === valveState.frozen)
      .map(({ role, from, to }) => ({
        role,
        from: grid.start + from * grid.step,
        to: grid.start + (to - 1) * grid.step,
      })),
    warnings,
  };
}

function hasValues(signal: RecordedSignal | undefined): boolean {
  return signal !== undefined && signal.time.length > signal.bad + signal.outOfRange;
}

const fewestPoints = 500_000;
const mostPoints = 16_000_000;

/**
 * The grid runs at the fastest scan of demand, position and flow, from the first travel sample to the last
 * sample of any of them. Its points are bounded by what was stored, so that a long quiet archive stays small.
 */
function gridOf({ signals }: RecordedSignals, travel: RecordedSignal): Grid {
  const paced = [signals.position, signals.demand, signals.flow].filter((s) => s !== undefined);
  const start = travel.time[0] as number;
  const end = Math.max(...paced.map((s) => s.time[s.time.length - 1] as number));
  const stored = Math.max(...paced.map((s) => s.time.length));
  const scans = paced.map((s) => s.pace.scan).filter((s) => s > 0);
  const most = Math.min(mostPoints, Math.max(fewestPoints, 4 * stored));
  const length = end - start;
  const scan = scans.length === 0 ? Math.max(1, length) : Math.min(...scans);
  const step = Math.max(scan, length / most, 0.1);
  return { start, step, count: Math.floor(length / step + 1e-6) + 1 };
}

const held: readonly SignalRole[] = ['setPoint', 'mode'];

function rebuildAll({ signals, flowSpan }: RecordedSignals, grid: Grid, limits: Limits): Columns {
  const columns: Columns = {};
  for (const [name, signal] of Object.entries(signals)) {
    const role = name as SignalRole;
    if (held.includes(role)) {
      columns[role] = rebuildHeld(signal.time, signal.value, grid);
      continue;
    }
    // a signal stored by exception stands at its last value; one stored at a regular pace has simply ended
    const byException = signal.time.length < 3 || signal.pace.longest > 3 * signal.pace.scan;
    columns[role] = rebuildLinear(signal.time, signal.value, grid, {
      gap: signal.gap,
      gapChange: limits.preparation.gapChangeShare * spanOf(role, signal, flowSpan),
      tail: byException ? signal.gap : 2 * signal.pace.median,
    });
  }
  return columns;
}

function spanOf(role: SignalRole, signal: RecordedSignal, flowSpan: number): number {
  if (role === 'demand' || role === 'position') return 100;
  if (role === 'flow') return flowSpan;
  // only the scale of it matters here
  const stride = Math.max(1, Math.floor(signal.value.length / 5_000));
  let largest = 0;
  for (let i = 0; i < signal.value.length; i += stride)
    largest = Math.max(largest, Math.abs(signal.value[i] as number) || 0);
  return largest;
}

function refuseCrossedPressures(
  columns: Columns,
  grid: Grid,
  limits: Limits,
  leftOut: Record<string, number>,
  warnings: { code: string; figures: Record<string, number> }[],
): void {
  if (!columns.upstreamPressure || !columns.downstreamPressure) return;
  const rules = limits.preparation;
  const { upstream, downstream, crossed } = withoutCrossed(
    columns.upstreamPressure,
    columns.downstreamPressure,
    grid,
    { share: rules.pressureCrossShare, seconds: rules.pressureCrossSeconds },
  );
  columns.upstreamPressure = upstream;
  columns.downstreamPressure = downstream;
  if (crossed === 0) return;
  leftOut['pressures crossed'] = crossed;
  warnings.push({ code: 'pressures-crossed', figures: { share: crossed / grid.count } });
}

interface CutSpell {
  readonly role: string;
  readonly from: number;
  readonly to: number;
  readonly bit: number;
}

/** Takes frozen spells of flow and position, and collection outages, out of the columns. */
function cutFrozen(
  columns: Columns,
  travelRole: 'position' | 'demand',
  grid: Grid,
  flowSpan: number,
  limits: Limits,
): { readonly spells: CutSpell[] } {
  const rules = limits.preparation;
  const { demand, position, flow } = columns;
  const measured = [position, flow, columns.upstreamPressure, columns.downstreamPressure].filter(
    (c) => c !== undefined,
  );
  const spells: CutSpell[] = [];
  const look = (role: 'flow' | 'position', partners: (Float64Array | null)[], ignoreUpTo: number) => {
    const column = columns[role];
    if (column === undefined) return;
    const others = measured.filter((c) => c !== column);
    const found = frozenSpells(column, partners, others, grid, {
      seconds: rules.frozenSeconds,
      partnerMove: rules.frozenPartnerMove,
      outageShare: rules.outageShare,
      ignoreUpTo,
    });
    for (const s of found.frozen) spells.push({ role, ...s, bit: valveState.frozen });
    for (const s of found.outage) spells.push({ role, ...s, bit: valveState.outage });
  };
  look('flow', [demand ?? null, position ?? null], rules.meterCutOffShare * flowSpan);
  if (travelRole === 'position') look('position', [demand ?? null], -Infinity);
  // cut only after both were looked at: each is the other's partner
  for (const spell of spells) {
    const cut = spell.bit === valveState.outage ? measured : [columns[spell.role as SignalRole]];
    for (const column of cut) column?.fill(NaN, spell.from, spell.to);
  }
  return { spells };
}

/** The skipped minutes after a start and a shut-down are at most a twentieth of the record, so that short ones keep some. */
function stateRules(grid: Grid, flowSpan: number, limits: Limits) {
  const rules = limits.preparation;
  const most = 0.05 * grid.count * grid.step;
  return {
    inServiceTravel: rules.inServiceTravel,
    shutDemand: rules.shutDemand,
    shutTravel: rules.shutTravel,
    manualSeconds: rules.manualSeconds,
    startSkipSeconds: Math.min(rules.startSkipSeconds, most),
    shutSkipSeconds: Math.min(rules.shutSkipSeconds, most),
    meterCutOff: rules.meterCutOffShare * flowSpan,
  };
}

function alignFlow(
  columns: Columns,
  travel: Float64Array,
  state: Uint8Array,
  grid: Grid,
  limits: Limits,
  warnings: { code: string; figures: Record<string, number> }[],
): { seconds: number; identified: boolean } {
  if (!columns.flow) return { seconds: 0, identified: false };
  const rules = limits.preparation;
  const use = new Uint8Array(grid.count);
  for (let i = 0; i < grid.count; i++) use[i] = (state[i] as number) & valveState.inService;
  const lag = lagBetween(travel, columns.flow, use, grid, {
    earliest: rules.lagEarliest,
    latest: rules.lagLatest,
    correlation: rules.lagCorrelation,
    peakRatio: rules.lagPeakRatio,
  });
  if (lag.identified && lag.seconds < -grid.step)
    warnings.push({ code: 'flow-leads-position', figures: { seconds: -lag.seconds } });
  const steps = Math.round(lag.seconds / grid.step);
  for (const role of ['flow', 'upstreamPressure', 'downstreamPressure', 'temperature', 'density'] as const) {
    const column = columns[role];
    if (column) columns[role] = shifted(column, steps);
  }
  return lag;
}
