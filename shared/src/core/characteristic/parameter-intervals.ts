import { type DropSource, type Interval } from '../assessment.js';
import { type Limits } from '../limits.js';
import { weightedLine } from '../statistics/regression.js';
import { basesAt, type KindFit, shapeParameter } from './fit-kinds.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/** rms relative residual up to which an exponential describes a curve that has no kind (our choice). */
const exponentialFits = 0.03;

/**
 * Change of coefficient (or flow) per 1 % of travel, in %, of the exponential through all bins, where one
 * describes the curve at all: a description, no kind.
 *
 * @returns null below the span and bins a kind needs, for a falling curve, and above 3 % rms
 */
export function descriptiveStep(bins: TravelBins, limits: Limits): Interval | null {
  if (100 * spanOf(bins) < limits.characteristic.kindSpan || bins.count < limits.characteristic.kindBins)
    return null;
  const { slope, intercept } = weightedLine(bins.h, bins.y, bins.weight);
  let sum = 0;
  let total = 0;
  let shh = 0;
  const mean = bins.h.reduce((a, b, i) => a + b * (bins.weight[i] as number), 0);
  const weights = bins.weight.reduce((a, b) => a + b, 0);
  for (let b = 0; b < bins.count; b++) {
    const w = bins.weight[b] as number;
    sum += w * ((bins.y[b] as number) - intercept - slope * (bins.h[b] as number)) ** 2;
    total += w;
    shh += w * ((bins.h[b] as number) - mean / weights) ** 2;
  }
  const rms = Math.sqrt(sum / total);
  if (!(slope > 0) || rms > exponentialFits) return null;
  const independent = 1 + (100 * spanOf(bins)) / limits.comparison.trimCorrelationTravel;
  const error = Math.max(rms, limits.uncertainty.trim) / Math.sqrt(independent) / Math.sqrt(shh / total);
  const step = (k: number) => 100 * Math.expm1(k / 100);
  return { value: step(slope), low: step(slope - 1.96 * error), high: step(slope + 1.96 * error) };
}

/**
 * Intervals of the extrapolated parameters: the resamples, and what no amount of data cures – meter, pressure
 * taps, and a trim that departs from its law by a few per cent over 15 % of travel at a time (§2.6, §3.4).
 */
export function parameterIntervals(
  best: KindFit,
  redrawn: readonly { intercept: number; slope: number }[],
  bins: TravelBins,
  source: DropSource,
  limits: Limits,
): Record<'ratedCoefficient' | 'rangeability' | 'percentStep', Interval> {
  const u = limits.uncertainty;
  const basis = basesAt(bins.h, limits).get(best.kind) as Float64Array;
  let total = 0;
  let mean = 0;
  for (let b = 0; b < bins.count; b++) {
    total += bins.weight[b] as number;
    mean += (bins.weight[b] as number) * (basis[b] as number);
  }
  mean /= total;
  let variance = 0;
  for (let b = 0; b < bins.count; b++)
    variance += ((bins.weight[b] as number) / total) * ((basis[b] as number) - mean) ** 2;
  const independent = 1 + (100 * spanOf(bins)) / limits.comparison.trimCorrelationTravel;
  const trim = u.trim / Math.sqrt(independent);
  const shape = shapeParameter(best) !== null;
  const slopeTrim = shape && variance > 0 ? trim / Math.sqrt(variance) : 0;
  const slopeError = Math.hypot(deviation(redrawn.map((r) => r.slope)), slopeTrim);
  const drop = source === 'modelled' ? u.designDropShut / 2 : 0;
  const levelError = Math.hypot(
    deviation(redrawn.map((r) => r.intercept)),
    u.meter,
    trim,
    drop,
    slopeTrim * mean,
  );
  const around = (value: number, error: number, f: (v: number) => number): Interval => ({
    value: f(value),
    low: f(value - 1.96 * error),
    high: f(value + 1.96 * error),
  });
  return {
    ratedCoefficient: around(best.intercept, levelError, Math.exp),
    rangeability: around(best.slope, slopeError, Math.exp),
    percentStep: around(best.slope, slopeError, (k) => 100 * Math.expm1(k / 100)),
  };
}

function deviation(values: readonly number[]): number {
  const mean = values.reduce((a, b) => a + b, 0) / values.length;
  return Math.sqrt(values.reduce((a, b) => a + (b - mean) ** 2, 0) / Math.max(1, values.length - 1));
}
