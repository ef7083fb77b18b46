import { type Place } from './box.js';

/** The share of time per 1 % of travel as a line over travel: `x` is travel in %, `y` the share per 1 %. */
export type ShareProfile = readonly Place[];

/**
 * Light smoothing of the shares of time: each bin gives a quarter to each neighbour, twice over. At an end
 * of travel the part that would leave comes back, so no time is lost: a valve that sits wide open keeps
 * all of it. Our choice: enough to take the comb off a coarse position reading, too little to move a
 * percentile by more than about 1 % of travel.
 *
 * @param shares share of time in equal parts of travel from 0 to 100 %, each 0 to 1
 * @returns as many shares with the same sum; anything not finite or below zero counts as none
 */
export function smoothShares(shares: readonly number[]): number[] {
  const clean = shares.map((share) => (Number.isFinite(share) && share > 0 ? share : 0));
  return spread(spread(clean));
}

function spread(shares: readonly number[]): number[] {
  const last = shares.length - 1;
  return shares.map((share, i) => {
    const below = shares[Math.max(0, i - 1)] ?? 0;
    const above = shares[Math.min(last, i + 1)] ?? 0;
    return below / 4 + share / 2 + above / 4;
  });
}

/**
 * The line through the middles of the bins, carried level to both ends of travel. The area under it is the
 * sum of the shares, exactly: what is drawn is the time that was measured.
 *
 * @param shares share of time in equal parts of travel from 0 to 100 %
 * @returns empty where there are no shares or they hold no time
 */
export function shareProfile(shares: readonly number[]): ShareProfile {
  const smooth = smoothShares(shares);
  const width = 100 / smooth.length;
  const line = smooth.map((share, i) => ({ x: (i + 0.5) * width, y: share / width }));
  const first = line[0];
  const last = line.at(-1);
  if (!first || !last || line.every((place) => place.y === 0)) return [];
  return [{ x: 0, y: first.y }, ...line, { x: 100, y: last.y }];
}

/**
 * The piece of a profile between two travels, its ends interpolated.
 *
 * @param from % travel
 * @param to % travel
 * @returns empty where `to` is not above `from`
 */
export function profileBetween(profile: ShareProfile, from: number, to: number): ShareProfile {
  if (!(to > from) || profile.length === 0) return [];
  const within = profile.filter((place) => place.x > from && place.x < to);
  return [{ x: from, y: profileAt(profile, from) }, ...within, { x: to, y: profileAt(profile, to) }];
}

/** Height of the profile at a travel in %; 0 outside 0 to 100 %. */
export function profileAt(profile: ShareProfile, travel: number): number {
  const i = profile.findIndex((place) => place.x >= travel);
  const after = profile[i];
  if (!after || travel < 0) return 0;
  const before = profile[Math.max(0, i - 1)] ?? after;
  const gap = after.x - before.x;
  return gap === 0 ? after.y : before.y + ((after.y - before.y) * (travel - before.x)) / gap;
}

/**
 * Share of the time spent below and above a band, from the shares as measured (not smoothed). A bin that
 * the band cuts is taken as evenly used.
 */
export function sharesOutside(
  shares: readonly number[],
  band: { readonly low: number; readonly high: number },
): { below: number; above: number } {
  const width = 100 / shares.length;
  let below = 0;
  let above = 0;
  shares.forEach((share, i) => {
    if (!Number.isFinite(share)) return;
    below += share * fraction((band.low - i * width) / width);
    above += share * fraction(((i + 1) * width - band.high) / width);
  });
  return { below, above };
}

function fraction(value: number): number {
  return Math.min(1, Math.max(0, value));
}
