import { type Limits } from '../limits.js';
import { differenceSpread, levels, type Segment } from '../statistics/change-point.js';
import { theilSen } from '../statistics/theil-sen.js';
import { persistence, persistenceFactor, restSpread } from './persistence.js';
import { type Points } from './trend.js';

/** A step of the capacity series: index of its first point, and ln capacity after less before. */
export interface SeriesStep {
  readonly at: number;
  readonly change: number;
}

/** What a step must reach: ln capacity, and standard errors. */
export interface StepRules {
  readonly smallest: number;
  readonly errors: number;
}

/**
 * Steps of a capacity series, if it is steps it is made of.
 *
 * Levels by exact search with the handbook's penalty. They are believed where they describe the series better than
 * a straight line (a slow drift also falls into levels), and each step where it is at least `smallest`, three
 * spreads of neighbouring points, three spreads of what is left within the levels, and `errors` standard errors with
 * the resemblance of neighbours counted (the comparison and the last two are ours: a meter that wobbles over days
 * also has levels). Both spreads of what is left are taken about the series' largest single step, so that many
 * small levels cannot hide the wobble they follow.
 *
 * Source: methods.md §7.3; Killick et al. 2012
 */
export function seriesSteps(
  points: Points,
  { smallest, errors }: StepRules,
  limits: Limits,
): readonly SeriesStep[] {
  const { change: y } = points;
  const rules = limits.drift;
  const n = y.length;
  const sigma = Math.max(differenceSpread(y), 1e-6);
  if (n < 2 * rules.stepSegments || !Number.isFinite(sigma)) return [];
  const penalty = rules.stepPenalty * sigma ** 2 * Math.log(n);
  const found = levels(y, penalty, rules.stepSegments);
  if (found.length < 2 || costOfLine(points) + penalty <= costOf(y, found) + penalty * (found.length - 1))
    return [];
  const rest = restAbout(y, found.length > rules.mostLevels ? strongest(y, found) : found);
  const fitted = found.length > rules.mostLevels ? 2 : found.length;
  const spread = restSpread(rest, fitted);
  const factor = persistenceFactor(persistence(rest, fitted));
  return found.slice(1).flatMap((segment, i) => {
    const before = found[i] as Segment;
    const step = segment.mean - before.mean;
    const error =
      spread * factor * Math.sqrt(1 / (segment.to - segment.from) + 1 / (before.to - before.from));
    const least = Math.max(smallest, rules.stepSpreads * sigma, rules.stepSpreads * spread, errors * error);
    return Math.abs(step) >= least ? [{ at: segment.from, change: step }] : [];
  });
}

function restAbout(y: readonly number[], found: readonly Segment[]): number[] {
  return found.flatMap(({ from, to }) => {
    const part = y.slice(from, to);
    const mean = part.reduce((sum, v) => sum + v, 0) / part.length;
    return part.map((v) => v - mean);
  });
}

function costOf(y: readonly number[], found: readonly Segment[]): number {
  return restAbout(y, found).reduce((sum, v) => sum + v * v, 0);
}

function costOfLine({ time, change }: Points): number {
  const { slope } = theilSen(time, change);
  if (Number.isNaN(slope)) return Infinity;
  const rest = change.map((y, i) => y - slope * (time[i] as number));
  const mean = rest.reduce((sum, v) => sum + v, 0) / rest.length;
  return rest.reduce((sum, v) => sum + (v - mean) ** 2, 0);
}

/** The two levels left when only the border that explains most is kept. */
function strongest(y: readonly number[], found: readonly Segment[]): readonly Segment[] {
  const whole = (from: number, to: number): Segment => ({
    from,
    to,
    mean: y.slice(from, to).reduce((sum, v) => sum + v, 0) / (to - from),
  });
  const n = y.length;
  const pairs = found.slice(1).map(({ from }) => [whole(0, from), whole(from, n)] as const);
  return pairs.reduce((best, pair) => (costOf(y, pair) < costOf(y, best) ? pair : best));
}
