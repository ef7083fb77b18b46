import { area } from 'd3-shape';
import { type Box, pathDigits, type Place, plotBox, type Size, type Tick } from './box.js';
import { travelScale, travelTicks } from './travel-scale.js';
import { linearValues } from './value-scale.js';

/** Deviation in shape by travel bin, and the tolerance there, all in %. */
export interface DeviationBin {
  readonly travel: number;
  readonly percent: number;
  readonly tolerance: number;
}

export interface DeviationGeometry {
  readonly plot: Box;
  readonly travelTicks: readonly Tick[];
  readonly valueTicks: readonly Tick[];
  /** px of no deviation */
  readonly zero: number;
  /** area of the tolerance, above and below zero */
  readonly tolerance: string;
  readonly bins: readonly (DeviationBin & Place & { readonly beyond: boolean })[];
}

/**
 * Deviation from the specified shape, bin by bin, against the tolerance of IEC 60534-2-4 at that travel.
 *
 * @param bins any order; bins with anything not finite are left out
 * @param size px
 */
export function deviationChart(bins: readonly DeviationBin[], size: Size): DeviationGeometry {
  const plot = plotBox(size);
  const x = travelScale(plot.left, plot.right);
  const shown = bins
    .filter((bin) => [bin.travel, bin.percent, bin.tolerance].every(Number.isFinite))
    .sort((a, b) => a.travel - b.travel);
  const y = linearValues(
    shown.flatMap((bin) => [bin.percent, bin.tolerance, -bin.tolerance]),
    plot.bottom,
    plot.top,
    [-10, 10],
  );
  const band = area<DeviationBin>(
    (bin) => x(bin.travel),
    (bin) => y.place(-bin.tolerance),
    (bin) => y.place(bin.tolerance),
  ).digits(pathDigits);
  return {
    plot,
    travelTicks: travelTicks(plot.left, plot.right),
    valueTicks: y.ticks,
    zero: y.place(0),
    tolerance: shown.length > 1 ? (band(shown) ?? '') : '',
    bins: shown.map((bin) => ({
      ...bin,
      x: x(bin.travel),
      y: y.place(bin.percent),
      beyond: Math.abs(bin.percent) > bin.tolerance,
    })),
  };
}
