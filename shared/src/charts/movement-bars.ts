import { type Box, type Place, type Size, type Tick } from './box.js';
import { timeAxis } from './time-scale.js';
import { linearValues } from './value-scale.js';

/** One day in service: `day` is its start, s UTC; `travel` in % of travel. */
export interface MovementDay {
  readonly day: number;
  readonly reversals: number;
  readonly travel: number;
}

interface Panel {
  readonly plot: Box;
  readonly valueTicks: readonly Tick[];
  readonly bars: readonly (Place & {
    readonly width: number;
    readonly height: number;
    readonly day: number;
    readonly value: number;
  })[];
}

export interface MovementGeometry {
  readonly timeTicks: readonly Tick[];
  readonly travel: Panel;
  readonly reversals: Panel;
}

const secondsOfDay = 86_400;

/**
 * Travel and reversals of each day, one above the other on one time axis. A day without service has no bar
 * and keeps its place.
 *
 * @param days any order; days with anything not finite are left out
 * @param size px
 * @param zone IANA zone of the words under the axis
 */
export function movementBars(days: readonly MovementDay[], size: Size, zone: string): MovementGeometry {
  const [left, right] = [46, size.width - 14];
  const half = (size.height - 36 - 26 - 30) / 2;
  const shown = days
    .filter((day) => [day.day, day.travel, day.reversals].every(Number.isFinite))
    .sort((a, b) => a.day - b.day);
  const first = shown[0]?.day ?? NaN;
  const last = shown.at(-1)?.day ?? NaN;
  const time = timeAxis(first, last + secondsOfDay, left, right, zone, 'day');

  const panel = (top: number, valueOf: (day: MovementDay) => number): Panel => {
    const plot = { left, right, top, bottom: top + half };
    const y = linearValues(shown.map(valueOf), plot.bottom, plot.top);
    const wide = time.scale((first + secondsOfDay) * 1000) - time.scale(first * 1000);
    return {
      plot,
      valueTicks: y.ticks,
      bars: shown.map((day) => ({
        x: time.scale(day.day * 1000) + wide * 0.1,
        width: Math.min(40, Math.max(1, wide * 0.8)),
        y: y.place(valueOf(day)),
        height: plot.bottom - y.place(valueOf(day)),
        day: day.day,
        value: valueOf(day),
      })),
    };
  };
  return {
    timeTicks: time.ticks,
    travel: panel(26, (day) => day.travel),
    reversals: panel(26 + half + 30, (day) => day.reversals),
  };
}
