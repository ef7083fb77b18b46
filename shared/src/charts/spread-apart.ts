/**
 * Moves labels along an axis just far enough apart to be read, keeping their order, none past an end.
 *
 * @param places px, ascending
 * @param gap px wanted between neighbours
 * @param left px of the first place allowed
 * @param right px of the last place allowed
 */
export function spreadApart(places: readonly number[], gap: number, left: number, right: number): number[] {
  const moved: number[] = [];
  places.forEach((place, i) => moved.push(Math.max(place, i === 0 ? left : (moved[i - 1] ?? left) + gap)));
  for (let i = moved.length - 1, limit = right; i >= 0; i--, limit -= gap) {
    moved[i] = Math.min(moved[i] ?? limit, limit);
  }
  return moved;
}
