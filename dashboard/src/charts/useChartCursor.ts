import { useState, type KeyboardEvent, type PointerEvent } from 'react';

/** A data point the cursor can stand on: its place in px and what it says. */
export interface Reading {
  x: number;
  y: number;
  text: string;
}

/** The data points of one curve, from left to right. */
export interface CursorSeries {
  name: string;
  readings: Reading[];
}

interface Spot {
  series: number;
  index: number;
}

/**
 * A cursor over a drawing's data points: left and right move along a curve, Home and End to its ends, up and
 * down change the curve, Escape leaves; the pointer takes the nearest point.
 */
export function useChartCursor(series: CursorSeries[]) {
  const [spot, setSpot] = useState<Spot | null>(null);
  const filled = series.filter((one) => one.readings.length > 0);
  const current = spot && filled[Math.min(spot.series, filled.length - 1)];
  const reading = spot && current?.readings[Math.min(spot.index, current.readings.length - 1)];

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Escape') return setSpot(null);
    const next = step(filled, spot, event.key);
    if (!next) return;
    event.preventDefault();
    setSpot(next);
  };
  const onPointerMove = (event: PointerEvent<SVGSVGElement>) => {
    const frame = event.currentTarget.getBoundingClientRect();
    const next = nearest(filled, event.clientX - frame.left, event.clientY - frame.top);
    if (next && (next.series !== spot?.series || next.index !== spot.index)) setSpot(next);
  };
  return {
    reading: reading ?? null,
    text: reading && current ? (filled.length > 1 ? `${current.name}: ${reading.text}` : reading.text) : null,
    onKeyDown,
    onPointerMove,
    onPointerLeave: () => setSpot(null),
  };
}

function step(filled: CursorSeries[], spot: Spot | null, key: string): Spot | null {
  const moves: Record<string, [number, number]> = {
    ArrowRight: [0, 1],
    ArrowLeft: [0, -1],
    ArrowUp: [-1, 0],
    ArrowDown: [1, 0],
    Home: [0, -Infinity],
    End: [0, Infinity],
  };
  const move = moves[key];
  if (!move || filled.length === 0) return null;
  if (!spot) return { series: 0, index: key === 'ArrowLeft' || key === 'End' ? lastOf(filled[0]) : 0 };
  const series = within(spot.series + move[0], filled.length - 1);
  const here = filled[spot.series]?.readings[spot.index];
  if (move[0] !== 0 && here) return { series, index: closestX(filled[series], here.x) };
  return { series, index: within(spot.index + move[1], lastOf(filled[series])) };
}

function nearest(filled: CursorSeries[], x: number, y: number): Spot | null {
  let best: Spot | null = null;
  let least = Infinity;
  filled.forEach((one, series) =>
    one.readings.forEach((reading, index) => {
      // across counts more than upward: the reader points at a place on the axis
      const distance = Math.abs(reading.x - x) + Math.abs(reading.y - y) / 8;
      if (distance < least) [best, least] = [{ series, index }, distance];
    }),
  );
  return best;
}

function closestX(series: CursorSeries | undefined, x: number): number {
  const gaps = (series?.readings ?? []).map((reading) => Math.abs(reading.x - x));
  return Math.max(0, gaps.indexOf(Math.min(...gaps)));
}

function lastOf(series: CursorSeries | undefined): number {
  return Math.max(0, (series?.readings.length ?? 0) - 1);
}

function within(value: number, last: number): number {
  return Math.min(last, Math.max(0, value));
}
