import { type Box, type Place, plotBox, type Size, type Tick } from './box.js';
import { timeAxis } from './time-scale.js';
import { linearValues } from './value-scale.js';

/** Capacity of one month or week: `at` in s UTC, changes as ln of capacity against the reference period. */
export interface DriftPlace {
  readonly at: number;
  readonly change: number;
  readonly low: number;
  readonly high: number;
  readonly windows: number;
}

/** What an assessment says on drift; times in s UTC. */
export interface DrawnDrift {
  readonly reference: { readonly from: number; readonly to: number };
  readonly series: readonly DriftPlace[];
  readonly steps: readonly { readonly at: number; readonly change: number }[];
}

export interface DriftGeometry {
  readonly plot: Box;
  readonly timeTicks: readonly Tick[];
  readonly valueTicks: readonly Tick[];
  /** px of the reference period's capacity */
  readonly zero: number;
  readonly reference: { readonly left: number; readonly right: number };
  /** percentages of change, with px; `beyond`: the whole interval lies on one side of zero */
  readonly places: readonly (Place & {
    readonly at: number;
    readonly percent: number;
    readonly lowPercent: number;
    readonly highPercent: number;
    readonly low: number;
    readonly high: number;
    readonly windows: number;
    readonly beyond: boolean;
  })[];
  readonly steps: readonly { readonly x: number; readonly at: number; readonly percent: number }[];
}

/**
 * Capacity over the months against the reference period, in % of it, each with its interval.
 *
 * @param drift places with anything not finite are left out
 * @param size px
 * @param zone IANA zone of the words under the axis
 */
export function driftChart(drift: DrawnDrift, size: Size, zone: string): DriftGeometry {
  const plot = plotBox(size);
  const shown = drift.series
    .filter((place) => [place.at, place.change, place.low, place.high].every(Number.isFinite))
    .sort((a, b) => a.at - b.at);
  const times = [...shown.map((place) => place.at), drift.reference.from, drift.reference.to].filter(
    Number.isFinite,
  );
  const pad = times.length > 0 ? (Math.max(...times) - Math.min(...times)) * 0.03 : 0;
  const time = timeAxis(Math.min(...times) - pad, Math.max(...times) + pad, plot.left, plot.right, zone);
  const x = (at: number): number => time.scale(at * 1000);
  const y = linearValues(
    shown.flatMap((place) => [inPercent(place.low), inPercent(place.high)]),
    plot.bottom,
    plot.top,
    [-5, 5],
  );
  return {
    plot,
    timeTicks: time.ticks,
    valueTicks: y.ticks,
    zero: y.place(0),
    reference: referenceSpan(drift.reference, x, plot),
    places: shown.map((place) => ({
      at: place.at,
      windows: place.windows,
      percent: inPercent(place.change),
      lowPercent: inPercent(place.low),
      highPercent: inPercent(place.high),
      x: x(place.at),
      y: y.place(inPercent(place.change)),
      low: y.place(inPercent(place.low)),
      high: y.place(inPercent(place.high)),
      beyond: place.low > 0 || place.high < 0,
    })),
    steps: drift.steps
      .filter((step) => Number.isFinite(step.at) && Number.isFinite(step.change))
      .map((step) => ({ x: x(step.at), at: step.at, percent: inPercent(step.change) })),
  };
}

/** A change of ln capacity as % of capacity: −0.105 is 10 % less. */
function inPercent(change: number): number {
  return 100 * Math.expm1(change);
}

function referenceSpan(
  reference: DrawnDrift['reference'],
  x: (at: number) => number,
  plot: Box,
): { left: number; right: number } {
  if (!(reference.to > reference.from)) return { left: plot.left, right: plot.left };
  return { left: Math.max(plot.left, x(reference.from)), right: Math.min(plot.right, x(reference.to)) };
}
