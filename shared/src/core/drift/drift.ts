import { type Drift } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { mad } from '../statistics/mad.js';
import { median } from '../statistics/quantile.js';
import { type FitWindows, jointFit, type JointFit } from './joint-fit.js';
import { fewest, finer, type Pace, type Segments, segmentsOf } from './segments.js';
import { seriesSteps } from './steps.js';
import { type Points, trendOf } from './trend.js';

const secondsPerDay = 86_400;

/**
 * Change of the valve's capacity within the record, against itself: by months, or by weeks, days, hours or minutes
 * as the record's length allows; its trend; and its steps, sought on the next finer pace and dated to a window.
 *
 * Capacity here is that of the windows' L: the flow coefficient, or the flow at given travel where no pressure drop
 * is known.
 *
 * @param sheet not needed by any rule yet; a known change date will come from there
 * @returns a refusal where too few periods hold enough steady windows, or share no travel
 * Source: methods.md §7.1 to §7.3
 */
export function driftOf(windows: SteadyWindows, _sheet: DataSheet, limits: Limits): Drift | CannotJudge {
  const used = usedWindows(windows);
  if (used.L.length < limits.windows.least)
    return cannotJudge('too-few-windows', { windows: used.L.length, needed: limits.windows.least });
  const segments = segmentsOf(used.time, limits);
  if (segments === null) return cannotJudge('too-few-months', { needed: limits.drift.segments });
  const fit = jointFit(used, segments.of, segments.count, limits.drift.binWidth);
  const reference = referenceOf(used.time, limits);
  const series = seriesOf(used, fit, segments, reference);
  if (series.length < fewest(segments.by, limits)) return cannotJudge('months-not-connected');
  const points = { time: series.map((p) => p.at), change: series.map((p) => p.change) };
  return {
    by: segments.by,
    reference,
    series,
    trend: trendOf(points, smallestChange(segments.by, limits), limits),
    steps: stepsOf(used, segments, limits, reference, { points, fit }),
  };
}

function usedWindows(windows: SteadyWindows): FitWindows {
  const { time, h, L, choked, count } = windows;
  const kept: number[] = [];
  for (let i = 0; i < count; i++) if (Number.isFinite(L[i]) && choked[i] !== 1) kept.push(i);
  return {
    time: Float64Array.from(kept, (i) => time[i] as number),
    h: Float64Array.from(kept, (i) => h[i] as number),
    L: Float64Array.from(kept, (i) => L[i] as number),
  };
}

/** Over days a meter wobbles further than over years in proportion: short paces ask for more. */
function smallestChange(by: Pace, limits: Limits): number {
  return by === 'month' || by === 'week' ? limits.drift.change : limits.drift.shortChange;
}

/** The first 60 days, or the first third of a shorter record. */
function referenceOf(time: Float64Array, limits: Limits): Drift['reference'] {
  const from = time[0] as number;
  const record = (time[time.length - 1] as number) - from;
  const rules = limits.drift;
  return { from, to: from + Math.min(rules.referenceDays * secondsPerDay, rules.referenceShare * record) };
}

function seriesOf(
  { time }: FitWindows,
  fit: JointFit,
  segments: Segments,
  reference: Drift['reference'],
): Drift['series'] {
  const members = Array.from({ length: segments.count }, (): number[] => []);
  for (let i = 0; i < time.length; i++) {
    const s = segments.of[i] as number;
    if (s >= 0 && Number.isFinite(fit.rest[i])) members[s]?.push(i);
  }
  const known = members.flatMap((windows, s) => {
    const change = fit.change[s] as number;
    if (Number.isNaN(change) || windows.length === 0) return [];
    const at = windows.reduce((sum, i) => sum + (time[i] as number), 0) / windows.length;
    return [{ at, change, windows: windows.length, error: errorOf(windows, time, fit, segments.by) }];
  });
  const inReference = known.filter(({ at }) => at <= reference.to);
  const zero = weightedMean(inReference.length > 0 ? inReference : known.slice(0, 1));
  return known.map(({ at, change, windows, error }) => ({
    at,
    change: change - zero,
    low: change - zero - 1.96 * error,
    high: change - zero + 1.96 * error,
    windows,
  }));
}

