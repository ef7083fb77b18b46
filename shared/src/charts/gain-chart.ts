import { line } from 'd3-shape';
import { type Box, pathDigits, type Place, plotBox, type Size, type Tick } from './box.js';
import { travelScale, travelTicks } from './travel-scale.js';
import { linearValues } from './value-scale.js';

export interface GainPoint {
  readonly travel: number;
  readonly gain: number;
}

export interface GainGeometry {
  readonly plot: Box;
  readonly travelTicks: readonly Tick[];
  readonly valueTicks: readonly Tick[];
  readonly line: string;
  readonly points: readonly (GainPoint & Place)[];
  /** px of the top and bottom of the gain wanted; null where the gain is known in shape only */
  readonly wanted: { readonly top: number; readonly bottom: number } | null;
}

/** The gain a loop is comfortable with, % of span per % travel (methods.md §5.2). */
export const wantedGain = { low: 0.5, high: 2 } as const;

/**
 * Installed gain against travel.
 *
 * @param points any order; points with anything not finite are left out
 * @param absolute false where the flow is not the controlled quantity: the wanted gain then means nothing
 * @param size px
 */
export function gainChart(points: readonly GainPoint[], absolute: boolean, size: Size): GainGeometry {
  const plot = plotBox(size);
  const x = travelScale(plot.left, plot.right);
  const shown = points
    .filter((point) => Number.isFinite(point.travel) && Number.isFinite(point.gain))
    .sort((a, b) => a.travel - b.travel);
  const y = linearValues(
    shown.map((point) => point.gain),
    plot.bottom,
    plot.top,
    absolute ? [0, wantedGain.high] : [0],
  );
  const draw = line<GainPoint>(
    (point) => x(point.travel),
    (point) => y.place(point.gain),
  ).digits(pathDigits);
  return {
    plot,
    travelTicks: travelTicks(plot.left, plot.right),
    valueTicks: y.ticks,
    line: shown.length > 1 ? (draw(shown) ?? '') : '',
    points: shown.map((point) => ({ ...point, x: x(point.travel), y: y.place(point.gain) })),
    wanted: absolute ? { top: y.place(wantedGain.high), bottom: y.place(wantedGain.low) } : null,
  };
}
