import { area, line } from 'd3-shape';
import { pathDigits, plotBox, type Box, type Place, type Size, type Tick } from './box.js';
import { curveAt, curveBetween } from './curve-between.js';
import { spreadApart } from './spread-apart.js';
import { travelRidge, type Ridge, type RidgeGeometry } from './travel-ridge.js';
import { travelScale, travelTicks } from './travel-scale.js';
import { linearValues, logValues, type ValueScale } from './value-scale.js';

interface Bounds {
  readonly travel: number;
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/** A characteristic as an assessment presents it: travel in %, values in one unit. */
export interface DrawnCharacteristic {
  /** the travel visited */
  readonly span: { readonly from: number; readonly to: number };
  readonly points: readonly { readonly travel: number; readonly value: number; readonly count: number }[];
  /** fitted curve with its 2.5 to 97.5 % band */
  readonly curve: readonly Bounds[];
  /** the data sheet's curve with its tolerance band; empty where the basis is installed */
  readonly specified: readonly Bounds[];
}

/** A curve's name, set beside the curve. */
export interface CurveLabel {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'end';
}

export interface CharacteristicGeometry {
  readonly plot: Box;
  readonly travelTicks: readonly Tick[];
  readonly valueTicks: readonly Tick[];
  readonly points: readonly (Place & {
    readonly radius: number;
    readonly travel: number;
    readonly value: number;
    readonly count: number;
  })[];
  /** fitted curve over the travel visited, and up to 5 % of travel beyond it */
  readonly fitted: string;
  readonly beyondFitted: string;
  readonly fittedBand: string;
  readonly specified: string;
  readonly tolerance: string;
  /** null where no operating range was found */
  readonly ridge: RidgeGeometry | null;
  /** px of the names of the percentiles, moved apart where they would touch */
  readonly percentileNames: readonly { readonly name: string; readonly travel: number; readonly x: number }[];
  readonly asFoundLabel: CurveLabel | null;
  readonly specifiedLabel: CurveLabel | null;
  /** px of the coefficient axis for a value, for marks the caller adds */
  readonly place: (travel: number, value: number) => Place;
}

/** How far beyond the travel visited a curve may be drawn, % travel (methods.md §3.4). */
const beyond = 5;

/**
 * The valve sheet's chart: what was found of the characteristic over what was specified, above the travel
 * ridge on the same travel axis.
 *
 * @param characteristic points and curves; what is not finite, and on a log axis not above zero, is left out
 * @param ridge null where no operating range was found
 * @param size px
 * @param axis the coefficient axis: linear shows differences at high travel, log shows equal fractions equal
 * @returns paths that are empty where there is nothing to draw, never NaN
 */
export function characteristicChart(
  characteristic: DrawnCharacteristic,
  ridge: Ridge | null,
  size: Size,
  axis: 'linear' | 'log',
): CharacteristicGeometry {
  const plot = plotBox(size, ridge ? 140 : 36);
  const strip = { ...plot, top: plot.bottom + 28, bottom: size.height - 36 };
  const x = travelScale(plot.left, plot.right);
  const { span } = characteristic;
  const drawable = (figure: { travel: number; value: number }): boolean =>
    Number.isFinite(figure.travel) &&
    Number.isFinite(figure.value) &&
    (axis === 'linear' || figure.value > 0);
  const points = characteristic.points.filter((point) => drawable(point) && point.count >= 0);
  const fit = characteristic.curve.filter(drawable);
  const fitted = curveBetween(fit, span.from, span.to);
  const below = curveBetween(fit, span.from - beyond, span.from);
  const above = curveBetween(fit, span.to, span.to + beyond);
  const specified = curveBetween(characteristic.specified.filter(drawable), 0, 100);
  const y = (axis === 'log' ? logValues : linearValues)(
    [...points, ...below, ...fitted, ...above, ...specified].flatMap((figure) =>
      'high' in figure ? [figure.value, figure.low, figure.high] : [figure.value],
    ),
    plot.bottom,
    plot.top,
  );

  const drawnRidge = ridge && travelRidge(ridge, strip);
  const names = drawnRidge?.percentiles ?? [];
  const apart = spreadApart(
    names.map((percentile) => percentile.x),
    54,
    plot.left + 20,
    plot.right - 20,
  );
  // on a narrow page full-size circles would hide the curve and each other
  const crowding = Math.min(1, Math.max(0.65, (plot.right - plot.left) / 600));
  const mostSamples = Math.max(1, ...points.map((point) => point.count));
  const curve = line<Bounds>(
    (at) => x(at.travel),
    (at) => y.place(at.value),
  ).digits(pathDigits);
  const band = area<Bounds>(
    (at) => x(at.travel),
    (at) => y.place(at.low),
    (at) => y.place(at.high),
  ).digits(pathDigits);
  const drawn = (path: string | null, places: readonly unknown[]): string =>
    places.length > 1 ? (path ?? '') : '';
  return {
    plot,
    travelTicks: travelTicks(plot.left, plot.right),
    valueTicks: y.ticks,
    points: points.map((point) => ({
      ...point,
      x: x(point.travel),
      y: y.place(point.value),
      radius: (2 + 3.5 * Math.sqrt(point.count / mostSamples)) * crowding,
    })),
    fitted: drawn(curve(fitted), fitted),
    beyondFitted: drawn(curve(below), below) + drawn(curve(above), above),
    fittedBand: drawn(band(fitted), fitted),
    specified: drawn(curve(specified), specified),
    tolerance: drawn(band(specified), specified),
    ridge: drawnRidge,
    percentileNames: names.map(({ name, travel }, i) => ({ name, travel, x: apart[i] ?? 0 })),
    ...curveLabels(fitted, specified, x, y, plot),
    place: (travel, value) => ({ x: x(travel), y: y.place(value) }),
  };
}

/** Names go on opposite sides of the two curves: the upper curve's above it, the lower one's below. */
function curveLabels(
  fitted: readonly Bounds[],
  specified: readonly Bounds[],
  x: (travel: number) => number,
  y: ValueScale,
  plot: Box,
): { asFoundLabel: CurveLabel | null; specifiedLabel: CurveLabel | null } {
  const end = fitted.at(-1);
  const beside = end && curveAt(specified, end.travel);
  const higher = !end || !beside || end.value >= beside.value;
  const anchor = curveAt(specified, 82) ?? specified.at(-1);
  return {
    asFoundLabel: end ? label(x(end.travel), y.place(end.value), higher, plot, 60) : null,
    specifiedLabel: anchor
      ? label(x(anchor.travel), y.place(higher ? anchor.low : anchor.high), !higher || !end, plot, 116)
      : null,
  };
}

/** A name of so many px beside a place: left of and above it, or right of and below it. */
function label(x: number, y: number, above: boolean, plot: Box, width: number): CurveLabel {
  if (above) {
    const fits = x - plot.left > width;
    return { x: fits ? x - 8 : x + 8, y: Math.max(plot.top + 12, y - 8), anchor: fits ? 'end' : 'start' };
  }
  const fits = plot.right - x > width;
  return {
    x: fits ? x + 8 : plot.right - 2,
    y: Math.min(plot.bottom - 8, y + 18),
    anchor: fits ? 'start' : 'end',
  };
}
