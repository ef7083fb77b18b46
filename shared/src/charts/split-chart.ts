import { area, line } from 'd3-shape';
import { scaleLinear } from 'd3-scale';
import { type Box, pathDigits, type Place, plotBox, type Size, type Tick } from './box.js';
import { figureText } from './figure-text.js';
import { linearValues } from './value-scale.js';

/** Mid-lines of a direction split: what the response was at `at` after rising and after falling. */
export interface SplitPlace {
  readonly at: number;
  readonly up: number;
  readonly down: number;
}

export interface SplitGeometry {
  readonly plot: Box;
  readonly acrossTicks: readonly Tick[];
  readonly valueTicks: readonly Tick[];
  readonly up: string;
  readonly down: string;
  /** the space between the two: the dead band seen as an area */
  readonly between: string;
  readonly places: readonly {
    readonly at: number;
    readonly x: number;
    readonly up: Place & { readonly value: number };
    readonly down: Place & { readonly value: number };
  }[];
}

/**
 * The direction split: the response while rising and while falling, over the reference. The axes cover what was
 * visited, not 0 to 100 %: a dead band of 2 % would be lost there.
 *
 * @param lines any order; places with anything not finite are left out
 * @param size px
 */
export function splitChart(lines: readonly SplitPlace[], size: Size): SplitGeometry {
  const plot = plotBox(size);
  const shown = lines
    .filter((place) => [place.at, place.up, place.down].every(Number.isFinite))
    .sort((a, b) => a.at - b.at);
  const from = shown[0]?.at ?? 0;
  const to = shown.at(-1)?.at ?? 100;
  const x = scaleLinear(to > from ? [from, to] : [from - 1, from + 1], [plot.left, plot.right])
    .nice(6)
    .clamp(true);
  const y = linearValues(
    shown.flatMap((place) => [place.up, place.down]),
    plot.bottom,
    plot.top,
    [],
  );
  const through = (value: (place: SplitPlace) => number): string =>
    shown.length > 1
      ? (line<SplitPlace>(
          (place) => x(place.at),
          (place) => y.place(value(place)),
        ).digits(pathDigits)(shown) ?? '')
      : '';
  const between = area<SplitPlace>(
    (place) => x(place.at),
    (place) => y.place(place.down),
    (place) => y.place(place.up),
  ).digits(pathDigits);
  return {
    plot,
    acrossTicks: x.ticks(6).map((value) => ({ at: x(value), value, text: figureText(value) })),
    valueTicks: y.ticks,
    up: through((place) => place.up),
    down: through((place) => place.down),
    between: shown.length > 1 ? (between(shown) ?? '') : '',
    places: shown.map((place) => ({
      at: place.at,
      x: x(place.at),
      up: { x: x(place.at), y: y.place(place.up), value: place.up },
      down: { x: x(place.at), y: y.place(place.down), value: place.down },
    })),
  };
}
