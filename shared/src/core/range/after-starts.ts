import { type Prepared, valveState } from '../preparation/prepared.js';

/**
 * Grid points at least so long after the last start: start-up and minimum-flow duty legitimately sit low, so
 * verdicts on size are shown without them as well.
 *
 * A start is what the state marks as settling; before the first one everything counts.
 *
 * @param seconds after a start
 * @returns 1 where the point counts
 * Source: methods.md §5.3
 */
export function settledFrom(prepared: Prepared, seconds: number): Uint8Array {
  const counts = new Uint8Array(prepared.count);
  const wait = Math.ceil(seconds / prepared.step);
  const starting = valveState.settling | valveState.inService;
  let since = wait;
  for (let i = 0; i < prepared.count; i++) {
    since = ((prepared.state[i] as number) & starting) === starting ? 0 : since + 1;
    if (since >= wait) counts[i] = 1;
  }
  return counts;
}
