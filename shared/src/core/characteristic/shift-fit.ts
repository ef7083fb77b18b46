import { type Limits } from '../limits.js';
import { huberMean, huberWeight } from '../statistics/huber.js';
import { mad } from '../statistics/mad.js';
import { aicc } from './fit-kinds.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/** The sheet's curve laid over the bins with a capacity ratio, and with a capacity ratio and a shift of travel. */
export interface ShiftFit {
  /** ln c with no shift */
  readonly capacity: number;
  readonly capacityAicc: number;
  /** ln c and z of the joint fit; z in relative travel, positive: the trim is more open than reported */
  readonly jointCapacity: number;
  readonly shift: number;
  readonly shiftError: number;
  readonly jointAicc: number;
  /** rms weighted residual of the joint fit */
  readonly jointRms: number;
  /** weighted mean of d ln Φ/dh over the bins: what one unit of shift does to capacity */
  readonly meanSensitivity: number;
  readonly bins: number;
}

/** A shift is looked for within this, relative travel. */
const widest = 0.2;

/**
 * Capacity or shift: L(h) = ln C₁₀₀ + ln c + ln Φ(h + z) fitted to bins with and without z.
 *
 * The standard error of z counts independent departures of the trim (one every 15 % of travel), not bins:
 * neighbouring bins repeat the same error. An equal-percentage law gives an infinite one.
 *
 * @param specified Φ of the sheet
 * @param lnRated ln C₁₀₀ of the sheet
 * @returns null with fewer than three usable bins
 * Source: methods.md §4.3
 */
export function fitShift(
  bins: TravelBins,
  specified: (h: number) => number,
  lnRated: number,
  limits: Limits,
): ShiftFit | null {
  const usable: number[] = [];
  for (let b = 0; b < bins.count; b++) {
    const expected = Math.log(specified(bins.h[b] as number));
    if ((bins.h[b] as number) * 100 >= limits.comparison.leastTravel && Number.isFinite(expected))
      usable.push(b);
  }
  if (usable.length < limits.characteristic.ratioBins) return null;
  const h = Float64Array.from(usable, (b) => bins.h[b] as number);
  const y = Float64Array.from(usable, (b) => (bins.y[b] as number) - lnRated);
  const weight = Float64Array.from(usable, (b) => bins.weight[b] as number);
  const away = (z: number, i: number) => (y[i] as number) - logPhi(specified, (h[i] as number) + z);

  const plain = y.map((_, i) => away(0, i));
  const capacity = huberMean(plain, weight, {
    k: limits.characteristic.huber,
    floor: limits.characteristic.weightFloor,
    turns: limits.characteristic.turns,
  });
  const capacityMean = meanSquare(
    plain.map((e) => e - capacity),
    weight,
  );

  const joint = jointFit(h, y, weight, specified, capacity, limits);
  const residual = y.map((_, i) => away(joint.z, i) - joint.c);
  const jointMean = meanSquare(residual, weight);
  const jointRms = Math.sqrt(jointMean);
  const g = h.map((x) => sensitivity(specified, x));
  const { mean, sd } = weightedSpread(g, weight);
  const sigma = Math.max(jointRms, limits.comparison.shiftResidualFloor);
  const independent = 1 + (100 * spanOf(bins)) / limits.comparison.trimCorrelationTravel;
  return {
    capacity,
    capacityAicc: aicc(h.length, capacityMean, 1),
    jointCapacity: joint.c,
    shift: joint.z,
    shiftError: sd > 1e-9 ? sigma / (Math.sqrt(independent) * sd) : Infinity,
    jointAicc: aicc(h.length, jointMean, 2),
    jointRms,
    meanSensitivity: mean,
    bins: h.length,
  };
}

/** A shift that is identified, large, sure and worth its parameter (§4.3). */
export function isOffset(fit: ShiftFit, limits: Limits): boolean {
  return (
    Math.abs(fit.shift) >= 3 * fit.shiftError &&
    100 * fit.shiftError <= limits.comparison.shiftStandardError &&
    100 * Math.abs(fit.shift) >= limits.findings.kinds['Travel offset'].raise &&
    fit.jointAicc <= fit.capacityAicc - limits.characteristic.aiccMargin
  );
}

/** ln Φ kept finite where a trial shift leaves 0 to 1. */
function logPhi(specified: (h: number) => number, h: number): number {
  const phi = specified(Math.min(1, Math.max(0.001, h)));
  return Math.log(Math.max(phi, 1e-6));
}

function sensitivity(specified: (h: number) => number, h: number): number {
  const step = 0.005;
  const high = Math.min(1, h + step);
  const low = Math.max(0.001, h - step);
  return (logPhi(specified, high) - logPhi(specified, low)) / (high - low);
}

/** Robust Gauss–Newton in (ln c, z), the step in z kept short because ln Φ bends near the seat. */
function jointFit(
  h: Float64Array,
  y: Float64Array,
  weight: Float64Array,
  specified: (h: number) => number,
  start: number,
  limits: Limits,
): { c: number; z: number } {
  let c = start;
  let z = 0;
  const scaled = new Float64Array(h.length);
  for (let turn = 0; turn < 2 * limits.characteristic.turns; turn++) {
    const r = y.map((v, i) => v - c - logPhi(specified, (h[i] as number) + z));
    const g = h.map((x) => sensitivity(specified, x + z));
    for (let i = 0; i < r.length; i++) scaled[i] = (r[i] as number) * Math.sqrt(weight[i] as number);
    const scale = Math.max(mad(scaled, 0), 1);
    const w = weight.map(
      (v, i) => v * huberWeight((scaled[i] as number) / scale, limits.characteristic.huber),
    );
    const G = weightedMean(g, w);
    const R = weightedMean(r, w);
    let sgg = 0;
    let sgr = 0;
    for (let i = 0; i < r.length; i++) {
      const dg = (g[i] as number) - G;
      sgg += (w[i] as number) * dg * dg;
      sgr += (w[i] as number) * dg * ((r[i] as number) - R);
    }
    const total = w.reduce((a, b) => a + b, 0);
    if (!(sgg > 1e-12 * total)) return { c: start, z: 0 };
    const step = Math.max(-0.02, Math.min(0.02, sgr / sgg));
    const next = Math.max(-widest, Math.min(widest, z + step));
    c += R - (next - z) * G;
    const moved = Math.abs(next - z);
    z = next;
    if (moved < 1e-7) break;
  }
  return { c, z };
}

function weightedMean(values: Float64Array, weights: Float64Array): number {
  let sum = 0;
  let total = 0;
  for (let i = 0; i < values.length; i++) {
    sum += (values[i] as number) * (weights[i] as number);
    total += weights[i] as number;
  }
  return sum / total;
}

function weightedSpread(values: Float64Array, weights: Float64Array): { mean: number; sd: number } {
  const mean = weightedMean(values, weights);
  return {
    mean,
    sd: Math.sqrt(
      meanSquare(
        values.map((v) => v - mean),
        weights,
      ),
    ),
  };
}

function meanSquare(values: Float64Array, weights: Float64Array): number {
  return weightedMean(
    values.map((v) => v * v),
    weights,
  );
}
