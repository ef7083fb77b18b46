import { type Movement } from '../assessment.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge } from '../reasons.js';
import { medianInPlace, selectInPlace } from '../statistics/quantile.js';
import { weightedLine } from '../statistics/regression.js';

/** Differences looked at: spread evenly over the record, more would not move a median. */
const looks = 60_000;
const secondsPerDay = 86_400;
/** Demand bins of the curve of difference against demand, %. */
const binWidth = 5;
const binLeast = 20;

/**
 * Standing difference between demand and position, ε = u − x, in slow samples away from the ends.
 *
 * A positioner that is characterised shows ε as a smooth curve of demand with little spread about it; that is a
 * setting to be asked about, not a fault, and is marked.
 *
 * @param usable 1 where the valve was in service
 * @returns a refusal without both signals or without slow samples
 * Source: methods.md §6.5
 */
export function mismatch(prepared: Prepared, usable: Uint8Array, limits: Limits): Movement['mismatch'] {
  const rules = limits.movement;
  const { position: x, demand: u, step, count } = prepared;
  if (x === null) return cannotJudge('demand-only');
  if (u === null) return cannotJudge('no-demand');
  const back = Math.max(1, Math.round(rules.slowSeconds / step));
  const stride = Math.max(1, Math.ceil(count / looks));
  const room = Math.ceil(count / stride);
  const difference = new Float64Array(room);
  const demand = new Float64Array(room);
  const day = new Int32Array(room);
  let n = 0;
  let seen = 0;
  for (let i = back; i < count; i += stride) {
    if (usable[i] !== 1) continue;
    seen++;
    const asked = u[i] as number;
    if (!(asked >= rules.mismatchLow && asked <= rules.mismatchHigh)) continue;
    if (!(Math.abs(asked - (u[i - back] as number)) <= rules.slowMove)) continue;
    const away = asked - (x[i] as number);
    if (Number.isNaN(away)) continue;
    difference[n] = away;
    demand[n] = asked;
    day[n] = Math.floor((prepared.start + i * step) / secondsPerDay);
    n++;
  }
  if (n < rules.directionBinSamples || n < rules.slowShare * seen)
    return cannotJudge('too-few-slow-samples', { share: seen > 0 ? n / seen : 0 });
  const work = difference.slice(0, n);
  const offset = medianInPlace(work, 0, n);
  const low = selectInPlace(work, 0, n, Math.floor(0.025 * (n - 1)));
  const high = selectInPlace(work, 0, n, Math.ceil(0.975 * (n - 1)));
  const stood = difference.subarray(0, n);
  const asked = demand.subarray(0, n);
  const position = asked.map((value, i) => value - (stood[i] as number));
  return {
    offset,
    spread: high - low,
    sameSignDays: sameSignDays(stood, day.subarray(0, n), Math.sign(offset)),
    slope: slopeOf(asked, position),
    characterised: characterised(asked, stood, limits),
  };
}

/** Slope of position on demand; 1 where demand hardly moved, since nothing then says otherwise. */
function slopeOf(demand: Float64Array, position: Float64Array): number {
  let low = Infinity;
  let high = -Infinity;
  for (const v of demand) {
    if (v < low) low = v;
    if (v > high) high = v;
  }
  if (high - low < 2 * binWidth) return 1;
  return weightedLine(demand, position, new Float64Array(demand.length).fill(1)).slope;
}

/** Share of days whose own median difference has this sign. */
function sameSignDays(difference: Float64Array, day: Int32Array, sign: number): number {
  const work = difference.slice();
  let days = 0;
  let same = 0;
  for (let from = 0; from < day.length;) {
    let to = from + 1;
    while (to < day.length && day[to] === day[from]) to++;
    days++;
    if (Math.sign(medianInPlace(work, from, to)) === sign) same++;
    from = to;
  }
  return days > 0 ? same / days : 0;
}

/**
 * True where the difference follows a curve of demand: its bin medians depart from their straight line by more
 * than the raise threshold of a mismatch, and by more than three times the spread inside the bins.
 */
function characterised(demand: Float64Array, difference: Float64Array, limits: Limits): boolean {
  const bins = new Map<number, number[]>();
  for (let i = 0; i < demand.length; i++) {
    const b = Math.floor((demand[i] as number) / binWidth);
    const held = bins.get(b);
    if (held) held.push(difference[i] as number);
    else bins.set(b, [difference[i] as number]);
  }
  const at: number[] = [];
  const middle: number[] = [];
  const inside: number[] = [];
  for (const [b, held] of bins) {
    if (held.length < binLeast) continue;
    const sorted = Float64Array.from(held).sort();
    const quarter = (p: number) => sorted[Math.floor(p * (sorted.length - 1))] as number;
    at.push((b + 0.5) * binWidth);
    middle.push(quarter(0.5));
    inside.push((quarter(0.75) - quarter(0.25)) / 1.349);
  }
  if (at.length < 5) return false;
  const line = weightedLine(
    at,
    middle,
    at.map(() => 1),
  );
  const bend = Math.max(
    ...middle.map((m, j) => Math.abs(m - line.intercept - line.slope * (at[j] as number))),
  );
  const typical = inside.sort((a, b) => a - b)[inside.length >> 1] as number;
  return bend > limits.findings.kinds['Position mismatch'].raise && bend > 3 * typical;
}
