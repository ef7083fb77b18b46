import { type Grid } from './prepared.js';

/** Search range and demands on the peak (§1.6). */
export interface LagRules {
  /** s */
  readonly earliest: number;
  readonly latest: number;
  readonly correlation: number;
  readonly peakRatio: number;
}

/** How much later than travel the flow moves. */
export interface Lag {
  /** s; 0 where not identified */
  readonly seconds: number;
  readonly identified: boolean;
}

const blockPoints = 2_048;
const work = 12e6;

/**
 * Delay between travel and flow, from the cross-correlation of their first differences; levels are never
 * correlated, because a controller correlates those at every lag.
 *
 * Blocks spread over the record are used, as many as keep the work near 12 million products: enough for
 * hundreds of thousands of differences at a 10 s scan.
 *
 * @param use 1 where a grid point may be used
 * Source: methods.md §1.6
 */
export function lagBetween(
  travel: Float64Array,
  flow: Float64Array,
  use: Uint8Array,
  grid: Grid,
  rules: LagRules,
): Lag {
  const none = { seconds: 0, identified: false };
  const first = -Math.floor(-rules.earliest / grid.step);
  const last = Math.floor(rules.latest / grid.step);
  const lags = last - first + 1;
  if (last < 1 || grid.count < 3 * lags) return none;

  const correlation = new Float64Array(lags);
  const points = Math.min(blockPoints, grid.count);
  const blocks = Math.max(1, Math.min(Math.ceil(grid.count / points), Math.floor(work / (lags * points))));
  let sxx = 0;
  let sqq = 0;
  for (let b = 0; b < blocks; b++) {
    const from = blocks === 1 ? 0 : Math.floor((b * (grid.count - points)) / (blocks - 1));
    const dx = differences(travel, use, from, points);
    const dq = differences(flow, use, from, points);
    for (let i = 0; i < points; i++) {
      sxx += (dx[i] as number) ** 2;
      sqq += (dq[i] as number) ** 2;
    }
    for (let l = 0; l < lags; l++) {
      const shift = first + l;
      let sum = 0;
      for (let i = Math.max(0, -shift); i < Math.min(points, points - shift); i++)
        sum += (dx[i] as number) * (dq[i + shift] as number);
      correlation[l] = (correlation[l] as number) + sum;
    }
  }
  if (!(sxx > 0) || !(sqq > 0)) return none;
  const scale = Math.sqrt(sxx * sqq);
  let best = 0;
  for (let l = 0; l < lags; l++) {
    correlation[l] = (correlation[l] as number) / scale;
    if ((correlation[l] as number) > (correlation[best] as number)) best = l;
  }
  const peak = correlation[best] as number;
  let elsewhere = 0;
  for (let l = 0; l < lags; l++)
    if (Math.abs(l - best) > 3) elsewhere = Math.max(elsewhere, correlation[l] as number);
  const identified =
    peak >= rules.correlation && best > 0 && best < lags - 1 && peak >= rules.peakRatio * elsewhere;
  return { seconds: identified ? (first + best) * grid.step : 0, identified };
}

/** First differences of a block, clipped at six standard deviations; 0 where either end may not be used. */
function differences(column: Float64Array, use: Uint8Array, from: number, points: number): Float64Array {
  const out = new Float64Array(points);
  let sum = 0;
  let used = 0;
  for (let k = 1; k < points; k++) {
    const i = from + k;
    if (use[i] !== 1 || use[i - 1] !== 1) continue;
    const d = (column[i] as number) - (column[i - 1] as number);
    if (Number.isNaN(d)) continue;
    out[k] = d;
    sum += d * d;
    used++;
  }
  const limit = 6 * Math.sqrt(sum / Math.max(1, used));
  for (let k = 0; k < points; k++) out[k] = Math.max(-limit, Math.min(limit, out[k] as number));
  return out;
}

/** The column moved earlier by whole grid steps (later for negative ones), NaN at the end that is not known. */
export function shifted(column: Float64Array, steps: number): Float64Array {
  if (steps === 0) return column;
  const out = new Float64Array(column.length).fill(NaN);
  if (Math.abs(steps) >= column.length) return out;
  if (steps > 0) out.set(column.subarray(steps));
  else out.set(column.subarray(0, column.length + steps), -steps);
  return out;
}
