import {
  type EffectiveCharacteristic,
  type InstalledGain,
  type Interval,
  type OperatingRange,
} from '../assessment.js';
import { dayResamples } from '../characteristic/day-resamples.js';
import { regularBins, spanOf, travelBins, type TravelBins } from '../characteristic/travel-bins.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { quantile } from '../statistics/quantile.js';
import { weightedLine, weightedPolynomial } from '../statistics/regression.js';
import { isControlledFlow } from './operating-range.js';

const points = 30;
/** travel left out at either end of the used range, % */
const margin = 2;
/** bins a local line needs */
const localBins = 4;

/**
 * Installed gain: how much of the flow span one per cent of travel moves, along the travel used.
 *
 * Local slopes of the bin medians of flow; a single cubic where the trim is equal percentage, whose curve a
 * cubic follows better than local lines do. The ratio's interval is the 10 to 90 % range of day resamples.
 *
 * @returns a refusal below the span and bins the handbook asks for
 * Source: methods.md §5.2
 */
export function installedGain(
  prepared: Prepared,
  windows: SteadyWindows,
  range: OperatingRange | null,
  characteristic: EffectiveCharacteristic,
  random: () => number,
  limits: Limits,
): InstalledGain | CannotJudge {
  const rules = limits.range;
  if (prepared.flow === null) return cannotJudge('no-flow');
  if (range === null) return cannotJudge('valve-not-in-service');
  const flow = windows.flow.map((q) => (100 * q) / prepared.flowSpan);
  const whole = { ...windows, choked: new Uint8Array(windows.count) };
  const bins = travelBins(whole, flow, regularBins(prepared.travelSource === 'demand', limits), limits);
  if (bins.count < rules.gainBins)
    return cannotJudge('too-few-bins', { bins: bins.count, needed: rules.gainBins });
  const span = 100 * spanOf(bins);
  if (span < rules.gainSpan) return cannotJudge('span-too-small', { span, needed: rules.gainSpan });
  const from = Math.max(range.p5 + margin, 100 * (bins.h[0] as number));
  const to = Math.min(range.p95 - margin, 100 * (bins.h[bins.count - 1] as number));
  if (!(to - from >= 1))
    return cannotJudge('span-too-small', { span: Math.max(0, to - from), needed: rules.gainSpan });
  const at = Array.from({ length: points }, (_, i) => from + ((to - from) * i) / (points - 1));
  const cubic = characteristic.kind === 'equal percentage';
  const slopes = (y: Float64Array) => (cubic ? cubicSlopes(bins, y, at) : localSlopes(bins, y, at, limits));

  const gain = slopes(bins.y);
  if (gain.every(Number.isNaN))
    return cannotJudge('too-few-bins', { bins: bins.count, needed: rules.gainBins });
  const resample = dayResamples(whole, bins, flow, bins.y, random);
  const y = new Float64Array(bins.count);
  const redrawn = Array.from({ length: limits.characteristic.bandResamples }, () =>
    extremes(slopes(resample(y)), rules.gainFloor),
  );
  const found = extremes(gain, rules.gainFloor);
  const interval = (value: number, drawn: number[]): Interval => ({
    value,
    low: quantile(drawn, 0.1),
    high: quantile(drawn, 0.9),
  });
  return {
    bins: bins.count,
    span,
    points: at.map((travel, i) => ({ travel, gain: gain[i] as number })).filter((p) => !Number.isNaN(p.gain)),
    min: interval(
      found.min,
      redrawn.map((r) => r.min),
    ),
    max: interval(
      found.max,
      redrawn.map((r) => r.max),
    ),
    ratio: interval(
      found.max / found.min,
      redrawn.map((r) => r.max / r.min),
    ),
    absolute: prepared.processValue === null || isControlledFlow(prepared.processValue, prepared.flow),
  };
}

/** Weighted line through the bins within ±8 % travel of each place; NaN with fewer than four. */
function localSlopes(bins: TravelBins, y: Float64Array, at: readonly number[], limits: Limits): number[] {
  const half = limits.range.gainHalfWidth / 100;
  return at.map((x) => {
    const near: number[] = [];
    for (let b = 0; b < bins.count; b++) if (Math.abs((bins.h[b] as number) - x / 100) <= half) near.push(b);
    if (near.length < localBins) return NaN;
    const { slope } = weightedLine(
      near.map((b) => 100 * (bins.h[b] as number)),
      near.map((b) => y[b] as number),
      near.map((b) => bins.periods[b] as number),
    );
    return slope;
  });
}

function cubicSlopes(bins: TravelBins, y: Float64Array, at: readonly number[]): number[] {
  const fit = weightedPolynomial(
    bins.h.map((h) => 100 * h),
    y,
    bins.periods,
    3,
  );
  if (fit === null) return at.map(() => NaN);
  const [, c1 = 0, c2 = 0, c3 = 0] = fit.coefficients;
  return at.map((x) => {
    const t = (x - fit.centre) / fit.scale;
    return (c1 + 2 * c2 * t + 3 * c3 * t * t) / fit.scale;
  });
}

function extremes(gain: readonly number[], floor: number): { min: number; max: number } {
  let min = Infinity;
  let max = -Infinity;
  for (const g of gain) {
    if (Number.isNaN(g)) continue;
    min = Math.min(min, g);
    max = Math.max(max, g);
  }
  return { min: Math.max(floor, min), max: Math.max(floor, max) };
}
