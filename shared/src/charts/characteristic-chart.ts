import { area, line } from 'd3-shape';
import { pathDigits, type Box, type Place, type Tick } from './box.js';
import { curveAt, curveBetween } from './curve-between.js';
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
  readonly ridge: RidgeGeometry;
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
  size: { readonly width: number; readonly height: number },
  axis: 'linear' | 'log',
): CharacteristicGeometry {
  const plot = { left: 46, right: size.width - 14, top: 26, bottom: size.height - 126 };
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
    [...points, ...fitted, ...specified].flatMap((figure) =>
      'high' in figure ? [figure.value, figure.low, figure.high] : [figure.value],
    ),
    plot.bottom,
    plot.top,
  );

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
      radius: 2 + 3.5 * Math.sqrt(point.count / mostSamples),
    })),
    fitted: drawn(curve(fitted), fitted),
    beyondFitted: drawn(curve(below), below) + drawn(curve(above), above),
    fittedBand: drawn(band(fitted), fitted),
    specified: drawn(curve(specified), specified),
    tolerance: drawn(band(specified), specified),
    ridge: travelRidge(ridge, strip),
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
  const asFoundLabel = end ? label(x(end.travel), y.place(end.value), higher, plot) : null;
  const anchor = curveAt(specified, 82) ?? specified.at(-1);
  const specifiedLabel = anchor
    ? label(x(anchor.travel), y.place(anchor.value), end ? !higher : true, plot)
    : null;
  return { asFoundLabel, specifiedLabel };
}

function label(x: number, y: number, above: boolean, plot: Box): CurveLabel {
  if (above) {
    const fits = x - plot.left > 110;
    return { x: fits ? x - 8 : x + 8, y: Math.max(plot.top + 12, y - 8), anchor: fits ? 'end' : 'start' };
  }
  const fits = plot.right - x > 110;
  return {
    x: fits ? x + 10 : plot.right - 2,
    y: Math.min(plot.bottom - 8, y + 16),
    anchor: fits ? 'start' : 'end',
  };
}
