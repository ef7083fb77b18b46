/**
 * Numerical constants of IEC 60534-2-1:2011 for Kv, kPa, m³/h, kg/h, mm and m²/s, rounded as printed there.
 * Gas flow in m³/h is at 0 °C and 101.325 kPa. Source: methods.md §2.
 */
export const N1 = 0.1;
export const N2 = 1.6e-3;
export const N4 = 7.07e-2;
export const N5 = 1.8e-3;
export const N6 = 3.16;
export const N8 = 1.1;
export const N9 = 24.6;
export const N18 = 0.865;
/** Non-turbulent gas flow; from memory, checked against worked example 4 only. */
export const N22 = 17.3;
export const N32 = 140;

/** kg/m³, water at 15 °C: the reference of relative density (methods.md §0) */
export const waterDensity = 999.1;
/** m³/kmol of an ideal gas at 0 °C and 101.325 kPa */
export const molarVolume = 22.41397;
/** kJ/(kmol K) */
export const gasConstant = 8.314462618;
