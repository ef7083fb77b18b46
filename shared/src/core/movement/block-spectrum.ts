import FFT from 'fft.js';
import { madFactor } from '../statistics/mad.js';
import { medianInPlace } from '../statistics/quantile.js';

/** What a block of a signal shows of one period. */
export interface BlockOscillation {
  /** in cells */
  readonly period: number;
  /** (1/3)·mean/sd of the intervals between zero crossings of the autocorrelation */
  readonly regularity: number;
  /** √2 × rms in the band, unit of the signal */
  readonly amplitude: number;
}

/** What a block must show, periods in cells. */
export interface BlockRules {
  readonly shortest: number;
  readonly longest: number;
  readonly amplitude: number;
  readonly regularity: number;
  readonly first: number;
  readonly third: number;
  /** changes from cell to cell beyond this many spreads are held there */
  readonly clip: number;
}

const crossingsWanted = 11;
/** The band goes from a third to three times the peak. */
const bandRatio = 3;
/** The amplitude is taken from this part of the peak upwards: what lies lower is the load's wandering. */
const amplitudeFrom = 2 / 3;
/** Held changes below this share of the whole: most of the movement was held. */
const jumpRatio = 0.5;
const taperShare = 0.1;
/** Lags needed, in longest periods: eleven zero crossings, and a little. */
const lagPeriods = 5.75;

/**
 * Finds an oscillation in a block of evenly spaced cells: the same sizes are used for every block of an octave, so
 * its buffers and tables are made once.
 *
 * The test is that of Thornhill, Huang & Zhang (2003) on zero crossings of the autocorrelation, with two changes of
 * ours, both old practice: it is taken on changes from cell to cell (prewhitening, Blackman & Tukey 1958), and
 * changes beyond a few spreads are held there (winsorising, Huber 1964). A step of set point or load, which in the
 * travel outweighs every oscillation of the block, is then one change among many.
 *
 * Source: methods.md §6.2
 */
export class BlockSpectrum {
  private readonly fft: FFT;
  private readonly taper: Float64Array;
  private readonly taperPower: number;
  /** autocorrelation of the taper: what a perfect oscillation loses at a lag for want of overlap */
  private readonly overlap: Float64Array;
  private readonly input: Float64Array;
  private readonly spectrum: Float64Array;
  private readonly power: Float64Array;
  private readonly correlation: Float64Array;
  private readonly changes: Float64Array;
  private readonly sizes: Float64Array;
  private readonly length: number;
  private readonly lastLag: number;

  /** @param cells length of a block */
  constructor(
    private readonly cells: number,
    private readonly rules: BlockRules,
  ) {
    this.lastLag = Math.min(cells - 1, Math.ceil(lagPeriods * rules.longest));
    let length = 2;
    while (length < cells + this.lastLag) length *= 2;
    this.length = length;
    this.fft = new FFT(length);
    this.input = new Float64Array(length);
    this.spectrum = new Float64Array(2 * length);
    this.power = new Float64Array(length / 2 + 1);
    this.correlation = new Float64Array(2 * length);
    this.changes = new Float64Array(cells);
    this.sizes = new Float64Array(cells);
    this.taper = tukey(cells);
    this.input.set(this.taper);
    this.transform();
    this.overlap = this.bandCorrelation(0, length / 2).slice();
    this.taperPower = (this.overlap[0] as number) / cells;
    const whole = this.overlap[0] as number;
    for (let lag = 0; lag < length; lag++) this.overlap[lag] = (this.overlap[lag] as number) / whole;
  }

  /**
   * @param block cells values without NaN
   * @returns null where the block does not oscillate
   */
  find(block: Float64Array): BlockOscillation | null {
    const { rules } = this;
    const rms = this.changesOf(block);
    // the longest period makes the smallest changes: less than this cannot be an oscillation worth a word
    const least = (rules.amplitude * 2 * Math.sin(Math.PI / rules.longest)) / Math.SQRT2;
    if (!(rms >= least)) return null;
    const held = this.holdAt(rules.clip * madFactor * this.ordinaryChange());
    const found = held >= least ? this.look() : null;
    if (found !== null || !(held < jumpRatio * rms)) return found;
    // a stem that rests and jumps changes in few cells only: what was held is then the oscillation itself
    this.changesOf(block);
    this.holdAt(Infinity);
    return this.look();
  }

  private look(): BlockOscillation | null {
    const { input, changes, cells } = this;
    for (let i = 0; i < cells; i++) input[i] = (changes[i] as number) * (this.taper[i] as number);
    input.fill(0, cells);
    this.transform();
    const peak = this.strongest();
    return peak > 0 ? this.judge(peak) : null;
  }

  /** Changes from cell to cell; returns their rms. */
  private changesOf(block: Float64Array): number {
    const { changes, cells } = this;
    let squares = 0;
    changes[0] = 0;
    for (let i = 1; i < cells; i++) {
      const change = (block[i] as number) - (block[i - 1] as number);
      changes[i] = change;
      squares += change * change;
    }
    return Math.sqrt(squares / (cells - 1));
  }

  private ordinaryChange(): number {
    const { changes, sizes, cells } = this;
    for (let i = 1; i < cells; i++) sizes[i] = Math.abs(changes[i] as number);
    return medianInPlace(sizes, 1, cells);
  }

  /** Holds the changes at ±hold and takes their mean out; returns the rms of what is left. */
  private holdAt(hold: number): number {
    const { changes, cells } = this;
    let sum = 0;
    let squares = 0;
    for (let i = 1; i < cells; i++) {
      const change = Math.min(hold, Math.max(-hold, changes[i] as number));
      changes[i] = change;
      sum += change;
      squares += change * change;
    }
    const mean = sum / (cells - 1);
    for (let i = 1; i < cells; i++) changes[i] = (changes[i] as number) - mean;
    return Math.sqrt(Math.max(0, squares / (cells - 1) - mean * mean));
  }

