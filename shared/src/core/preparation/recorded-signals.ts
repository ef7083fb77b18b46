import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type History, type SignalRole, type Series, signalRoles, type Span } from '../series.js';
import { sortedFinite, sortedQuantile } from '../statistics/quantile.js';
import { type Bounds, cleanSignal, type CleanSignal, rejectedShare } from './clean-signal.js';
import { removeOutliers } from './outliers.js';
import { type Pace, paceOf, resolutionOf } from './pace.js';

/** One role's signal, cleaned, with its own pace. */
export interface RecordedSignal extends CleanSignal {
  readonly pace: Pace;
  /** s: longest bridge (§1.2) */
  readonly gap: number;
  readonly resolution: number | null;
  readonly outliers: number;
}

/** The signals of one window that may be used, and what was found while cleaning them. */
export interface RecordedSignals {
  readonly signals: Partial<Record<SignalRole, RecordedSignal>>;
  readonly flowSpan: number;
  readonly seen: number;
  readonly used: number;
  readonly leftOut: Record<string, number>;
  readonly warnings: { code: string; figures: Record<string, number> }[];
}

/** Roles whose spikes are taken out: not demand and position, whose real steps look like outliers (§1.7). */
const filtered: readonly SignalRole[] = [
  'flow',
  'upstreamPressure',
  'downstreamPressure',
  'temperature',
  'density',
];

/**
 * Cleans every recorded signal of a valve: quality, range, duplicates, outliers, each removal counted.
 * A signal refused for more than the allowed share of time is left out with a warning.
 *
 * Source: methods.md §1.1, §1.7
 */
export function recordedSignals(
  history: History,
  sheet: DataSheet,
  span: Span,
  limits: Limits,
): RecordedSignals {
  const rules = limits.preparation;
  const flowSpan = flowSpanOf(history.flow, sheet, span);
  const signals: Partial<Record<SignalRole, RecordedSignal>> = {};
  const leftOut: Record<string, number> = {};
  const warnings: RecordedSignals['warnings'] = [];
  const changes = history.setPoint === undefined ? null : setPointChanges(history.setPoint);
  let seen = 0;
  let used = 0;
  const count = (reason: string, n: number) => {
    if (n > 0) leftOut[reason] = (leftOut[reason] ?? 0) + n;
  };
  for (const role of signalRoles) {
    const series = history[role];
    if (series === undefined || series.time.length === 0) continue;
    const clean = cleanSignal(series, span, boundsOf(role, flowSpan, sheet.flowSpan !== null, limits));
    seen += clean.seen;
    count('bad', clean.bad);
    count('out of range', clean.outOfRange);
    count('duplicate', clean.duplicate);
    if (clean.backward > 0) warnings.push({ code: 'backward-times', figures: { samples: clean.backward } });
    if (clean.time.length === 0) continue;
    const pace = paceOf(clean.time);
    const gap = Math.max(rules.gapSeconds, rules.gapSpacings * (pace.longest || 0));
    const share = rejectedShare(clean, gap);
    if (share > rules.rejectedShare) {
      warnings.push({ code: `${role}-quality`, figures: { share, allowed: rules.rejectedShare } });
      continue;
    }
    const resolution = resolutionOf(clean.value);
    let { value } = clean;
    let outliers = 0;
    if (filtered.includes(role)) {
      const near = changes === null ? null : nearAny(clean.time, changes, 3);
      const result = removeOutliers(
        clean,
        resolution ?? 0,
        { halfWidth: rules.hampelHalfWidth, spread: rules.hampelSpread, share: rules.hampelShare },
        near,
      );
      ({ value, removed: outliers } = result);
      count('outlier', outliers);
      if (result.off) warnings.push({ code: `${role}-outliers-kept`, figures: {} });
    }
    used += clean.time.length - clean.bad - clean.outOfRange - outliers;
    signals[role] = { ...clean, value, pace, gap, resolution, outliers };
  }
  return { signals, flowSpan, seen, used, leftOut, warnings };
}

/** Full scale of the flow signal: the sheet's, else the 99.9th percentile of what was recorded (one spike is no span). */
function flowSpanOf(flow: Series | undefined, sheet: DataSheet, span: Span): number {
  if (sheet.flowSpan !== null && sheet.flowSpan > 0) return sheet.flowSpan;
  if (flow === undefined) return NaN;
  const stride = Math.max(1, Math.floor(flow.time.length / 20_000));
  const looked: number[] = [];
  for (let i = 0; i < flow.time.length; i += stride) {
    const t = flow.time[i] as number;
    if (t >= span.from && t < span.to && flow.good[i] === 1) looked.push(flow.value[i] as number);
  }
  const top = sortedQuantile(sortedFinite(looked), 0.999);
  return top > 0 ? top : NaN;
}

function boundsOf(role: SignalRole, flowSpan: number, spanKnown: boolean, limits: Limits): Bounds {
  const rules = limits.preparation;
  const largest = Number.MAX_VALUE;
  switch (role) {
    case 'demand':
    case 'position':
      return { low: rules.travelLow, high: rules.travelHigh };
    case 'flow':
      return {
        low: Number.isFinite(flowSpan) ? rules.flowLowShare * flowSpan : -largest,
        high: spanKnown ? rules.flowHighShare * flowSpan : largest,
      };
    case 'upstreamPressure':
    case 'downstreamPressure':
      return { low: 0, high: largest };
    case 'temperature':
      // K: outside this no process fluid; a column in °C or °F shows at once
      return { low: 20, high: 3_000 };
    case 'density':
      return { low: 1e-4, high: 25_000 };
    case 'setPoint':
    case 'processValue':
    case 'mode':
      return { low: -largest, high: largest };
  }
}

function setPointChanges(series: Series): Float64Array {
  const at: number[] = [];
  for (let i = 1; i < series.time.length; i++)
    if (series.value[i] !== series.value[i - 1]) at.push(series.time[i] as number);
  return Float64Array.from(at);
}

/** 1 within `samples` samples of any of the (ascending) moments; null where a drifting set point would protect everything. */
function nearAny(time: Float64Array, moments: Float64Array, samples: number): Uint8Array | null {
  if (moments.length === 0 || moments.length > time.length / 10) return null;
  const near = new Uint8Array(time.length);
  let i = 0;
  for (const moment of moments) {
    while (i < time.length && (time[i] as number) < moment) i++;
    near.fill(1, Math.max(0, i - samples), Math.min(time.length, i + samples + 1));
  }
  return near;
}
