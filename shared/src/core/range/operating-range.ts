import { type OperatingRange } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type Prepared, valveState } from '../preparation/prepared.js';
import { settledFrom } from './after-starts.js';

/** Travel is counted in steps of this, %: percentiles are exact to half of it without sorting a million values. */
const histogramStep = 0.02;
const lowest = -6;
const cells = Math.ceil(112 / histogramStep);

const secondsPerDay = 86_400;

/**
 * Where a valve has spent its time, from a grid of equal steps, so that every share is a share of time.
 *
 * Only time in service counts, the minutes after a start left out; time at the shut end while flow passes counts
 * too. Below the days the handbook asks for the numbers stand but `judged` is false and there is no verdict.
 *
 * @param logCurve ln of the as-found curve, for the rangeability used, and the travel (0 to 1) it covers; null without one
 * @returns null where the valve was never in service
 * Source: methods.md §5.1, §5.3
 */
export function operatingRange(
  prepared: Prepared,
  sheet: DataSheet,
  logCurve: { readonly at: (h: number) => number; readonly from: number; readonly to: number } | null,
  limits: Limits,
): OperatingRange | null {
  const band = sheet.designBand ?? limits.range.bands[sheet.style];
  const all = tally(prepared, band, limits, 0);
  if (all.running === 0) return null;
  const shares = sharesOf(all);
  const judged = (all.running * prepared.step) / secondsPerDay >= limits.range.days - 1e-6;
  const covered =
    logCurve !== null && shares.p5 >= 100 * logCurve.from - 2 && shares.p95 <= 100 * logCurve.to + 2;
  const started = prepared.state.some((s) => (s & valveState.settling) !== 0);
  const settled = started ? tally(prepared, band, limits, limits.range.startHours * 3_600) : all;
  return {
    judged,
    ...shares,
    short: all.shortKnown > 0 ? all.short / all.running : null,
    band: { low: band.low, high: band.high },
    ridge: Array.from(all.ridge, (n) => n / all.running),
    verdict: judged ? verdictOf(sharesOf(all), shortOf(all), limits) : null,
    verdictAfterStarts:
      judged && settled.running > 0 ? verdictOf(sharesOf(settled), shortOf(settled), limits) : null,
    rangeabilityUsed:
      covered && logCurve !== null
        ? Math.exp(logCurve.at(shares.p95 / 100) - logCurve.at(shares.p5 / 100))
        : null,
  };
}

interface Tally {
  readonly running: number;
  readonly histogram: Float64Array;
  readonly ridge: Float64Array;
  readonly belowLow: number;
  readonly aboveHigh: number;
  readonly atSeat: number;
  readonly atOpen: number;
  readonly pinned: number;
  readonly short: number;
  readonly shortKnown: number;
}

function tally(
  prepared: Prepared,
  band: { readonly low: number; readonly high: number },
  limits: Limits,
  afterStart: number,
): Tally {
  const { travel, demand, flow, state, setPoint, processValue } = prepared;
  const cutOff = limits.preparation.meterCutOffShare * prepared.flowSpan;
  const shortBy = limits.range.shortShare * processSpan(prepared);
  const settled = afterStart > 0 ? settledFrom(prepared, afterStart) : null;
  const histogram = new Float64Array(cells);
  const ridge = new Float64Array(100);
  let running = 0;
  let belowLow = 0;
  let aboveHigh = 0;
  let atSeat = 0;
  let atOpen = 0;
  let pinned = 0;
  let short = 0;
  let shortKnown = 0;
  for (let i = 0; i < prepared.count; i++) {
    const x = travel[i] as number;
    const s = state[i] as number;
    if (Number.isNaN(x) || (s & (valveState.settling | valveState.outage)) !== 0) continue;
    if (settled !== null && settled[i] === 0) continue;
    const demanded = demand === null ? x : (demand[i] as number);
    const u = Number.isNaN(demanded) ? x : demanded;
    const passing = flow !== null && (flow[i] as number) > cutOff;
    const seat = (u <= 1 || x <= 1) && passing;
    if ((s & valveState.inService) === 0 && !seat) continue;
    running++;
    const cell = Math.floor((x - lowest) / histogramStep + 1e-9);
    const kept = Math.max(0, Math.min(cells - 1, cell));
    histogram[kept] = (histogram[kept] as number) + 1;
    const percent = Math.max(0, Math.min(99, Math.floor(x + 1e-9)));
    ridge[percent] = (ridge[percent] as number) + 1;
    if (x < band.low) belowLow++;
    if (x > band.high) aboveHigh++;
    const open = u >= 99 || x >= 99;
    if (seat) atSeat++;
    if (open) atOpen++;
    const automatic = (s & valveState.manual) === 0;
    if (automatic && (open || (u <= 1 && passing))) pinned++;
    if (setPoint === null || processValue === null) continue;
    const error = (setPoint[i] as number) - (processValue[i] as number);
    if (Number.isNaN(error)) continue;
    shortKnown++;
    if (automatic && u >= limits.range.shortTravel && error > shortBy) short++;
  }
  return { running, histogram, ridge, belowLow, aboveHigh, atSeat, atOpen, pinned, short, shortKnown };
}

