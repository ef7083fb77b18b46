/** A swing as a complex number: half its length is the amplitude's, its angle the phase. */
export interface Phasor {
  readonly re: number;
  readonly im: number;
  /** amplitude, unit of the values */
  readonly amplitude: number;
}

/**
 * The swing of one period in part of a column: least squares of a constant, a sine and a cosine would be exact;
 * sums over whole cycles are enough here and need one pass.
 *
 * @param period in grid points
 * @param usable 1 where the value counts, or null for all
 * @returns amplitude NaN where nothing is known
 */
export function phasorOf(
  values: Float64Array,
  usable: Uint8Array | null,
  from: number,
  to: number,
  period: number,
): Phasor {
  const cycles = Math.max(1, Math.floor((to - from) / period));
  const end = Math.min(to, from + Math.round(cycles * period));
  const turn = (2 * Math.PI) / period;
  const stepCos = Math.cos(turn);
  const stepSin = Math.sin(turn);
  let c = 1;
  let s = 0;
  let sum = 0;
  let re = 0;
  let im = 0;
  let sumC = 0;
  let sumS = 0;
  let n = 0;
  for (let i = from; i < end; i++) {
    const v = values[i] as number;
    if (!Number.isNaN(v) && (usable === null || usable[i] === 1)) {
      sum += v;
      re += v * c;
      im += v * s;
      sumC += c;
      sumS += s;
      n++;
    }
    const next = c * stepCos - s * stepSin;
    s = s * stepCos + c * stepSin;
    c = next;
  }
  if (n === 0) return { re: NaN, im: NaN, amplitude: NaN };
  const mean = sum / n;
  re = (2 * (re - mean * sumC)) / n;
  im = (2 * (im - mean * sumS)) / n;
  return { re, im, amplitude: Math.hypot(re, im) };
}
