import { type Grid } from './prepared.js';

/** When a downstream pressure above the upstream one is refused (§1.1). */
export interface CrossedRules {
  /** share of the largest upstream pressure */
  readonly share: number;
  /** s */
  readonly seconds: number;
}

/**
 * Takes out spells in which the downstream pressure stands above the upstream one by more than the allowed
 * share for longer than the allowed time.
 *
 * @returns both columns with those spells NaN, and how many grid points went
 */
export function withoutCrossed(
  upstream: Float64Array,
  downstream: Float64Array,
  grid: Grid,
  rules: CrossedRules,
): { readonly upstream: Float64Array; readonly downstream: Float64Array; readonly crossed: number } {
  let largest = 0;
  for (let i = 0; i < grid.count; i++) if ((upstream[i] as number) > largest) largest = upstream[i] as number;
  const allowed = rules.share * largest;
  const longest = rules.seconds / grid.step;
  let cleanUp = upstream;
  let cleanDown = downstream;
  let crossed = 0;
  let from = -1;
  for (let i = 0; i <= grid.count; i++) {
    const over = i < grid.count && (downstream[i] as number) - (upstream[i] as number) > allowed;
    if (over && from < 0) from = i;
    if (over || from < 0) continue;
    if (i - from > longest) {
      if (cleanUp === upstream) {
        cleanUp = upstream.slice();
        cleanDown = downstream.slice();
      }
      cleanUp.fill(NaN, from, i);
      cleanDown.fill(NaN, from, i);
      crossed += i - from;
    }
    from = -1;
  }
  return { upstream: cleanUp, downstream: cleanDown, crossed };
}
