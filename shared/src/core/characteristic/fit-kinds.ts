import { type CharacteristicKind, characteristicKinds } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { huberWeight } from '../statistics/huber.js';
import { mad } from '../statistics/mad.js';
import { linear, modifiedParabolic, quickOpeningExponent } from './models.js';

/** One law fitted to bins in relative error: ln C(h) = intercept + slope·basis(h). */
export interface KindFit {
  readonly kind: CharacteristicKind;
  /** ln C₁₀₀ */
  readonly intercept: number;
  /** ln R of equal percentage, 1/n of quick opening, 1 for laws without a shape parameter */
  readonly slope: number;
  /** rms weighted relative residual over the bins */
  readonly rms: number;
  readonly aicc: number;
  /** Huber weight times bin weight of the last turn */
  readonly weights: Float64Array;
}

/** What the laws are fitted to: ln C at relative travels, with weights. */
export interface FitPoints {
  readonly h: Float64Array;
  readonly y: Float64Array;
  readonly weight: Float64Array;
}

/** Error added to every fit's mean square, so that perfection in one bin cannot decide (§3.3). */
const sigma0 = 0.005;

/**
 * Every law is a straight line after taking logarithms: ln C = ln C₁₀₀ + slope·basis(h). Laws without a shape
 * parameter have the slope fixed at 1.
 */
interface Law {
  basis(h: number): number;
  readonly slope: { readonly low: number; readonly high: number };
  /** parameters of the law */
  readonly free: number;
}

function lawOf(kind: CharacteristicKind, limits: Limits): Law {
  switch (kind) {
    case 'linear':
      return { basis: (h) => Math.log(linear(h)), slope: { low: 1, high: 1 }, free: 1 };
    case 'modified parabolic':
      return { basis: (h) => Math.log(modifiedParabolic(h)), slope: { low: 1, high: 1 }, free: 1 };
    case 'equal percentage':
      return {
        basis: (h) => h - 1,
        slope: {
          low: Math.log(limits.characteristic.rangeabilityLow),
          high: Math.log(limits.characteristic.rangeabilityHigh),
        },
        free: 2,
      };
    case 'quick opening':
      return {
        basis: (h) => Math.log(h),
        slope: { low: 1 / quickOpeningExponent.high, high: 1 / quickOpeningExponent.low },
        free: 2,
      };
  }
}

/** Bounds of a kind's slope in ln C = ln C₁₀₀ + slope·basis(h); equal where the law has no shape parameter. */
export function slopeBounds(
  kind: CharacteristicKind,
  limits: Limits,
): { readonly low: number; readonly high: number } {
  return lawOf(kind, limits).slope;
}

/** ln C of a fit at a relative travel above 0. */
export function fittedLog(
  fit: Pick<KindFit, 'kind' | 'intercept' | 'slope'>,
  h: number,
  limits: Limits,
): number {
  return fit.intercept + fit.slope * lawOf(fit.kind, limits).basis(h);
}

/** R of an equal-percentage fit, n of a quick-opening one, null for the others. */
export function shapeParameter(fit: Pick<KindFit, 'kind' | 'slope'>): number | null {
  if (fit.kind === 'equal percentage') return Math.exp(fit.slope);
  return fit.kind === 'quick opening' ? 1 / fit.slope : null;
}

/** The laws' bases at the points, worked out once for a fit and its many resamples. */
export function basesAt(h: Float64Array, limits: Limits): ReadonlyMap<CharacteristicKind, Float64Array> {
  return new Map(characteristicKinds.map((kind) => [kind, h.map((x) => lawOf(kind, limits).basis(x))]));
}

/**
 * All laws fitted to the points by iteratively reweighted least squares with Huber's weights, best first by AICc.
 *
 * @param points at least two with different h
 * @returns one fit a kind
 * Source: methods.md §3.2, §3.3 (Huber 1964; Akaike 1974; Hurvich & Tsai 1989)
 */
