import { line } from 'd3-shape';
import { pathDigits, type Box } from './box.js';
import { travelScale } from './travel-scale.js';

/** A place on a curve: travel in %, value in any unit. */
export interface CurvePlace {
  readonly travel: number;
  readonly value: number;
}

/** Both curves of a valve, relative to the larger one's top; as found only over the travel visited. */
export interface Glyph {
  readonly specified: readonly CurvePlace[];
  readonly asFound: readonly CurvePlace[];
  readonly basis: 'inherent' | 'installed';
}

export interface GlyphGeometry {
  readonly frame: Box;
  readonly specified: string;
  readonly asFound: string;
  /** stands for a curve of a single place, which has no line */
  readonly dot: { readonly x: number; readonly y: number } | null;
}

/**
 * The characteristic glyph: a small square, travel 0 to 100 % across and the coefficient 0 to 1 upward,
 * the specified curve thin and the as-found one thick.
 *
 * @param glyph null where no characteristic was found
 * @param size px of the square's side
 * @returns paths that are empty where there is nothing to draw, never NaN
 */
export function characteristicGlyph(glyph: Glyph | null, size: number): GlyphGeometry {
  const frame = { left: 2.5, right: size - 2.5, top: 2.5, bottom: size - 2.5 };
  const x = travelScale(frame.left, frame.right);
  const y = (value: number): number =>
    frame.bottom - (frame.bottom - frame.top) * Math.min(1, Math.max(0, value));
  const draw = line<CurvePlace>()
    .x((place) => x(place.travel))
    .y((place) => y(place.value))
    .digits(pathDigits);
  const specified = usable(glyph?.specified ?? []);
  const asFound = usable(glyph?.asFound ?? []);
  const only = asFound.length === 1 ? asFound[0] : undefined;
  return {
    frame,
    specified: specified.length > 1 ? (draw(specified) ?? '') : '',
    asFound: asFound.length > 1 ? (draw(asFound) ?? '') : '',
    dot: only ? { x: x(only.travel), y: y(only.value) } : null,
  };
}

function usable(curve: readonly CurvePlace[]): CurvePlace[] {
  return curve
    .filter((place) => Number.isFinite(place.travel) && Number.isFinite(place.value))
    .sort((a, b) => a.travel - b.travel);
}
