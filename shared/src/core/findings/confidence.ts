import { type Limits } from '../limits.js';
import { normalCumulative } from '../statistics/normal.js';
import { type Chapters, type Measure } from './finding-rule.js';

/** Periods and running days from which more data add no confidence (§9.1). */
const enough = { periods: 30, days: 14 };
/** What each kind of source is worth (§9.1). */
const source = { demandForPosition: 0.8, modelledDrop: 0.7, installed: 0.6 };
/** Least share of full confidence for a plain fact of a short record (our choice). */
const factOfShortRecord = 0.6;

/**
 * Confidence of a measure, 0 to 1: amount of data × chance that the figure truly is beyond its threshold × what
 * the signals behind it are worth.
 *
 * Figures that rest on pressures count periods of steady windows; those on travel alone count slots in service.
 *
 * Source: methods.md §9.1
 */
export function confidenceOf(measure: Measure, chapters: Chapters): number {
  const { window } = chapters;
  const periods = measure.rests.onPressures ? window.periods : window.runningPeriods;
  const amount =
    Math.min(1, Math.sqrt(periods / enough.periods)) *
    Math.min(1, Math.sqrt(window.runningDays / enough.days));
  const data = measure.ofRecord === true ? factOfShortRecord + (1 - factOfShortRecord) * amount : amount;
  return data * certainty(measure) * sourceShare(measure, chapters);
}

function certainty(measure: Measure): number {
  const { standardError, raise, actNow, x } = measure;
  if (standardError === null || !(standardError > 0)) return 1;
  return normalCumulative((Math.sign(actNow - raise) * (x - raise)) / standardError);
}

function sourceShare({ rests }: Measure, { travelSource, pressureDrop }: Chapters): number {
  let share = 1;
  if (rests.onPosition && travelSource === 'demand') share = Math.min(share, source.demandForPosition);
  if (rests.onPressures && pressureDrop === 'modelled') share = Math.min(share, source.modelledDrop);
  if (rests.onPressures && pressureDrop === 'none') share = Math.min(share, source.installed);
  return share;
}

/**
 * Severity of a measure at or beyond its raise threshold: 0.2 there, 1 at "act now" and beyond, times the kind's
 * own factor.
 *
 * Source: methods.md §9.1
 */
export function severityOf(measure: Pick<Measure, 'x' | 'raise' | 'actNow' | 'severityFactor'>): number {
  const way = (measure.x - measure.raise) / (measure.actNow - measure.raise);
  return (0.2 + 0.8 * Math.max(0, Math.min(1, way))) * measure.severityFactor;
}

/** True where a figure is at or beyond its raise threshold, on whichever side that lies. */
export function isBeyond(x: number, raise: number, actNow: number): boolean {
  return Math.sign(actNow - raise) * (x - raise) >= 0;
}

/** Least confidence a finding needs. */
export function isConfident(confidence: number, limits: Limits): boolean {
  return confidence >= limits.findings.confidence - 1e-9;
}
