/**
 * How often each block is drawn in one resample of as many blocks with replacement (block bootstrap, Künsch 1989):
 * neighbours in time are not independent, whole blocks nearly are.
 *
 * @param blocks number of blocks
 * @param random uniform numbers in [0, 1)
 * @param into filled with the counts; length `blocks`
 */
export function drawBlocks(blocks: number, random: () => number, into: Int32Array): Int32Array {
  into.fill(0);
  for (let k = 0; k < blocks; k++) {
    const drawn = Math.min(blocks - 1, Math.floor(random() * blocks));
    into[drawn] = (into[drawn] as number) + 1;
  }
  return into;
}

/** Numbers any labels (days, slots) 0…blocks − 1 in order of first appearance. */
export function numberBlocks(labels: ArrayLike<number>): {
  readonly block: Int32Array;
  readonly blocks: number;
} {
  const known = new Map<number, number>();
  const block = new Int32Array(labels.length);
  for (let i = 0; i < labels.length; i++) {
    const label = labels[i] as number;
    let number = known.get(label);
    if (number === undefined) {
      number = known.size;
      known.set(label, number);
    }
    block[i] = number;
  }
  return { block, blocks: known.size };
}
