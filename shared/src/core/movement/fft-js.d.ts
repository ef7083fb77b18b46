/** The part of fft.js used here; the package ships no types. Complex numbers lie as pairs (re, im). */
declare module 'fft.js' {
  export default class FFT {
    constructor(size: number);
    readonly size: number;
    transform(out: Float64Array, data: Float64Array): void;
    realTransform(out: Float64Array, data: Float64Array): void;
    inverseTransform(out: Float64Array, data: Float64Array): void;
  }
}
