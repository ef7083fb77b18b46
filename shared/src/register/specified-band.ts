import { type CurvePoint } from '../core/assessment.js';
import { coefficientTolerance } from '../core/characteristic/compare-with-sheet.js';
import { specifiedCurve } from '../core/characteristic/specified-curve.js';
import { type DataSheet } from '../core/data-sheet.js';

/** Travel between drawn points, %. */
const step = 2;

/**
 * The sheet's curve with the tolerance of IEC 60534-2-4 around it, ±10·(1/Φ)^0.2 % of the stated coefficient
 * (from memory; methods.md §4.2). In Kv; empty where the sheet names no characteristic or rated coefficient.
 */
export function specifiedBand(sheet: DataSheet): CurvePoint[] {
  const relative = specifiedCurve(sheet);
  if (relative === null || sheet.ratedCoefficient === null) return [];
  const points: CurvePoint[] = [];
  for (let travel = 0; travel <= 100; travel += step) {
    const phi = relative(travel / 100);
    if (!Number.isFinite(phi)) continue;
    const value = phi * sheet.ratedCoefficient;
    const tolerance = phi > 0 ? Math.min(1, coefficientTolerance(phi) / 100) : 0;
    points.push({ travel, value, low: value * (1 - tolerance), high: value * (1 + tolerance) });
  }
  return points;
}
