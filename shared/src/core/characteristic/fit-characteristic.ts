import { type CharacteristicPoint, type CurvePoint, type EffectiveCharacteristic } from '../assessment.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median, sortedQuantile } from '../statistics/quantile.js';
import { weightedLine } from '../statistics/regression.js';
import { dayResamples } from './day-resamples.js';
import { type CharacteristicSetting, decideKind } from './decide-kind.js';
import { basesAt, fitKinds, fittedLog, type KindFit, refitKind, shapeParameter } from './fit-kinds.js';
import { installedCurve } from './installed-curve.js';
import { kindEvidence, likeliest } from './kind-evidence.js';
import { descriptiveStep, parameterIntervals } from './parameter-intervals.js';
import { regularBins, spanOf, travelBins, type TravelBins } from './travel-bins.js';

/** The effective characteristic with what later chapters build on. */
export interface CharacteristicFit {
  readonly characteristic: EffectiveCharacteristic | null;
  /** why there is no characteristic, or null */
  readonly refusal: CannotJudge | null;
  readonly bins: TravelBins;
  /** ln of the best curve at a relative travel; null without a characteristic */
  readonly logCurve: ((h: number) => number) | null;
}

/** Bins an installed or inherent curve needs to be drawn at all. */
const fewestBins = 3;
const curvePoints = 41;

/**
 * The effective characteristic from steady windows: bins, every law fitted, the kind that won or why none did,
 * and the best curve over the travel visited with its band.
 *
 * Source: methods.md §3
 */
export function fitCharacteristic(windows: SteadyWindows, setting: CharacteristicSetting): CharacteristicFit {
  const { limits } = setting;
  const rules = limits.characteristic;
  const bins = bestBins(windows, setting);
  const refuse = (refusal: CannotJudge): CharacteristicFit => ({
    characteristic: null,
    refusal,
    bins,
    logCurve: null,
  });
  if (windows.count < limits.windows.least)
    return refuse(cannotJudge('too-few-windows', { windows: windows.count, needed: limits.windows.least }));
  const span = 100 * spanOf(bins);
  if (bins.count < fewestBins || span < rules.ratioSpan) {
    return refuse(
      bins.count >= 1 && span < rules.ratioSpan
        ? cannotJudge('span-too-small', { span, needed: rules.ratioSpan })
        : cannotJudge('too-few-bins', { bins: bins.count, needed: fewestBins }),
    );
  }
  if (fallsAsItOpens(bins)) return refuse(cannotJudge('flow-falls-as-valve-opens'));
  if (windows.source !== 'none') return inherent(windows, bins, setting);
  // flow alone: what moves it besides the valve has to be told apart from the valve
  if (span < limits.range.gainSpan)
    return refuse(cannotJudge('span-too-small', { span, needed: limits.range.gainSpan }));
  if (!flowFollows(bins)) return refuse(cannotJudge('flow-does-not-follow'));
  return installed(windows, bins, setting);
}

/** Bin width for records that pass each travel once, % (our choice). */
const wideBins = 5;

/** The handbook's bins; where a record is too short to visit a travel twice, wider bins visited once. */
function bestBins(windows: SteadyWindows, { limits, travelSource }: CharacteristicSetting): TravelBins {
  const rules = regularBins(travelSource === 'demand', limits);
  const bins = travelBins(windows, windows.L, rules, limits);
  if (bins.count >= fewestBins) return bins;
  const wider = travelBins(windows, windows.L, { ...rules, width: wideBins, periods: 1 }, limits);
  return wider.count >= fewestBins ? wider : bins;
}

/** A curve that clearly falls: the signal is reverse acting or two tags are exchanged. */
function fallsAsItOpens(bins: TravelBins): boolean {
  const { slope, intercept } = weightedLine(bins.h, bins.y, bins.weight);
  if (slope * spanOf(bins) > -0.15) return false;
  let explained = 0;
  let left = 0;
  const mean = bins.y.reduce((a, b) => a + b, 0) / bins.count;
  for (let b = 0; b < bins.count; b++) {
    explained += ((bins.y[b] as number) - mean) ** 2;
    left += ((bins.y[b] as number) - intercept - slope * (bins.h[b] as number)) ** 2;
  }
  return left < 0.5 * explained;
}

/** Rise of the installed curve over its span, in standard errors of a bin, from which the valve is seen in it (our choice). */
const visibleRise = 3;

function flowFollows(bins: TravelBins): boolean {
  const rise = weightedLine(bins.h, bins.y, bins.weight).slope * spanOf(bins);
  return rise >= (visibleRise * median(bins.spread)) / Math.sqrt(median(bins.periods));
}

