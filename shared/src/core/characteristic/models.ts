import { type CharacteristicKind } from '../data-sheet.js';

/** Rangeability of the linear law's foot: Φ0 = 1/50 (§3). */
export const linearRangeability = 50;
/** Exponent n of quick opening, C ∝ h^(1/n), inside which a trim is called that (§3). */
export const quickOpeningExponent = { low: 1.4, high: 3.3 };

/**
 * Relative flow coefficient of an equal-percentage trim.
 *
 * Φ(h) = R^(h − 1): equal steps of travel change the coefficient by the same fraction. The law never
 * reaches zero, so it says nothing about a shut valve; callers keep to the travel really visited.
 *
 * @param h relative travel, 0 to 1
 * @param R rangeability parameter, above 1
 * @returns C(h)/C₁₀₀, 1/R to 1; NaN outside that domain
 * @example equalPercentage(0.5, 50) // 0.1414
 * Source: IEC 60534-2-4; methods.md §3
 */
export function equalPercentage(h: number, R: number): number {
  return inUnit(h) && R > 1 ? R ** (h - 1) : NaN;
}

/**
 * Relative flow coefficient of a linear trim, Φ0 + (1 − Φ0)h with Φ0 = 1/R.
 *
 * @param h relative travel, 0 to 1
 * @param R rangeability parameter, above 1
 * @returns NaN outside that domain
 * Source: IEC 60534-2-4; methods.md §3
 */
export function linear(h: number, R: number = linearRangeability): number {
  return inUnit(h) && R > 1 ? 1 / R + (1 - 1 / R) * h : NaN;
}

/**
 * Relative flow coefficient of a quick-opening trim, h^(1/n); n = 2 is the square root.
 *
 * @param h relative travel, 0 to 1
 * @param n above 0
 * @returns NaN outside that domain
 * Source: practice; methods.md §3
 */
export function quickOpening(h: number, n: number): number {
  return inUnit(h) && n > 0 ? h ** (1 / n) : NaN;
}

/**
 * Relative flow coefficient of a modified parabolic trim, 0.3h + 0.7h². Makers differ: a sheet's own table is better.
 *
 * @param h relative travel, 0 to 1
 * @returns NaN outside that domain
 * Source: our choice; methods.md §3
 */
export function modifiedParabolic(h: number): number {
  return inUnit(h) ? 0.3 * h + 0.7 * h * h : NaN;
}

/**
 * Equal percentage bent through zero, (R^h − 1)/(R − 1).
 *
 * @param h relative travel, 0 to 1
 * @param R above 1
 * @returns NaN outside that domain
 * Source: practice; methods.md §3
 */
export function equalPercentageThroughZero(h: number, R: number): number {
  return inUnit(h) && R > 1 ? (R ** h - 1) / (R - 1) : NaN;
}

function inUnit(h: number): boolean {
  return h >= 0 && h <= 1;
}

/**
 * Relative flow coefficient of a kind.
 *
 * @param parameter rangeability of equal percentage (and of linear, 50 where null), exponent n of quick opening (2 where null)
 * @returns NaN outside the law's domain
 */
export function relativeCoefficient(kind: CharacteristicKind, h: number, parameter: number | null): number {
  switch (kind) {
    case 'linear':
      return linear(h, parameter ?? linearRangeability);
    case 'equal percentage':
      return equalPercentage(h, parameter ?? 50);
    case 'quick opening':
      return quickOpening(h, parameter ?? 2);
    case 'modified parabolic':
      return modifiedParabolic(h);
  }
}

/**
 * Travel at which a kind has a relative flow coefficient: the inverse of relativeCoefficient.
 *
 * @param phi C/C₁₀₀
 * @returns relative travel 0 to 1; NaN where the law does not reach `phi` between 0 and 1
 */
export function travelForCoefficient(
  kind: CharacteristicKind,
  phi: number,
  parameter: number | null,
): number {
  const h = inverse(kind, phi, parameter);
  // a rounding error beyond an end is the end
  if (h > 1 && h < 1 + 1e-12) return 1;
  if (h < 0 && h > -1e-12) return 0;
  return inUnit(h) ? h : NaN;
}

function inverse(kind: CharacteristicKind, phi: number, parameter: number | null): number {
  if (!(phi >= 0)) return NaN;
  switch (kind) {
    case 'linear': {
      const foot = 1 / (parameter ?? linearRangeability);
      return (phi - foot) / (1 - foot);
    }
    case 'equal percentage':
      return 1 + Math.log(phi) / Math.log(parameter ?? 50);
    case 'quick opening':
      return phi ** (parameter ?? 2);
    case 'modified parabolic':
      // the positive root of 0.7h² + 0.3h − Φ, in the form that loses no digits for small Φ
      return (2 * phi) / (0.3 + Math.sqrt(0.09 + 2.8 * phi));
  }
}

/** Two-parameter exponential C = A·e^{κx}, x in % travel. */
export interface Exponential {
  /** per % of travel */
  readonly kappa: number;
  readonly A: number;
  /** C at 100 % */
  readonly ratedCoefficient: number;
  /** e^{100κ} */
  readonly rangeability: number;
  /** change of C per 1 % of travel, % */
  readonly percentStep: number;
}

/**
 * The exponential through two points of a characteristic.
 *
 * @param first, second travel in % and flow coefficient
 * @returns NaN throughout for a coefficient not above zero or equal travels; a falling curve keeps its negative κ for the caller to refuse
 * @example exponentialThrough({ travel: 20, coefficient: 5 }, { travel: 80, coefficient: 40 }).rangeability // 32
 * Source: elementary; methods.md §3
 */
export function exponentialThrough(
  first: { readonly travel: number; readonly coefficient: number },
  second: { readonly travel: number; readonly coefficient: number },
): Exponential {
  const possible = first.coefficient > 0 && second.coefficient > 0 && first.travel !== second.travel;
  const kappa = possible
    ? Math.log(second.coefficient / first.coefficient) / (second.travel - first.travel)
    : NaN;
  const A = first.coefficient * Math.exp(-kappa * first.travel);
  return {
    kappa,
    A,
    ratedCoefficient: A * Math.exp(100 * kappa),
    rangeability: Math.exp(100 * kappa),
    percentStep: 100 * Math.expm1(kappa),
  };
}