  private transform(): void {
    const { spectrum, power, length } = this;
    this.fft.realTransform(spectrum, this.input);
    for (let k = 0; k <= length / 2; k++) {
      const re = spectrum[2 * k] as number;
      const im = spectrum[2 * k + 1] as number;
      power[k] = re * re + im * im;
    }
  }

  private strongest(): number {
    const { length, power, rules } = this;
    const low = Math.max(2, Math.floor(length / rules.longest));
    const high = Math.min(length / 2 - 1, Math.ceil(length / rules.shortest));
    let best = 0;
    let most = 0;
    for (let k = low; k <= high; k++) {
      const p = (power[k - 1] as number) + 2 * (power[k] as number) + (power[k + 1] as number);
      if (p > most) {
        most = p;
        best = k;
      }
    }
    return best;
  }

  private judge(peak: number): BlockOscillation | null {
    const { power, length, rules } = this;
    const low = Math.max(1, Math.ceil(peak / bandRatio));
    const high = Math.min(Math.floor(peak * bandRatio), length / 2 - 1);
    let band = 0;
    for (let k = low; k <= high; k++) band += power[k] as number;
    if (!this.promising(peak, low, high, band)) return null;
    const amplitude = this.amplitudeOf(peak, high);
    if (!(amplitude >= rules.amplitude)) return null;
    const r = this.bandCorrelation(low, high);
    const intervals = crossingIntervals(r, this.lastLag);
    if (intervals === null) return null;
    const period = 2 * intervals.mean;
    const regularity = intervals.mean / (3 * intervals.sd);
    if (!(regularity > rules.regularity) || period < rules.shortest || period > rules.longest) return null;
    if (!(this.at(r, period) >= rules.first) || !(this.at(r, 3 * period) >= rules.third)) return null;
    return { period, regularity, amplitude };
  }

  /** √2 × rms of the travel in the band: changes summed up again, and what averaging over a cell takes given back. */
  private amplitudeOf(peak: number, high: number): number {
    const { power, length, cells } = this;
    let sum = 0;
    for (let k = Math.ceil(amplitudeFrom * peak); k <= high; k++) {
      const half = (Math.PI * k) / length;
      // change of a unit swing is 2 sin(half); the mean over a cell keeps sin(half)/half of it
      sum += (power[k] as number) / ((2 * Math.sin(half)) ** 2 * (Math.sin(half) / half) ** 2);
    }
    return Math.SQRT2 * Math.sqrt((2 * sum) / (length * cells * this.taperPower));
  }

  /**
   * Autocorrelation near one period of the peak, straight from the power spectrum (Wiener–Khinchin): spares the
   * inverse transform where it could not come out high enough.
   */
  private promising(peak: number, low: number, high: number, band: number): boolean {
    const { power, length } = this;
    for (const stretch of [1, 0.94, 1.06]) {
      const turn = (2 * Math.PI * stretch) / peak;
      let sum = 0;
      for (let k = low; k <= high; k++) sum += (power[k] as number) * Math.cos(turn * k);
      const lag = Math.round((stretch * length) / peak);
      if (sum >= 0.9 * this.rules.first * (this.overlap[lag] as number) * band) return true;
    }
    return false;
  }

  /** Autocorrelation of the band, by lag in cells. */
  private bandCorrelation(low: number, high: number): Float64Array {
    const { spectrum, power, correlation, length } = this;
    spectrum.fill(0);
    for (let k = low; k <= high; k++) {
      spectrum[2 * k] = power[k] as number;
      if (k > 0 && k < length / 2) spectrum[2 * (length - k)] = power[k] as number;
    }
    this.fft.inverseTransform(correlation, spectrum);
    for (let lag = 0; lag < length; lag++) correlation[lag] = correlation[2 * lag] as number;
    return correlation.subarray(0, length);
  }

  /** Normalised autocorrelation at a lag that need not be whole, what the taper takes given back. */
  private at(r: Float64Array, lag: number): number {
    const below = Math.floor(lag);
    const t = lag - below;
    const value = (1 - t) * (r[below] as number) + t * (r[below + 1] as number);
    return value / (r[0] as number) / (this.overlap[Math.round(lag)] as number);
  }
}

/** Flat window whose ends rise and fall as half a cosine over a share of its length. */
function tukey(n: number): Float64Array {
  const w = new Float64Array(n).fill(1);
  const edge = Math.floor((taperShare / 2) * n);
  for (let i = 0; i < edge; i++) {
    const v = 0.5 * (1 - Math.cos((Math.PI * (i + 0.5)) / edge));
    w[i] = v;
    w[n - 1 - i] = v;
  }
  return w;
}

/** Mean and standard deviation of the first ten intervals between zero crossings; null where there are fewer. */
function crossingIntervals(r: Float64Array, last: number): { mean: number; sd: number } | null {
  let crossings = 0;
  let before = 0;
  let sum = 0;
  let squares = 0;
  for (let lag = 1; lag <= last && crossings < crossingsWanted; lag++) {
    const a = r[lag - 1] as number;
    const b = r[lag] as number;
    if (a > 0 === b > 0) continue;
    const at = lag - 1 + a / (a - b);
    if (crossings > 0) {
      sum += at - before;
      squares += (at - before) ** 2;
    }
    before = at;
    crossings++;
  }
  if (crossings < crossingsWanted) return null;
  const n = crossingsWanted - 1;
  const mean = sum / n;
  // a perfect sine in whole cells would divide by nothing
  return { mean, sd: Math.max(Math.sqrt(Math.max(0, squares / n - mean * mean)), 1e-3 * mean) };
}
