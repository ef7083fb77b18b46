/**
 * Uniform random numbers in [0, 1) from a seed: the same seed gives the same numbers everywhere.
 *
 * 32-bit state advanced by a Weyl constant and mixed by multiply and xor-shift; ample for resampling, not for
 * secrets (our own arrangement of the well-known mixing step of Steele, Lea & Flood 2014).
 *
 * @param seed any number; only its 32 low bits count
 */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return ((z ^ (z >>> 16)) >>> 0) / 4_294_967_296;
  };
}

/** A 32-bit seed from words and numbers (FNV-1a over their text), so that every random step can be repeated. */
export function seedFrom(...parts: readonly (string | number)[]): number {
  let hash = 0x811c9dc5;
  for (const part of parts) {
    for (const character of `${String(part)}|`) {
      hash ^= character.codePointAt(0) ?? 0;
      hash = Math.imul(hash, 0x01000193);
    }
  }
  return hash >>> 0;
}
