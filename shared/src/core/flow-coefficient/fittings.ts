import { N2, N5 } from './constants.js';

/** Losses of the reducers at a valve that is smaller than its line, as velocity heads of the valve's bore. */
export interface FittingLosses {
  /** ΣK = K1 + K2 + KB1 − KB2 */
  readonly sum: number;
  /** K1 + KB1 */
  readonly inlet: number;
}

const none: FittingLosses = { sum: 0, inlet: 0 };

/**
 * Losses of concentric reducers.
 *
 * @param d bore of the valve, mm; null: unknown
 * @param D1 bore of the inlet pipe, mm; null: unknown
 * @param D2 bore of the outlet pipe, mm
 * @returns zeros where a size is unknown or the pipe is no wider than the valve
 * @example fittingLosses(50, 80, 100).sum // 0.6581
 * Source: IEC 60534-2-1:2011 clause 5.7 (numbering from memory); methods.md §2.3
 */
export function fittingLosses(d: number | null, D1: number | null, D2: number | null): FittingLosses {
  if (d === null || D1 === null || D2 === null) return none;
  if (!(d > 0 && D1 >= d && D2 >= d) || (D1 === d && D2 === d)) return none;
  const s1 = (d / D1) ** 2;
  const s2 = (d / D2) ** 2;
  const inlet = 0.5 * (1 - s1) ** 2 + (1 - s1 * s1);
  return { sum: inlet + (1 - s2) ** 2 - (1 - s2 * s2), inlet };
}

/**
 * Piping geometry factor FP = 1/√(1 + (ΣK/N2)(C/d²)²).
 *
 * @param sum ΣK
 * @param C Kv
 * @param d mm
 * @returns NaN where ΣK is so negative that no flow satisfies it
 * Source: IEC 60534-2-1:2011; methods.md §2.3
 */
export function pipingFactor(sum: number, C: number, d: number): number {
  return 1 / Math.sqrt(1 + (sum / N2) * (C / (d * d)) ** 2);
}

/**
 * Liquid pressure recovery factor with fittings, FLP.
 *
 * @param inlet K1 + KB1
 * @param C Kv
 * @param d mm
 * Source: IEC 60534-2-1:2011; methods.md §2.3
 */
export function recoveryWithFittings(FL: number, inlet: number, C: number, d: number): number {
  return FL / Math.sqrt(1 + ((FL * FL) / N2) * inlet * (C / (d * d)) ** 2);
}

/**
 * Critical pressure-drop ratio with fittings, xTP.
 *
 * @param inlet K1 + KB1
 * @param C Kv
 * @param d mm
 * Source: IEC 60534-2-1:2011; methods.md §2.3
 */
export function dropRatioWithFittings(xT: number, FP: number, inlet: number, C: number, d: number): number {
  return xT / (FP * FP) / (1 + (xT / N5) * inlet * (C / (d * d)) ** 2);
}
