import { scaleLinear, type ScaleLinear } from 'd3-scale';
import { type Tick } from './box.js';

/**
 * The axis every drawing over travel shares: 0 to 100 % whatever the valve visited, so that two drawings
 * under or beside each other can be compared by eye. Travel outside is drawn at the end it passed.
 *
 * @param left px of 0 % travel
 * @param right px of 100 % travel
 */
export function travelScale(left: number, right: number): ScaleLinear<number, number> {
  return scaleLinear([0, 100], [left, right]).clamp(true);
}

/**
 * Marks of the travel axis: every 10 % where there is room, else every 25 or 50 %.
 *
 * @param left px of 0 % travel
 * @param right px of 100 % travel
 */
export function travelTicks(left: number, right: number): Tick[] {
  const scale = travelScale(left, right);
  const width = right - left;
  const step = width >= 360 ? 10 : width >= 140 ? 25 : 50;
  return Array.from({ length: 100 / step + 1 }, (_, i) => i * step).map((value) => ({
    at: scale(value),
    value,
    text: String(value),
  }));
}
