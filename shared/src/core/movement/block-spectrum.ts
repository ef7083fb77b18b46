import FFT from 'fft.js';

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
}

const crossingsWanted = 11;
/** Cycles a block must hold for a frequency to be looked at. */
const fewestCycles = 6;
/** The band goes from a third to three times the peak. */
const bandRatio = 3;
const taperShare = 0.1;
/** Tried where the strongest peak is not regular: the strongest after weighting by frequency. */
const weightings = [0, 1] as const;

/**
 * Finds an oscillation in a block of evenly spaced cells: the same sizes are used for every block of a record, so
 * its buffers and tables are made once.
 *
 * Source: Thornhill, Huang & Zhang 2003; methods.md §6.2
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
  private readonly length: number;

  /** @param cells length of a block */
  constructor(private readonly cells: number) {
    let length = 2;
    while (length < 1.65 * cells) length *= 2;
    this.length = length;
    this.fft = new FFT(length);
    this.input = new Float64Array(length);
    this.spectrum = new Float64Array(2 * length);
    this.power = new Float64Array(length / 2 + 1);
    this.correlation = new Float64Array(2 * length);
    this.taper = tukey(cells);
    this.input.set(this.taper);
    this.overlap = this.autocorrelation().slice();
    this.taperPower = (this.overlap[0] as number) / cells;
    const whole = this.overlap[0] as number;
    for (let lag = 0; lag < length; lag++) this.overlap[lag] = (this.overlap[lag] as number) / whole;
  }

  /**
   * @param block cells values without NaN; used up
   * @returns null where the block does not oscillate
   */
  find(block: Float64Array, rules: BlockRules): BlockOscillation | null {
    const { input, cells } = this;
    const rms = detrend(block);
    // √2·rms of the whole is the most a band of it can have
    if (!(Math.SQRT2 * rms >= rules.amplitude)) return null;
    for (let i = 0; i < cells; i++) input[i] = (block[i] as number) * (this.taper[i] as number);
    input.fill(0, cells);
    this.transform();
    let tried = -1;
    for (const weighting of weightings) {
      const peak = this.strongest(rules, weighting);
      if (peak <= 0 || peak === tried) continue;
      tried = peak;
      const found = this.judge(peak, rules);
      if (found !== null) return found;
    }
    return null;
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

  private strongest(rules: BlockRules, weighting: 0 | 1): number {
    const { length, power } = this;
    const low = Math.max(2, Math.ceil(length / rules.longest));
    const high = Math.min(length / 2 - 1, Math.floor(length / rules.shortest));
    let best = 0;
    let most = 0;
    for (let k = low; k <= high; k++) {
      const p = (power[k - 1] as number) + (power[k] as number) + (power[k + 1] as number);
      const weighted = weighting === 0 ? p : p * k;
      if (weighted > most) {
        most = weighted;
        best = k;
      }
    }
    return best;
  }

  private judge(peak: number, rules: BlockRules): BlockOscillation | null {
    const { power, length, cells } = this;
    const low = Math.max(Math.ceil(peak / bandRatio), Math.ceil((fewestCycles * length) / cells));
    const high = Math.min(Math.floor(peak * bandRatio), length / 2 - 1);
    let band = 0;
    for (let k = low; k <= high; k++) band += power[k] as number;
    const amplitude = Math.SQRT2 * Math.sqrt((2 * band) / (length * cells * this.taperPower));
    if (!(amplitude >= rules.amplitude) || !this.promising(peak, low, high, band, rules.first)) return null;
    const r = this.bandCorrelation(low, high);
    const intervals = crossingIntervals(r, Math.floor(0.65 * cells));
    if (intervals === null) return null;
    const period = 2 * intervals.mean;
    const regularity = intervals.mean / (3 * intervals.sd);
    if (!(regularity > rules.regularity) || period < rules.shortest || period > rules.longest) return null;
    if (!(this.at(r, period) >= rules.first) || !(this.at(r, 3 * period) >= rules.third)) return null;
    return { period, regularity, amplitude };
  }

  /**
   * Autocorrelation near one period of the peak, straight from the power spectrum (Wiener–Khinchin): spares the
   * inverse transform where it could not come out high enough.
   */
  private promising(peak: number, low: number, high: number, band: number, first: number): boolean {
    const { power, length } = this;
    for (const stretch of [1, 0.94, 1.06]) {
      const turn = (2 * Math.PI * stretch) / peak;
      let sum = 0;
      for (let k = low; k <= high; k++) sum += (power[k] as number) * Math.cos(turn * k);
      const lag = Math.round((stretch * length) / peak);
      if (sum >= 0.9 * first * (this.overlap[lag] as number) * band) return true;
    }
    return false;
  }

  /** Autocorrelation of the band, by lag in cells; 1 at lag 0. */
  private bandCorrelation(low: number, high: number): Float64Array {
    const { spectrum, power, length } = this;
    spectrum.fill(0);
    for (let k = low; k <= high; k++) {
      spectrum[2 * k] = power[k] as number;
      spectrum[2 * (length - k)] = power[k] as number;
    }
    return this.backwards();
  }

  private autocorrelation(): Float64Array {
    this.transform();
    const { spectrum, power, length } = this;
    spectrum.fill(0);
    for (let k = 0; k <= length / 2; k++) {
      spectrum[2 * k] = power[k] as number;
      if (k > 0 && k < length / 2) spectrum[2 * (length - k)] = power[k] as number;
    }
    return this.backwards();
  }

  private backwards(): Float64Array {
    const { correlation, length } = this;
    this.fft.inverseTransform(correlation, this.spectrum);
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

/** Takes the straight line out of a block in place; returns the rms of what is left. */
function detrend(block: Float64Array): number {
  const n = block.length;
  let sum = 0;
  let moment = 0;
  const middle = (n - 1) / 2;
  for (let i = 0; i < n; i++) {
    sum += block[i] as number;
    moment += (block[i] as number) * (i - middle);
  }
  const mean = sum / n;
  const slope = n > 1 ? (12 * moment) / (n * (n * n - 1)) : 0;
  let squares = 0;
  for (let i = 0; i < n; i++) {
    const left = (block[i] as number) - mean - slope * (i - middle);
    block[i] = left;
    squares += left * left;
  }
  return Math.sqrt(squares / n);
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
