import { type Deviation, type Interval } from '../assessment.js';
import { type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median, quantile } from '../statistics/quantile.js';
import { dayResamples } from './day-resamples.js';
import { fitShift, isOffset, type ShiftFit } from './shift-fit.js';
import { specifiedCurve } from './specified-curve.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/** The comparison, or why there is none. */
export interface Comparison {
  readonly deviation: Deviation | null;
  readonly refusal: CannotJudge | null;
}

/**
 * As found against as specified: capacity ratio with both intervals, travel shift where it can be told from
 * capacity, and what is left of the shape by travel with the standard's tolerance there.
 *
 * @param windows with coefficients; an installed basis is refused
 * @param random for the day resamples of the repeatability interval
 * Source: methods.md §4
 */
export function compareWithSheet(
  windows: SteadyWindows,
  bins: TravelBins,
  sheet: DataSheet,
  random: () => number,
  limits: Limits,
): Comparison {
  const refuse = (refusal: CannotJudge): Comparison => ({ deviation: null, refusal });
  if (windows.source === 'none') return refuse(cannotJudge('no-pressures'));
  if (sheet.ratedCoefficient === null || !(sheet.ratedCoefficient > 0))
    return refuse(cannotJudge('no-rated-coefficient'));
  const specified = specifiedCurve(sheet);
  if (specified === null) return refuse(cannotJudge('no-characteristic-specified'));
  const rules = limits.characteristic;
  const span = 100 * spanOf(bins);
  if (bins.count < rules.ratioBins)
    return refuse(cannotJudge('too-few-bins', { bins: bins.count, needed: rules.ratioBins }));
  if (span < rules.ratioSpan) return refuse(cannotJudge('span-too-small', { span, needed: rules.ratioSpan }));
  if (bins.totalPeriods < rules.ratioPeriods)
    return refuse(
      cannotJudge('record-too-short', { windows: bins.totalPeriods, needed: rules.ratioPeriods }),
    );
  const lnRated = Math.log(sheet.ratedCoefficient);
  const fit = fitShift(bins, specified, lnRated, limits);
  if (fit === null) return refuse(cannotJudge('too-few-bins', { bins: bins.count, needed: rules.ratioBins }));
  return {
    deviation: deviationFrom(windows, bins, fit, { specified, lnRated }, random, limits),
    refusal: null,
  };
}

interface Specified {
  readonly specified: (h: number) => number;
  readonly lnRated: number;
}

function deviationFrom(
  windows: SteadyWindows,
  bins: TravelBins,
  fit: ShiftFit,
  { specified, lnRated }: Specified,
  random: () => number,
  limits: Limits,
): Deviation {
  const identifiable = 100 * fit.shiftError <= limits.comparison.shiftStandardError;
  const shifted = isOffset(fit, limits);
  const capacity = shifted ? fit.jointCapacity : fit.capacity;
  const shift = shifted ? fit.shift : 0;

  const redrawn = redrawnCapacity(windows, bins, { specified, lnRated }, shift, random, limits);
  const repeatability = (quantile(redrawn, 0.975) - quantile(redrawn, 0.025)) / 3.92 || 0;
  const absolute = Math.hypot(repeatability, systematicError(windows, limits));

  const byTravel: { travel: number; percent: number; tolerance: number }[] = [];
  let worst: { travel: number; percent: number } | null = null;
  for (let b = 0; b < bins.count; b++) {
    const h = bins.h[b] as number;
    const phi = specified(Math.min(1, Math.max(0, h + shift)));
    const shape = (bins.y[b] as number) - lnRated - Math.log(phi) - capacity;
    if (!Number.isFinite(shape)) continue;
    const percent = 100 * Math.expm1(shape);
    byTravel.push({ travel: 100 * h, percent, tolerance: coefficientTolerance(phi) });
    if (100 * h < limits.comparison.leastTravel) continue;
    // By ratio: half the specified coefficient is as far away as twice it.
    if (worst === null || Math.abs(shape) > Math.abs(Math.log1p(worst.percent / 100)))
      worst = { travel: 100 * h, percent };
  }
  const spread = 196 * fit.shiftError;
  return {
    capacityRatio: ratioInterval(capacity, absolute),
    capacityRatioRepeatability: ratioInterval(capacity, repeatability),
    travelShift: identifiable
      ? { value: 100 * fit.shift, low: 100 * fit.shift - spread, high: 100 * fit.shift + spread }
      : null,
    equivalentShift:
      !identifiable && fit.meanSensitivity > 0 ? (100 * fit.capacity) / fit.meanSensitivity : null,
    offset: shifted,
    notSeparable: identifiable ? null : whyNotSeparable(fit, bins),
    worst,
    byTravel,
    suspectedUnitFactor: unitFactorNear(Math.exp(capacity)),
  };
}

