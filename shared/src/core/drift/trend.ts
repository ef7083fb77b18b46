import { type Drift } from '../assessment.js';
import { type Limits } from '../limits.js';
import { correctedTrendTest } from '../statistics/mann-kendall.js';
import { theilSen } from '../statistics/theil-sen.js';
import { persistence, persistenceFactor, restSpread } from './persistence.js';

/** A capacity series: s UTC and ln capacity, of one length, ascending, without NaN. */
export interface Points {
  readonly time: readonly number[];
  readonly change: readonly number[];
}

/** Share of the total change that the newest point must show. */
const confirming = 0.5;

/**
 * Change of capacity over the record: Theil–Sen slope times its length, with Mann–Kendall's p.
 *
 * Significance alone raises nothing. Confirmed is a change that is also large (`smallest`, and three spreads of
 * neighbouring points), shown by the newest point, and beyond three standard errors where neighbouring points
 * resemble each other: a meter that wobbles over weeks drifts on paper (the last is ours).
 *
 * @param smallest ln capacity
 * Source: methods.md §7.2; Theil 1950; Sen 1968; Hamed & Rao 1998
 */
export function trendOf(
  points: Points,
  smallest: number,
  limits: Limits,
): Exclude<Drift['trend'], { judged: false }> {
  const { time, change: y } = points;
  const n = y.length;
  const length = recordLength(time);
  const line = theilSen(time, y);
  const { p } = correctedTrendTest(time, y);
  const change = line.slope * length;
  const error = standardError(points, line.slope, line.intercept);
  const rules = limits.drift;
  const newest = (y[n - 1] as number) - (line.intercept + line.slope * (time[0] as number));
  const confirmed =
    p < rules.significance &&
    Math.abs(change) >=
      Math.max(smallest, rules.changeSpreads * neighbourSpread(y), rules.changeSpreads * error) &&
    newest * Math.sign(change) >= confirming * Math.abs(change);
  return {
    change,
    low: Math.min(line.low * length, change - 1.96 * error),
    high: Math.max(line.high * length, change + 1.96 * error),
    p,
    confirmed,
  };
}

/** Of the total change, from what is left about the line and how much neighbours resemble each other. */
function standardError({ time, change }: Points, slope: number, intercept: number): number {
  const n = time.length;
  const mean = time.reduce((sum, t) => sum + t, 0) / n;
  const rest = change.map((y, i) => y - intercept - slope * (time[i] as number));
  const about = time.reduce((sum, t) => sum + (t - mean) ** 2, 0);
  const length = recordLength(time);
  return (restSpread(rest, 2) * persistenceFactor(persistence(rest, 2)) * length) / Math.sqrt(about);
}

/**
 * Length of the record that points stand for, s: each is the middle of its period, so half a period lies before the
 * first and after the last. Without them a year by months shows eleven twelfths of its change.
 */
function recordLength(time: readonly number[]): number {
  const n = time.length;
  return (((time[n - 1] as number) - (time[0] as number)) * n) / (n - 1);
}

/** Standard deviation of neighbouring differences over √2. */
function neighbourSpread(y: readonly number[]): number {
  const differences = y.slice(1).map((v, i) => v - (y[i] as number));
  const mean = differences.reduce((sum, d) => sum + d, 0) / differences.length;
  return (
    restSpread(
      differences.map((d) => d - mean),
      1,
    ) / Math.SQRT2
  );
}