export function fitKinds(points: FitPoints, limits: Limits): KindFit[] {
  const bases = basesAt(points.h, limits);
  return characteristicKinds
    .map((kind) => fitKind(kind, bases.get(kind) as Float64Array, points, limits))
    .sort((a, b) => a.aicc - b.aicc);
}

function fitKind(kind: CharacteristicKind, basis: Float64Array, points: FitPoints, limits: Limits): KindFit {
  const law = lawOf(kind, limits);
  const rules = limits.characteristic;
  const n = points.y.length;
  const weights = points.weight.slice();
  const residual = new Float64Array(n);
  let line = lineThrough(basis, points.y, weights, law);
  for (let turn = 0; turn < rules.turns; turn++) {
    for (let i = 0; i < n; i++)
      residual[i] =
        ((points.y[i] as number) - line.intercept - line.slope * (basis[i] as number)) *
        Math.sqrt(points.weight[i] as number);
    // weighted residuals are in units of a bin's own error, so 1 is the smallest believable scale
    const scale = Math.max(mad(residual, 0), 1);
    for (let i = 0; i < n; i++)
      weights[i] = (points.weight[i] as number) * huberWeight((residual[i] as number) / scale, rules.huber);
    const next = lineThrough(basis, points.y, weights, law);
    const moved = Math.abs(next.intercept - line.intercept) + Math.abs(next.slope - line.slope);
    line = next;
    if (moved < 1e-12) break;
  }
  const mean = meanSquare(basis, points, line);
  return { kind, ...line, rms: Math.sqrt(mean), aicc: aicc(n, mean, law.free), weights };
}

/** One least-squares turn with weights given: what a resample needs. */
export function refitKind(
  kind: CharacteristicKind,
  basis: Float64Array,
  points: FitPoints,
  weights: Float64Array,
  limits: Limits,
): {
  readonly kind: CharacteristicKind;
  readonly intercept: number;
  readonly slope: number;
  readonly aicc: number;
} {
  const law = lawOf(kind, limits);
  const line = lineThrough(basis, points.y, weights, law);
  return { kind, ...line, aicc: aicc(points.y.length, meanSquare(basis, points, line), law.free) };
}

/**
 * Akaike's criterion corrected for small samples, on a mean square of relative residuals.
 *
 * @param n bins
 * @param free parameters of the law; the error counts as one more
 * @returns Infinity where there are too few bins for the correction
 */
export function aicc(n: number, mean: number, free: number): number {
  const K = free + 1;
  if (n - K - 1 <= 0) return Infinity;
  return n * Math.log(mean + sigma0 ** 2) + 2 * K + (2 * K * (K + 1)) / (n - K - 1);
}

function meanSquare(
  basis: Float64Array,
  points: FitPoints,
  line: { intercept: number; slope: number },
): number {
  let sum = 0;
  let total = 0;
  for (let i = 0; i < points.y.length; i++) {
    const w = points.weight[i] as number;
    const r = (points.y[i] as number) - line.intercept - line.slope * (basis[i] as number);
    sum += w * r * r;
    total += w;
  }
  return sum / total;
}

/** Weighted line with the slope kept in the law's bounds; a clipped slope leaves the intercept to be refitted. */
function lineThrough(
  basis: Float64Array,
  y: Float64Array,
  weights: Float64Array,
  law: Law,
): { intercept: number; slope: number } {
  let total = 0;
  let sb = 0;
  let sy = 0;
  for (let i = 0; i < y.length; i++) {
    const w = weights[i] as number;
    total += w;
    sb += w * (basis[i] as number);
    sy += w * (y[i] as number);
  }
  const mb = sb / total;
  const my = sy / total;
  let slope = law.slope.low;
  if (law.slope.high > law.slope.low) {
    let sbb = 0;
    let sby = 0;
    for (let i = 0; i < y.length; i++) {
      const w = weights[i] as number;
      const d = (basis[i] as number) - mb;
      sbb += w * d * d;
      sby += w * d * ((y[i] as number) - my);
    }
    slope = Math.min(law.slope.high, Math.max(law.slope.low, sbb > 0 ? sby / sbb : law.slope.low));
  }
  return { intercept: my - slope * mb, slope };
}