function whyNotSeparable(fit: ShiftFit, bins: TravelBins): CannotJudge {
  return Number.isFinite(fit.shiftError) && (bins.h[0] as number) > 0.2
    ? cannotJudge('low-travel-not-visited', { standardError: 100 * fit.shiftError })
    : cannotJudge('not-separable');
}

function redrawnCapacity(
  windows: SteadyWindows,
  bins: TravelBins,
  { specified, lnRated }: Specified,
  shift: number,
  random: () => number,
  limits: Limits,
): Float64Array {
  const resample = dayResamples(windows, bins, windows.L, bins.y, random);
  const expected = bins.h.map((h) => Math.log(specified(Math.min(1, Math.max(0, h + shift)))) + lnRated);
  const y = new Float64Array(bins.count);
  return Float64Array.from({ length: limits.characteristic.bandResamples }, () => {
    resample(y);
    let sum = 0;
    let total = 0;
    for (let b = 0; b < bins.count; b++) {
      const e = (y[b] as number) - (expected[b] as number);
      if (!Number.isFinite(e) || 100 * (bins.h[b] as number) < limits.comparison.leastTravel) continue;
      sum += (bins.weight[b] as number) * e;
      total += bins.weight[b] as number;
    }
    return sum / total;
  });
}

/** What more data do not cure, in ln C: meter, pressure taps (or the design drop), and the trim itself (§2.6). */
function systematicError(windows: SteadyWindows, limits: Limits): number {
  const u = limits.uncertainty;
  const drop = median(windows.pressureDrop);
  let pressure: number;
  if (windows.source === 'modelled' && windows.line !== null) {
    const { a, b } = windows.line;
    const q = median(windows.flow);
    pressure = Math.hypot(u.designDropShut * a, u.designDropSlope * b * q * q) / drop;
  } else if (windows.source === 'modelled') pressure = u.designDropShut;
  else pressure = (Math.SQRT2 * u.pressureSpan * quantile(windows.upstreamPressure, 1)) / drop;
  return Math.hypot(u.meter, pressure / 2, u.trim) || u.trim;
}

function ratioInterval(ln: number, error: number): Interval {
  return { value: Math.exp(ln), low: Math.exp(ln - 1.96 * error), high: Math.exp(ln + 1.96 * error) };
}

/**
 * Tolerance of a stated flow coefficient, ± %.
 *
 * @param phi relative flow coefficient, above 0
 * @returns NaN for phi not above 0
 * @example coefficientTolerance(0.5) // 11.49
 * Source: IEC 60534-2-4, ±10·(1/Φ)^0.2 % (from memory; methods.md §4.2)
 */
export function coefficientTolerance(phi: number): number {
  return phi > 0 ? 10 * (1 / phi) ** 0.2 : NaN;
}

/** Cv for Kv, and flows in US gal/min, litres or m³/h taken for each other (§9.1). */
const unitFactors = [1.156, 4.403, 3.785, 0.2271];

function unitFactorNear(c: number): number | null {
  for (const factor of unitFactors)
    for (const candidate of [factor, 1 / factor]) if (Math.abs(c / candidate - 1) <= 0.03) return candidate;
  return null;
}
