/**
 * The piece of a curve between two travels, its ends interpolated: what is drawn stops exactly where the
 * travel visited stops.
 *
 * @param curve places at ascending travel, %; places with anything not finite are passed over
 * @param from % travel
 * @param to % travel
 * @returns the piece inside the curve's own reach; empty where the two do not meet
 */
export function curveBetween<P extends { readonly travel: number; readonly value: number }>(
  curve: readonly P[],
  from: number,
  to: number,
): P[] {
  const places = curve.filter((place) =>
    Object.values(place).every((figure) => typeof figure !== 'number' || Number.isFinite(figure)),
  );
  const inside = places.filter((place) => place.travel > from && place.travel < to);
  const ends = (travel: number): P[] => {
    const place = curveAt(places, travel);
    return place ? [place] : [];
  };
  return to > from ? [...ends(from), ...inside, ...ends(to)] : ends(from);
}

/** The place of a curve at a travel, every figure of it interpolated; null outside the curve's reach. */
export function curveAt<P extends { readonly travel: number }>(
  curve: readonly P[],
  travel: number,
): P | null {
  const i = curve.findIndex((place) => place.travel >= travel);
  const after = curve[i];
  if (!after) return null;
  if (after.travel === travel) return after;
  const before = curve[i - 1];
  if (!before) return null;
  const part = (travel - before.travel) / (after.travel - before.travel);
  const mixed = Object.entries(after).map(([key, high]) => {
    const low = before[key as keyof P];
    return [key, typeof high === 'number' && typeof low === 'number' ? low + (high - low) * part : high];
  });
  return { ...after, ...Object.fromEntries(mixed) } as P;
}
