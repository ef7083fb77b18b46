import { scaleSqrt } from 'd3-scale';
import { area } from 'd3-shape';
import { pathDigits, type Box, type Place } from './box.js';
import { hatchUnder } from './hatch.js';
import { profileBetween, shareProfile, sharesOutside, type ShareProfile } from './share-profile.js';
import { travelScale } from './travel-scale.js';

/** Where a valve has spent its time: what the ranking and the assessment both hold. Travel in %. */
export interface Ridge {
  /** share of time in equal parts of travel from 0 to 100 %, each 0 to 1 */
  readonly shares: readonly number[];
  /** the band of travel it was specified to work in */
  readonly band: { readonly low: number; readonly high: number };
  readonly p5: number;
  readonly p50: number;
  readonly p95: number;
}

export interface RidgeGeometry {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly baseline: number;
  /** the ridge's upper edge: both ends of travel, and between them the middle of each part of travel */
  readonly edge: readonly Place[];
  /** area of the ridge within the band */
  readonly within: string;
  /** area of the ridge beyond the band, and strokes to tell it without colour */
  readonly beyond: string;
  readonly hatch: string;
  /** bracket under the axis for the band */
  readonly bracket: string;
  readonly percentiles: readonly {
    readonly name: 'p5' | 'p50' | 'p95';
    readonly travel: number;
    readonly x: number;
  }[];
  /** px of peaks taller than the drawing: they are cut there */
  readonly cuts: readonly number[];
  /** share of time below and above the band */
  readonly outside: { readonly below: number; readonly above: number };
}

/** Share of time per 1 % of travel that fills the height; one value for all rows, or rows would not compare. */
export const fullShare = 0.12;

/** px under the baseline for percentile ticks and the bracket */
export const footHeight = 13;

/**
 * The travel ridge: Tailrace's drawing of where a valve has spent its time.
 *
 * The axis is 0 to 100 % and the height is fixed, so that rows of a list compare. Height goes with the square
 * root of the share: the evidence is often in 5 % of the time spread over the last tenth of travel (0.5 % of
 * time per 1 % of travel), which on a linear height that still shows a busy valve whole would be one pixel of
 * a row; the root makes it six, and keeps a valve spread over half its travel at two fifths of the
 * height. A peak above 12 % of the time in 1 % of travel is cut at the top and marked as cut.
 *
 * @param ridge null where the valve was never assessed
 * @param box px; the lowest 13 px hold ticks and bracket
 * @returns paths that are empty where there is nothing to draw, never NaN
 */
export function travelRidge(ridge: Ridge | null, box: Box): RidgeGeometry {
  const baseline = box.bottom - footHeight;
  const x = travelScale(box.left, box.right);
  const height = scaleSqrt([0, fullShare], [baseline, box.top]).clamp(true);
  const toPlaces = (profile: ShareProfile): Place[] =>
    profile.map((place) => ({ x: x(place.x), y: height(place.y) }));
  const frame = { left: box.left, right: box.right, top: box.top, baseline };
  if (!ridge) {
    const nothing = { edge: [], within: '', beyond: '', hatch: '', bracket: '', percentiles: [], cuts: [] };
    return { ...frame, ...nothing, outside: { below: 0, above: 0 } };
  }

  const band = bandWithin(ridge.band);
  const profile = shareProfile(ridge.shares);
  const below = toPlaces(profileBetween(profile, 0, band.low));
  const above = toPlaces(profileBetween(profile, band.high, 100));
  return {
    ...frame,
    edge: toPlaces(profile),
    within: areaPath(toPlaces(profileBetween(profile, band.low, band.high)), baseline),
    beyond: areaPath(below, baseline) + areaPath(above, baseline),
    hatch: hatchUnder(below, baseline, 4) + hatchUnder(above, baseline, 4),
    bracket: bracketPath(x(band.low), x(band.high), baseline + 7, box.bottom - 1),
    percentiles: (['p5', 'p50', 'p95'] as const)
      .filter((name) => Number.isFinite(ridge[name]))
      .map((name) => ({ name, travel: ridge[name], x: x(ridge[name]) })),
    cuts: peaksAbove(profile, fullShare).map((travel) => x(travel)),
    outside: sharesOutside(ridge.shares, band),
  };
}

/** A band that makes no sense marks nothing as beyond it. */
function bandWithin(band: { readonly low: number; readonly high: number }): { low: number; high: number } {
  if (!(band.high > band.low)) return { low: 0, high: 100 };
  return { low: Math.max(0, band.low), high: Math.min(100, band.high) };
}

/** Under half a px there is nothing to see, and a hair of colour would make a healthy valve look ill. */
function areaPath(places: readonly Place[], baseline: number): string {
  const seen = (place: Place): boolean => baseline - place.y >= 0.5;
  const first = places.findIndex(seen);
  const last = places.findLastIndex(seen);
  if (first < 0) return '';
  return (
    area<Place>()
      .x((place) => place.x)
      .y0(baseline)
      .y1((place) => place.y)
      .digits(pathDigits)(places.slice(Math.max(0, first - 1), last + 2)) ?? ''
  );
}

function bracketPath(left: number, right: number, top: number, bottom: number): string {
  const [l, r] = [left.toFixed(1), right.toFixed(1)];
  return `M${l},${top}V${bottom}H${r}V${top}`;
}

/** Travel of the highest place of each run of the profile above a share. */
function peaksAbove(profile: ShareProfile, share: number): number[] {
  const peaks: number[] = [];
  let peak: Place | null = null;
  for (const place of profile) {
    if (place.y > share && place.y > (peak?.y ?? 0)) peak = place;
    if (place.y <= share && peak) {
      peaks.push(peak.x);
      peak = null;
    }
  }
  return peak ? [...peaks, peak.x] : peaks;
}
