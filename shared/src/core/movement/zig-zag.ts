/**
 * The way a signal went, as straight legs between turning points: leg k runs from point `from[k]` to point
 * `to[k]` (indices), up (+1) or down (−1).
 */
export interface Legs {
  readonly count: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly direction: Int8Array;
  /** 1 where the leg begins at a reversal, 0 where it begins at a gap */
  readonly afterReversal: Uint8Array;
}

/**
 * Zig-zag of a signal: a turn counts once the signal has come back by `threshold` from its furthest point, and is
 * dated at that furthest point. What is not usable breaks the way: no leg runs over it.
 *
 * @param values NaN entries break the way too
 * @param usable 1 where the value counts, same length
 * @param threshold unit of the values, above 0
 * @returns no legs where the signal never moves by the threshold
 * Source: methods.md §6.1
 */
export function zigZag(values: Float64Array, usable: Uint8Array, threshold: number): Legs {
  const from: number[] = [];
  const to: number[] = [];
  const direction: number[] = [];
  const afterReversal: number[] = [];
  let going = 0;
  let begun = -1;
  let reversed = 0;
  let high = 0;
  let low = 0;
  let highest = -Infinity;
  let lowest = Infinity;
  const close = () => {
    if (going !== 0) {
      from.push(begun);
      to.push(going > 0 ? high : low);
      direction.push(going);
      afterReversal.push(reversed);
    }
    going = 0;
    reversed = 0;
    highest = -Infinity;
    lowest = Infinity;
  };
  for (let i = 0; i < values.length; i++) {
    const v = values[i] as number;
    if (usable[i] !== 1 || Number.isNaN(v)) {
      if (highest > -Infinity) close();
      continue;
    }
    if (v > highest) {
      highest = v;
      high = i;
    }
    if (v < lowest) {
      lowest = v;
      low = i;
    }
    if (going >= 0 && highest - v >= threshold) {
      if (going > 0) {
        from.push(begun);
        to.push(high);
        direction.push(1);
        afterReversal.push(reversed);
        reversed = 1;
      }
      going = -1;
      begun = high;
      lowest = v;
      low = i;
    } else if (going <= 0 && v - lowest >= threshold) {
      if (going < 0) {
        from.push(begun);
        to.push(low);
        direction.push(-1);
        afterReversal.push(reversed);
        reversed = 1;
      }
      going = 1;
      begun = low;
      highest = v;
      high = i;
    }
  }
  close();
  return {
    count: from.length,
    from: Int32Array.from(from),
    to: Int32Array.from(to),
    direction: Int8Array.from(direction),
    afterReversal: Uint8Array.from(afterReversal),
  };
}

/** Sum of the heights of all legs: the way travelled, unit of the values. */
export function wayOf(legs: Legs, values: Float64Array): number {
  let way = 0;
  for (let k = 0; k < legs.count; k++)
    way += Math.abs((values[legs.to[k] as number] as number) - (values[legs.from[k] as number] as number));
  return way;
}
