import { isotonic } from '../statistics/isotonic.js';
import { pchip } from '../statistics/pchip.js';

/**
 * Monotone installed curve through bin medians: isotonic regression, then a shape-preserving cubic of the flow.
 *
 * @param h ascending relative travel of the bins
 * @param y ln flow
 * @returns ln flow at a relative travel; outside the bins the end values hold
 * Source: methods.md §2.5 (Barlow 1972; Fritsch & Carlson 1980)
 */
export function installedCurve(
  h: Float64Array,
  y: Float64Array,
  weight: Float64Array,
): (at: number) => number {
  const curve = pchip(h, isotonic(y, weight).map(Math.exp));
  return (at) => Math.log(curve(at));
}
