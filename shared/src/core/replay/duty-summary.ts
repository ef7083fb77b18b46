import { type DataSheet } from '../data-sheet.js';
import { flowCoefficient } from '../flow-coefficient/flow-coefficient.js';
import { type Limits } from '../limits.js';
import { type Prepared } from '../preparation/prepared.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { median } from '../statistics/quantile.js';
import { weightedLine } from '../statistics/regression.js';
import { dutyBlocks, type DutyBlocks } from './duty-blocks.js';

/**
 * The recorded duty of a valve, small enough to send to a browser (some 20 kB whatever the record's length) and enough to
 * try any trim on: time by required coefficient, and how flow follows the coefficient in this line.
 */
export interface DutySummary {
  /** s UTC */
  readonly from: number;
  readonly to: number;
  readonly source: 'measured' | 'modelled';
  /** s of duty known, s in service without a required coefficient, s wide open (required coefficient is a lower bound) */
  readonly seconds: number;
  readonly unknownSeconds: number;
  readonly openSeconds: number;
  /** under three months: seasons are missing */
  readonly partial: boolean;
  /** bin i holds ln C from logStart + i·logStep */
  readonly logStart: number;
  readonly logStep: number;
  readonly secondsByBin: readonly number[];
  readonly chokedSecondsByBin: readonly number[];
  /** flow against coefficient along the line, both rising; null where the line could not be told */
  readonly relation: { readonly coefficient: readonly number[]; readonly flow: readonly number[] } | null;
  readonly flowSpan: number;
  readonly designCases: readonly {
    readonly name: string;
    readonly flow: number;
    readonly required: number;
  }[];
  /** relative standard uncertainty of the required coefficient, one factor for all of it */
  readonly uncertainty: number;
  /** working band, % travel */
  readonly band: { readonly low: number; readonly high: number };
}

const finest = 0.01;
const mostBins = 600;
const secondsPerMonth = 30 * 86_400;

/**
 * Sums a record up as duty for trim replay.
 *
 * @returns a refusal for trip valves, and where flow, fluid or pressures are not known
 * Source: methods.md §5.4 (1), (5), §11
 */
export function dutySummary(prepared: Prepared, sheet: DataSheet, limits: Limits): DutySummary | CannotJudge {
  if (sheet.trip) return cannotJudge('trip-valve');
  if (prepared.flow === null || sheet.flowUnscaled === true) return cannotJudge('no-flow');
  if (sheet.fluid === null) return cannotJudge('no-fluid-data');
  const blocks = dutyBlocks(prepared, sheet, limits);
  if (blocks === null) return cannotJudge('no-pressures');
  const logs = blocks.required.map((C) => Math.log(C));
  let low = Infinity;
  let high = -Infinity;
  for (const L of logs) {
    if (L < low) low = L;
    if (L > high) high = L;
  }
  if (!Number.isFinite(low))
    return cannotJudge(blocks.count === 0 ? 'valve-not-in-service' : 'no-fluid-data');
  const logStep = Math.max(finest, (high - low) / mostBins);
  const bins = Math.floor((high - low) / logStep) + 1;
  const secondsByBin = new Array<number>(bins).fill(0);
  const chokedSecondsByBin = new Array<number>(bins).fill(0);
  let seconds = 0;
  logs.forEach((L, i) => {
    if (Number.isNaN(L)) return;
    const bin = Math.min(bins - 1, Math.floor((L - low) / logStep));
    secondsByBin[bin] = (secondsByBin[bin] as number) + blocks.seconds;
    if (blocks.choked[i] === 1)
      chokedSecondsByBin[bin] = (chokedSecondsByBin[bin] as number) + blocks.seconds;
    seconds += blocks.seconds;
  });
  const to = prepared.start + prepared.count * prepared.step;
  return {
    from: prepared.start,
    to,
    source: blocks.source,
    seconds,
    unknownSeconds: blocks.unknownSeconds,
    openSeconds: blocks.openSeconds,
    partial: to - prepared.start < 3 * secondsPerMonth,
    logStart: low,
    logStep,
    secondsByBin,
    chokedSecondsByBin,
    relation: relationOf(blocks, sheet),
    flowSpan: prepared.flowSpan,
    designCases: designCoefficients(sheet),
    uncertainty: uncertaintyOf(blocks, limits),
    band: sheet.designBand ?? limits.range.bands[sheet.style],
  };
}