function weightedMean(points: readonly { change: number; windows: number }[]): number {
  const total = points.reduce((sum, p) => sum + p.windows, 0);
  return total > 0 ? points.reduce((sum, p) => sum + p.change * p.windows, 0) / total : 0;
}

/** Blocks of a segment of a shorter pace, whose medians are taken as independent. */
const blocksOfShort = 6;
const medianFactor = 1.2533;

/** Standard error of a segment's capacity, from the spread of its days (or sixths): windows of a day are not independent. */
function errorOf(windows: readonly number[], time: Float64Array, fit: JointFit, by: Pace): number {
  const first = time[windows[0] as number] as number;
  const length = (time[windows.at(-1) as number] as number) - first;
  const block = by === 'month' || by === 'week' ? secondsPerDay : length / blocksOfShort + 1;
  const blocks = new Map<number, number[]>();
  for (const i of windows) {
    const b = Math.floor(((time[i] as number) - first) / block);
    const held = blocks.get(b);
    if (held) held.push(fit.rest[i] as number);
    else blocks.set(b, [fit.rest[i] as number]);
  }
  const medians = [...blocks.values()].map((held) => median(held));
  if (medians.length >= 3) return (medianFactor * mad(medians)) / Math.sqrt(medians.length);
  return (medianFactor * mad(windows.map((i) => fit.rest[i] as number))) / Math.sqrt(windows.length);
}

/** Steps on the finest pace that still has enough in each segment: the series' own, or the next. */
function stepsOf(
  used: FitWindows,
  segments: Segments,
  limits: Limits,
  reference: Drift['reference'],
  coarse: { readonly points: Points; readonly fit: JointFit },
): Drift['steps'] {
  const fine =
    segments.by === 'month' || segments.by === 'week'
      ? segmentsOf(used.time, limits, finer(segments.by))
      : null;
  if (fine === null || fine.by === segments.by || fine.count <= segments.count)
    return dated(coarse.points, coarse.fit, used, segments.by, limits);
  const fit = jointFit(used, fine.of, fine.count, limits.drift.binWidth);
  const series = seriesOf(used, fit, fine, reference);
  const points = { time: series.map((p) => p.at), change: series.map((p) => p.change) };
  return dated(points, fit, used, segments.by, limits);
}

function dated(
  points: Points,
  fit: JointFit,
  { time }: FitWindows,
  by: Pace,
  limits: Limits,
): Drift['steps'] {
  const rules = {
    smallest: smallestChange(by, limits),
    errors: by === 'hour' || by === 'minute' ? limits.drift.shortStepErrors : limits.drift.stepErrors,
  };
  return seriesSteps(points, rules, limits).map(({ at, change }) => {
    const from = points.time[Math.max(0, at - 2)] as number;
    const to = points.time[Math.min(points.time.length - 1, at + 1)] as number;
    return { at: borderBetween(time, fit.rest, from, to), change };
  });
}

/** The moment between two windows at which what is left falls best into two levels. */
function borderBetween(time: Float64Array, rest: Float64Array, from: number, to: number): number {
  const at: number[] = [];
  const value: number[] = [];
  let sum = 0;
  for (let i = 0; i < time.length; i++) {
    const t = time[i] as number;
    if (t < from || t > to || !Number.isFinite(rest[i])) continue;
    at.push(t);
    value.push(rest[i] as number);
    sum += rest[i] as number;
  }
  const n = value.length;
  let best = (from + to) / 2;
  let most = -1;
  let before = 0;
  for (let k = 1; k < n; k++) {
    before += value[k - 1] as number;
    const gained = (before / k - (sum - before) / (n - k)) ** 2 * ((k * (n - k)) / n);
    if (gained <= most) continue;
    most = gained;
    best = ((at[k - 1] as number) + (at[k] as number)) / 2;
  }
  return best;
}
