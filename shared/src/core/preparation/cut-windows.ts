import { type Limits } from '../limits.js';
import { sortedQuantile } from '../statistics/quantile.js';
import { type Prepared, valveState } from './prepared.js';
import { type WindowLength } from './window-lengths.js';

/** Accepted windows before a flow coefficient is worked out: means over each window, one entry a window. */
export interface CutWindows {
  readonly count: number;
  readonly length: WindowLength;
  readonly time: Float64Array;
  readonly h: Float64Array;
  readonly flow: Float64Array;
  /** NaN where not recorded */
  readonly upstreamPressure: Float64Array;
  readonly downstreamPressure: Float64Array;
  readonly temperature: Float64Array;
  readonly density: Float64Array;
  readonly slot: Int32Array;
  readonly day: Int32Array;
  readonly leftOut: Readonly<Record<string, number>>;
}

const secondsPerDay = 86_400;

/**
 * Non-overlapping windows of one length, each kept only where the valve worked steadily in it.
 *
 * @param needPressures true: both pressures must be known in the window and their difference stand above its uncertainty
 * @returns windows in time order, and how many were refused for which reason
 * Source: methods.md §1.9
 */
export function cutWindows(
  prepared: Prepared,
  length: WindowLength,
  needPressures: boolean,
  limits: Limits,
): CutWindows {
  const rules = limits.windows;
  const { travel, flow, state, step } = prepared;
  const points = Math.max(1, Math.round(length.seconds / step));
  const possible = flow === null ? 0 : Math.floor(prepared.count / points);
  const column = () => new Float64Array(possible);
  const out = {
    time: column(),
    h: column(),
    flow: column(),
    upstreamPressure: column(),
    downstreamPressure: column(),
    temperature: column(),
    density: column(),
    slot: new Int32Array(possible),
    day: new Int32Array(possible),
  };
  const refused = { 'not in service': 0, incomplete: 0, 'not steady': 0, 'end of travel': 0, 'low drop': 0 };
  const P1 = needPressures ? prepared.upstreamPressure : null;
  const P2 = needPressures ? prepared.downstreamPressure : null;
  const leastDrop = needPressures
    ? rules.pressureDropUncertainties * Math.SQRT2 * limits.uncertainty.pressureSpan * largest(P1)
    : 0;
  const buffer = new Float64Array(points);
  const half = points >> 1;
  const busy = valveState.settling | valveState.frozen | valveState.outage;
  let n = 0;
  for (let w = 0; w < possible; w++) {
    const from = w * points;
    const to = from + points;
    let inService = 0;
    let good = 0;
    let sumX = 0;
    let sumQ = 0;
    let firstX = 0;
    let firstQ = 0;
    let firstGood = 0;
    let sum1 = 0;
    let sum2 = 0;
    let low = Infinity;
    let high = -Infinity;
    for (let i = from; i < to; i++) {
      const s = state[i] as number;
      if ((s & valveState.inService) === 0 || (s & busy) !== 0) continue;
      inService++;
      const x = travel[i] as number;
      const q = (flow as Float64Array)[i] as number;
      const p1 = P1 === null ? 0 : (P1[i] as number);
      const p2 = P2 === null ? 0 : (P2[i] as number);
      // one sum finds any value that is not known
      if (Number.isNaN(x + q + p1 + p2)) continue;
      buffer[good++] = x;
      sumX += x;
      sumQ += q;
      sum1 += p1;
      sum2 += p2;
      if (x < low) low = x;
      if (x > high) high = x;
      if (i - from < half) {
        firstX += x;
        firstQ += q;
        firstGood++;
      }
    }
    if (inService < rules.coverage * points) {
      refused['not in service']++;
      continue;
    }
    if (good < rules.coverage * points) {
      refused.incomplete++;
      continue;
    }
    const x = sumX / good;
    const q = sumQ / good;
    if (!(x > rules.travelLow && x < rules.travelHigh) || !(q >= rules.flowLowShare * prepared.flowSpan)) {
      refused['end of travel']++;
      continue;
    }
    const secondGood = good - firstGood;
    const drifting =
      firstGood > 0 &&
      secondGood > 0 &&
      (Math.abs((sumX - firstX) / secondGood - firstX / firstGood) > rules.positionDrift ||
        Math.abs((sumQ - firstQ) / secondGood - firstQ / firstGood) > rules.flowDriftShare * q);
    if (drifting || (high - low > rules.positionRange && spread(buffer, good) > rules.positionRange)) {
      refused['not steady']++;
      continue;
    }
    if (needPressures && !((sum1 - sum2) / good > leastDrop)) {
      refused['low drop']++;
      continue;
    }
    const time = prepared.start + (from + (points - 1) / 2) * step;
    out.time[n] = time;
    out.h[n] = x / 100;
    out.flow[n] = q;
    out.upstreamPressure[n] = meanOf(prepared.upstreamPressure, from, to);
    out.downstreamPressure[n] = meanOf(prepared.downstreamPressure, from, to);
    out.temperature[n] = meanOf(prepared.temperature, from, to);
    out.density[n] = meanOf(prepared.density, from, to);
    out.slot[n] = Math.floor(time / length.slotSeconds);
    out.day[n] = Math.floor(time / secondsPerDay);
    n++;
  }
  return {
    count: n,
    length,
    time: out.time.subarray(0, n),
    h: out.h.subarray(0, n),
    flow: out.flow.subarray(0, n),
    upstreamPressure: out.upstreamPressure.subarray(0, n),
    downstreamPressure: out.downstreamPressure.subarray(0, n),
    temperature: out.temperature.subarray(0, n),
    density: out.density.subarray(0, n),
    slot: out.slot.subarray(0, n),
    day: out.day.subarray(0, n),
    leftOut: refused,
  };
}

/** 5th to 95th percentile of the first n values; the buffer is sorted in place. */
function spread(buffer: Float64Array, n: number): number {
  const sorted = buffer.subarray(0, n).sort();
  return sortedQuantile(sorted, 0.95) - sortedQuantile(sorted, 0.05);
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

function largest(column: Float64Array | null): number {
  let top = 0;
  if (column !== null) for (const v of column) if (v > top) top = v;
  return top;
}
