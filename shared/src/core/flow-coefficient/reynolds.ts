import { N18, N2, N32, N4 } from './constants.js';

/** At and above this valve Reynolds number flow is fully turbulent (IEC 60534-2-1). */
export const turbulentFrom = 10_000;

/**
 * Valve Reynolds number Rev = N4·Fd·Q/(ν√(C·FL))·(FL²C²/(N2·D⁴) + 1)^¼.
 *
 * @param flow m³/h (gas: at 0 °C and 101.325 kPa)
 * @param viscosity kinematic, m²/s
 * @param C Kv
 * @param D bore of the inlet pipe, mm; null: the last factor is left at 1, which gives a number slightly low
 * Source: IEC 60534-2-1:2011; methods.md §2.4
 */
export function valveReynolds(
  flow: number,
  viscosity: number,
  C: number,
  { FL, Fd, D }: { readonly FL: number; readonly Fd: number; readonly D: number | null },
): number {
  const velocity = D === null ? 1 : ((FL * FL * C * C) / (N2 * D ** 4) + 1) ** 0.25;
  return ((N4 * Fd * flow) / (viscosity * Math.sqrt(C * FL))) * velocity;
}

/**
 * Reynolds number factor FR: how much less a valve passes in viscous flow.
 *
 * Full-size trims are those with C/d² of at least 0.016 (in Cv and inches as the standard writes it, N18); the lower
 * of the transitional and the laminar branch counts from Rev 10 up, the laminar one alone below.
 *
 * @param C Kv
 * @param d bore of the valve, mm
 * @returns above 0, at most 1
 * Source: IEC 60534-2-1:2011 clause on small-flow and non-turbulent flow; methods.md §2.4
 */
export function reynoldsFactor(Rev: number, C: number, d: number, FL: number): number {
  if (Rev >= turbulentFrom) return 1;
  // the standard's equations hold up to C/d² = 0.04; beyond it the trim counts as one of 0.04
  const density = Math.min(C / (d * d), 0.04);
  const fullSize = density >= 0.016 * N18;
  const n = fullSize ? N2 / (density * density) : 1 + N32 * density ** (2 / 3);
  const laminar = (0.026 / FL) * Math.sqrt(n * Rev);
  const transitional = 1 + ((0.33 * Math.sqrt(FL)) / n ** 0.25) * Math.log10(Rev / turbulentFrom);
  return Math.min(1, Rev < 10 ? laminar : Math.min(transitional, laminar));
}

/**
 * The coefficient that satisfies C = C_turbulent/FR(C).
 *
 * Damped substitution, because FR falls as C rises and the plain one can swing.
 *
 * @param turbulent Kv worked out as if flow were turbulent
 * @param factorAt FR at a trial coefficient
 * @returns NaN where FR comes out at zero or less
 */
export function nonTurbulentCoefficient(turbulent: number, factorAt: (C: number) => number): number {
  let C = turbulent;
  for (let turn = 0; turn < 200; turn++) {
    const factor = factorAt(C);
    if (!(factor > 0)) return NaN;
    const next = 0.5 * C + (0.5 * turbulent) / factor;
    if (Math.abs(next - C) <= 1e-10 * next) return next;
    C = next;
  }
  return C;
}