/** Span of the process value: that of the flow where it is the flow that is controlled, else the largest set point seen. */
function processSpan(prepared: Prepared): number {
  const { setPoint, processValue, flow, flowSpan } = prepared;
  if (processValue === null) return NaN;
  if (isControlledFlow(processValue, flow)) return flowSpan;
  let largest = 0;
  if (setPoint !== null) for (const v of setPoint) if (Math.abs(v) > largest) largest = Math.abs(v);
  return largest;
}

/** True where the process value is the flow of this valve: within 2 % of each other nearly all the time. */
export function isControlledFlow(processValue: Float64Array | null, flow: Float64Array | null): boolean {
  if (processValue === null || flow === null) return false;
  const stride = Math.max(1, Math.floor(flow.length / 2_000));
  let near = 0;
  let known = 0;
  for (let i = 0; i < flow.length; i += stride) {
    const q = flow[i] as number;
    const away = Math.abs((processValue[i] as number) - q);
    if (Number.isNaN(away)) continue;
    known++;
    if (away <= 0.02 * Math.abs(q)) near++;
  }
  return known > 0 && near >= 0.9 * known;
}

function sharesOf(t: Tally) {
  return {
    p5: travelPercentile(t, 0.05),
    p50: travelPercentile(t, 0.5),
    p95: travelPercentile(t, 0.95),
    belowLow: t.belowLow / t.running,
    aboveHigh: t.aboveHigh / t.running,
    atSeat: t.atSeat / t.running,
    atOpen: t.atOpen / t.running,
    pinned: t.pinned / t.running,
  };
}

function shortOf(t: Tally): number {
  return t.shortKnown > 0 ? t.short / t.running : 0;
}

function travelPercentile(t: Tally, p: number): number {
  const target = p * t.running;
  let reached = 0;
  for (let c = 0; c < cells; c++) {
    const n = t.histogram[c] as number;
    if (n > 0 && reached + n >= target) return lowest + c * histogramStep;
    reached += n;
  }
  return NaN;
}

function verdictOf(
  shares: ReturnType<typeof sharesOf>,
  short: number,
  limits: Limits,
): NonNullable<OperatingRange['verdict']> {
  const { kinds, belowBandShare, shortShare } = limits.findings;
  const oversized =
    shares.p95 < kinds.Oversized.raise ||
    (shares.belowLow >= belowBandShare.raise && shares.p95 < limits.range.oversizedTop);
  const low = oversized || shares.belowLow >= belowBandShare.raise;
  const undersized = shares.aboveHigh >= kinds.Undersized.raise || short >= shortShare.raise;
  if (low && undersized) return 'rangeability not enough';
  if (oversized) return 'oversized';
  if (undersized) return 'undersized';
  return shares.p5 >= 20 && shares.p95 <= 80 ? 'well sized' : 'acceptable';
}
