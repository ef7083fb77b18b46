/** Seat leakage classes a data sheet may name (IEC 60534-4, ANSI/FCI 70-2). */
export const leakageClasses = ['II', 'III', 'IV', 'V', 'VI'] as const;
export type LeakageClass = (typeof leakageClasses)[number];

/**
 * Largest leak a new valve of a class may have, as a share of its rated coefficient.
 *
 * Context for a valve that passes when shut, never a class read from history: a process flow meter sees no better than
 * class II. Classes V and VI are far tighter and given by seat bore and pressure, not by capacity.
 *
 * @returns null for classes V and VI
 * @example leakageShare('III') // 0.001
 * Source: ANSI/FCI 70-2-2006 as reproduced on the web (shared/reference/seat-leakage.json); methods.md §7.5
 */
export function leakageShare(leakageClass: LeakageClass): number | null {
  const shares: Partial<Record<LeakageClass, number>> = { II: 0.005, III: 0.001, IV: 0.0001 };
  return shares[leakageClass] ?? null;
}