function installed(
  windows: SteadyWindows,
  bins: TravelBins,
  setting: CharacteristicSetting,
): CharacteristicFit {
  const curve = installedCurve(bins.h, bins.y, bins.weight);
  const resample = dayResamples(windows, bins, windows.L, bins.y, setting.random);
  const at = curveTravels(bins);
  const band = bandOf(at, setting.limits.characteristic.bandResamples, () => {
    const y = resample(new Float64Array(bins.count));
    return installedCurve(bins.h, y, bins.weight);
  });
  return {
    refusal: null,
    bins,
    logCurve: curve,
    characteristic: {
      basis: 'installed',
      pressureDrop: 'none',
      kind: 'undecided',
      undecided: cannotJudge('no-pressures'),
      ratedCoefficient: null,
      rangeability: null,
      percentStep: descriptiveStep(bins, setting.limits),
      span: travelSpan(bins),
      points: pointsOf(bins),
      curve: at.map((h, i) => curvePoint(h, curve(h), band[i])),
      fits: [],
      agreement: null,
    },
  };
}

function inherent(
  windows: SteadyWindows,
  bins: TravelBins,
  setting: CharacteristicSetting,
): CharacteristicFit {
  const { limits } = setting;
  const rules = limits.characteristic;
  const evidenceOf = kindEvidence(bins, limits);
  const evidence = evidenceOf(bins.y);
  const likely = likeliest(evidence).kind;
  const fits = fitKinds(bins, limits);
  const best = fits.find((f) => f.kind === likely) as KindFit;
  const basis = basesAt(bins.h, limits).get(likely) as Float64Array;
  const resample = dayResamples(windows, bins, windows.L, bins.y, setting.random);

  const redrawn: { intercept: number; slope: number }[] = [];
  let won = 0;
  for (let k = 0; k < rules.bandResamples; k++) {
    const y = resample(new Float64Array(bins.count));
    redrawn.push(refitKind(likely, basis, { ...bins, y }, best.weights, limits));
    if (k < rules.kindResamples && likeliest(evidenceOf(y)).kind === likely) won++;
  }
  const agreement = won / Math.min(rules.kindResamples, rules.bandResamples);
  const kind = decideKind(windows, bins, evidence, agreement, best.rms, setting);
  const named = typeof kind === 'string';

  const at = curveTravels(bins);
  let turn = 0;
  const band = bandOf(at, redrawn.length, () => {
    const fit = { ...best, ...redrawn[turn++] };
    return (h) => fittedLog(fit, h, limits);
  });
  const intervals = parameterIntervals(best, redrawn, bins, windows.source, limits);
  return {
    refusal: null,
    bins,
    logCurve: (h) => fittedLog(best, h, limits),
    characteristic: {
      basis: 'inherent',
      pressureDrop: windows.source,
      kind: named ? kind : 'undecided',
      undecided: named ? null : kind,
      ratedCoefficient: named ? intervals.ratedCoefficient : null,
      rangeability: named && best.kind === 'equal percentage' ? intervals.rangeability : null,
      percentStep:
        named && best.kind === 'equal percentage'
          ? intervals.percentStep
          : named
            ? null
            : descriptiveStep(bins, setting.limits),
      span: travelSpan(bins),
      points: pointsOf(bins),
      curve: at.map((h, i) => curvePoint(h, fittedLog(best, h, limits), band[i])),
      fits: fits.map((f) => ({
        kind: f.kind,
        probability: evidence.get(f.kind) ?? 0,
        ratedCoefficient: Math.exp(f.intercept),
        parameter: shapeParameter(f),
        aicc: f.aicc,
        rms: f.rms,
      })),
      agreement,
    },
  };
}

function curveTravels(bins: TravelBins): number[] {
  const from = bins.h[0] as number;
  const width = spanOf(bins);
  return Array.from({ length: curvePoints }, (_, i) => from + (width * i) / (curvePoints - 1));
}

/** 2.5 to 97.5 % of resampled curves at each travel, as ln. */
function bandOf(
  at: readonly number[],
  resamples: number,
  next: () => (h: number) => number,
): { low: number; high: number }[] {
  const drawn = at.map(() => new Float64Array(resamples));
  for (let k = 0; k < resamples; k++) {
    const curve = next();
    at.forEach((h, i) => ((drawn[i] as Float64Array)[k] = curve(h)));
  }
  return drawn.map((values) => {
    values.sort();
    return { low: sortedQuantile(values, 0.025), high: sortedQuantile(values, 0.975) };
  });
}

function curvePoint(h: number, log: number, band: { low: number; high: number } | undefined): CurvePoint {
  return {
    travel: 100 * h,
    value: Math.exp(log),
    // a resampled band may miss the robust curve by a hair; a curve is never shown outside its own band
    low: Math.exp(Math.min(log, band?.low ?? log)),
    high: Math.exp(Math.max(log, band?.high ?? log)),
  };
}

function travelSpan(bins: TravelBins): { from: number; to: number } {
  return { from: 100 * (bins.h[0] as number), to: 100 * (bins.h[bins.count - 1] as number) };
}

function pointsOf(bins: TravelBins): CharacteristicPoint[] {
  return Array.from(bins.h, (h, b) => ({
    travel: 100 * h,
    value: Math.exp(bins.y[b] as number),
    count: bins.windows[b] as number,
    spread: bins.spread[b] as number,
  }));
}
