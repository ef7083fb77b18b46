import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { mad } from '../statistics/mad.js';
import { median } from '../statistics/quantile.js';
import { numberBlocks } from '../statistics/block-bootstrap.js';

/** Steady windows gathered by travel (§3.1): one entry a bin, in order of travel. */
export interface TravelBins {
  readonly count: number;
  /** mean relative travel of the bin's windows */
  readonly h: Float64Array;
  /** median of ln C (or ln flow) */
  readonly y: Float64Array;
  /** scaled MAD of it */
  readonly spread: Float64Array;
  /** 1/(spread²/periods + floor²) */
  readonly weight: Float64Array;
  readonly windows: Int32Array;
  readonly periods: Int32Array;
  /** windows that say something of the trim, with the bin each fell into (−1: dropped bin) */
  readonly used: Int32Array;
  readonly binOf: Int32Array;
  /** periods over all bins kept */
  readonly totalPeriods: number;
}

/** How strict binning is: the handbook's rules, or fewer periods in a record too short to repeat itself. */
export interface BinRules {
  readonly windows: number;
  readonly periods: number;
  /** % travel */
  readonly width: number;
  /** demand stands in for position: end bins thinly visited and bins far more scattered than the rest go */
  readonly demandOnly: boolean;
}

/** The handbook's rules (§3.1). */
export function regularBins(demandOnly: boolean, { characteristic }: Limits): BinRules {
  return {
    windows: characteristic.binWindows,
    periods: characteristic.binPeriods,
    width: characteristic.binWidth,
    demandOnly,
  };
}

/**
 * Gathers windows into bins of travel. Choked windows and windows without a coefficient take no part.
 *
 * @param L one value a window, NaN where it takes no part (windows.L as a rule)
 * Source: methods.md §3.1
 */
export function travelBins(
  windows: SteadyWindows,
  L: Float64Array,
  rules: BinRules,
  limits: Limits,
): TravelBins {
  const width = rules.width / 100;
  const members = new Map<number, number[]>();
  for (let i = 0; i < windows.count; i++) {
    if (windows.choked[i] === 1 || !Number.isFinite(L[i])) continue;
    // a hair keeps a mean of exactly 0.42 in the bin that starts there
    const bin = Math.floor((windows.h[i] as number) / width + 1e-9);
    const list = members.get(bin);
    if (list === undefined) members.set(bin, [i]);
    else list.push(i);
  }
  let bins = [...members.entries()]
    .sort(([a], [b]) => a - b)
    .map(([, list]) => summarise(windows, L, list, limits))
    .filter((bin) => bin.list.length >= rules.windows && bin.periods >= rules.periods);
  if (rules.demandOnly) bins = withoutDoubtfulBins(bins, limits);

  const binOf: number[] = [];
  const used: number[] = [];
  bins.forEach((bin, b) => {
    for (const i of bin.list) {
      used.push(i);
      binOf.push(b);
    }
  });
  return {
    count: bins.length,
    h: Float64Array.from(bins, (b) => b.h),
    y: Float64Array.from(bins, (b) => b.y),
    spread: Float64Array.from(bins, (b) => b.spread),
    weight: Float64Array.from(bins, (b) => b.weight),
    windows: Int32Array.from(bins, (b) => b.list.length),
    periods: Int32Array.from(bins, (b) => b.periods),
    used: Int32Array.from(used),
    binOf: Int32Array.from(binOf),
    totalPeriods: bins.reduce((sum, b) => sum + b.periods, 0),
  };
}

interface Bin {
  readonly list: readonly number[];
  readonly h: number;
  readonly y: number;
  readonly spread: number;
  readonly periods: number;
  readonly weight: number;
}

function summarise(windows: SteadyWindows, L: Float64Array, list: number[], limits: Limits): Bin {
  const values = Float64Array.from(list, (i) => L[i] as number);
  const y = median(values);
  const spread = mad(values, y);
  const { blocks: periods } = numberBlocks(list.map((i) => windows.slot[i] as number));
  const h = list.reduce((sum, i) => sum + (windows.h[i] as number), 0) / list.length;
  const floor = limits.characteristic.weightFloor;
  return { list, h, y, spread, periods, weight: 1 / (spread ** 2 / periods + floor ** 2) };
}

function withoutDoubtfulBins(bins: Bin[], limits: Limits): Bin[] {
  const typicalSpread = median(bins.map((b) => b.spread));
  const typicalCount = median(bins.map((b) => b.list.length));
  const kept = bins.filter((b) => b.spread <= limits.characteristic.spreadRatio * typicalSpread);
  const thin = (b: Bin | undefined) =>
    b !== undefined && b.list.length < limits.characteristic.endBinShare * typicalCount;
  while (thin(kept[0])) kept.shift();
  while (thin(kept.at(-1))) kept.pop();
  return kept;
}

/** Travel between the outermost bins, 0 to 1; 0 for fewer than two. */
export function spanOf(bins: TravelBins): number {
  return bins.count < 2 ? 0 : (bins.h[bins.count - 1] as number) - (bins.h[0] as number);
}