/** Points of the relation: enough for a smooth curve, few enough to send. */
const relationPoints = 80;

/**
 * How flow follows the coefficient in this line: the drop and the inlet pressure as a constant plus a square of flow
 * (the line model's, or fitted to what was measured), put into the standard's equations.
 */
function relationOf(blocks: DutyBlocks, sheet: DataSheet): DutySummary['relation'] {
  const known = blocks.required.map((C) => (C > 0 ? 1 : 0));
  const square = blocks.flow.map((q) => q * q);
  const finite = (column: Float64Array) => column.map((v, i) => (known[i] === 1 ? v : 0));
  const inlet = lawOf(square, finite(blocks.upstreamPressure), known);
  const fitted = lawOf(square, finite(blocks.drop), known);
  const drop = blocks.line === null ? fitted : { intercept: blocks.line.a, slope: -blocks.line.b };
  // a drop that grows with flow is not a line: something else moved
  const slope = Math.min(0, drop.slope);
  let top = 0;
  blocks.flow.forEach((q, i) => {
    if (known[i] === 1 && q > top) top = q;
  });
  const last = Math.min(1.5 * top, slope < 0 ? Math.sqrt((-0.95 * drop.intercept) / slope) : Infinity);
  const conditions = { temperature: median(blocks.temperature), density: median(blocks.density) };
  const coefficient: number[] = [];
  const flow: number[] = [];
  for (let k = 1; k <= relationPoints; k++) {
    const q = (last * k) / relationPoints;
    const upstreamPressure = inlet.intercept + inlet.slope * q * q;
    const downstreamPressure = upstreamPressure - (drop.intercept + slope * q * q);
    const C = flowCoefficient(
      { ...conditions, flow: q, upstreamPressure, downstreamPressure },
      sheet,
    ).coefficient;
    if (!(C > (coefficient.at(-1) ?? 0))) continue;
    coefficient.push(rounded(C));
    flow.push(rounded(q));
  }
  return coefficient.length >= 10 ? { coefficient, flow } : null;
}

function lawOf(square: Float64Array, values: Float64Array, weights: Float64Array) {
  const { intercept, slope } = weightedLine(square, values, weights);
  if (Number.isFinite(slope)) return { intercept, slope };
  return { intercept: median(values.filter((_, i) => weights[i] === 1)), slope: 0 };
}

const rounded = (value: number) => Number(value.toPrecision(7));

function designCoefficients(sheet: DataSheet): DutySummary['designCases'] {
  return sheet.designCases.flatMap(({ name, flow, upstreamPressure, downstreamPressure }) => {
    if (upstreamPressure === null || downstreamPressure === null) return [];
    const required = flowCoefficient(
      { flow, upstreamPressure, downstreamPressure, temperature: null, density: null },
      sheet,
    ).coefficient;
    return Number.isFinite(required) ? [{ name, flow, required }] : [];
  });
}

/** Meter and drop together (§2.6); a modelled drop carries the tolerances of the design cases at the median flow. */
function uncertaintyOf(blocks: DutyBlocks, { uncertainty }: Limits): number {
  const { meter, designDropShut, designDropSlope } = uncertainty;
  if (blocks.source === 'measured') return meter;
  const q = median(blocks.flow);
  const { a, b } = blocks.line ?? { a: median(blocks.drop), b: 0 };
  const left = a - b * q * q;
  return Math.hypot(meter, (0.5 * designDropShut * a) / left, (0.5 * designDropSlope * b * q * q) / left);
}
