import { type Place } from './box.js';

/**
 * Slanting strokes filling the space between a line and the baseline under it, as one path. Drawn over a
 * coloured fill they say "beyond the limits" to a reader who sees no colour, and on a black-and-white print.
 * Strokes are computed here, not left to an SVG pattern, so that the PDF draws the very same ones.
 *
 * @param line places from left to right, px
 * @param baseline px
 * @param gap px between strokes along the baseline
 * @returns path data; empty where the line has under two places
 */
export function hatchUnder(line: readonly Place[], baseline: number, gap: number): string {
  const first = line[0];
  const last = line.at(-1);
  if (!first || !last || line.length < 2) return '';
  const tallest = baseline - Math.min(...line.map((place) => place.y));
  const start = Math.ceil((first.x - tallest) / gap) * gap;
  let path = '';
  for (let foot = start; foot < last.x; foot += gap) path += stroke(line, baseline, foot, first.x, last.x);
  return path;
}

/** One stroke rising to the right at 45°, broken where it leaves the filled space. */
function stroke(line: readonly Place[], baseline: number, foot: number, left: number, right: number): string {
  const step = 0.5;
  let path = '';
  let begun: Place | null = null;
  let end: Place | null = null;
  for (let x = Math.max(foot, left); x <= right; x += step) {
    const y = baseline - (x - foot);
    const inside = y >= heightAt(line, x);
    if (inside) {
      begun ??= { x, y };
      end = { x, y };
    }
    if (begun && end && (!inside || x + step > right)) {
      if (end.x - begun.x >= step) path += `M${text(begun)}L${text(end)}`;
      begun = null;
      end = null;
    }
  }
  return path;
}

function heightAt(line: readonly Place[], x: number): number {
  const i = line.findIndex((place) => place.x >= x);
  const after = line[i] ?? line.at(-1);
  const before = line[Math.max(0, i - 1)];
  if (!after || !before) return Infinity;
  const gap = after.x - before.x;
  return gap === 0 ? after.y : before.y + ((after.y - before.y) * (x - before.x)) / gap;
}

function text(place: Place): string {
  return `${place.x.toFixed(1)},${place.y.toFixed(1)}`;
}
