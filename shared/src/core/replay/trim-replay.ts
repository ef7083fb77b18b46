import { type DataSheet } from '../data-sheet.js';
import { specifiedCurve } from '../characteristic/specified-curve.js';
import { type Interval } from '../assessment.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { pchip } from '../statistics/pchip.js';
import { type DutySummary } from './duty-summary.js';

/** A trim to try on recorded duty. */
export interface TrimCandidate {
  readonly characteristic: NonNullable<DataSheet['characteristic']>;
  /** Kv */
  readonly ratedCoefficient: number;
  readonly rangeability: number | null;
  readonly table: DataSheet['table'];
  /** travel it may be driven to, %; 0 and 100 without limits */
  readonly travelLow: number;
  readonly travelHigh: number;
}

/** What a candidate would have done with the duty that was. */
export interface TrimReplay {
  /** % travel, with the interval of the required coefficient's uncertainty */
  readonly p5: Interval;
  readonly p50: Interval;
  readonly p95: Interval;
  /** share of time in each 1 % of travel, 0…100 */
  readonly ridge: readonly number[];
  /** shares of time: below and above the working band, duty it cannot pass, duty below 2 % travel */
  readonly belowLow: number;
  readonly aboveHigh: number;
  readonly short: number;
  readonly belowControl: number;
  readonly chokedShare: number;
  /** installed gain over the travel used; null where the line could not be told or the travel is too narrow */
  readonly gain: {
    readonly points: readonly { readonly travel: number; readonly gain: number }[];
    readonly min: number;
    readonly max: number;
    readonly ratio: number;
  } | null;
  readonly designCases: readonly {
    readonly name: string;
    readonly required: number;
    /** % travel; null: it cannot pass this case */
    readonly travel: number | null;
  }[];
}

const steps = 1_000;
/** Travel below which no valve controls (methods.md §5.4). */
const lowestControl = 0.02;
const gainPoints = 30;
const gainHalfWidth = 0.02;

/**
 * Runs a candidate trim through recorded duty: each required coefficient becomes the travel at which the candidate has it.
 *
 * What it does not show: FL or xT, noise, cavitation, seat load and actuator size of the new trim. A qualified engineer
 * sizes the valve.
 *
 * @returns a refusal where the candidate has no usable curve
 * Source: methods.md §5.4 (2), (3), (6)
 */
export function replayTrim(duty: DutySummary, candidate: TrimCandidate): TrimReplay | CannotJudge {
  const curve = candidateCurve(candidate);
  if (curve === null) return cannotJudge('no-characteristic-specified');
  const { travelLow, travelHigh } = candidate;
  const placed = placeDuty(duty, curve, travelLow / 100, travelHigh / 100);
  const limitLow = Math.max(travelLow, 100 * lowestControl);
  const percentile = (p: number): Interval => {
    const at = (factor: number) =>
      100 * held(curve.travelFor(Math.exp(quantileOf(duty, p)) * factor), travelLow / 100, travelHigh / 100);
    return { value: at(1), low: at(1 - 2 * duty.uncertainty), high: at(1 + 2 * duty.uncertainty) };
  };
  const p5 = percentile(0.05);
  const p95 = percentile(0.95);
  const total = duty.seconds;
  const share = (test: (travel: number) => boolean) =>
    placed.reduce((sum, { travel, seconds }) => sum + (test(travel) ? seconds : 0), 0) / total;
  const ridge = new Array<number>(101).fill(0);
  for (const { travel, seconds } of placed) {
    const cell = Math.round(Math.min(travelHigh, Math.max(travelLow, travel)));
    ridge[cell] = (ridge[cell] as number) + seconds / total;
  }
  return {
    p5,
    p50: percentile(0.5),
    p95,
    ridge,
    belowLow: share((travel) => travel < duty.band.low),
    aboveHigh: share((travel) => travel > duty.band.high),
    short: share((travel) => travel > travelHigh),
    belowControl: share((travel) => travel < limitLow),
    chokedShare: duty.chokedSecondsByBin.reduce((sum, s) => sum + s, 0) / total,
    gain: gainOf(duty, curve, p5.value / 100, p95.value / 100),
    designCases: duty.designCases.map(({ name, required }) => {
      const travel = 100 * curve.travelFor(required);
      return { name, required, travel: travel <= travelHigh ? travel : null };
    }),
  };
}

interface CandidateCurve {
  /** Kv at relative travel */
  readonly at: (h: number) => number;
  /** relative travel for a Kv; above 1 where the trim is too small, 0 where it is below the curve's foot */
  readonly travelFor: (C: number) => number;
}

function candidateCurve(candidate: TrimCandidate): CandidateCurve | null {
  const { ratedCoefficient } = candidate;
  const relative = specifiedCurve(candidate);
  if (relative === null || !(ratedCoefficient > 0)) return null;
  const values = Float64Array.from({ length: steps + 1 }, (_, i) => ratedCoefficient * relative(i / steps));
  for (let i = 1; i <= steps; i++) values[i] = Math.max(values[i] as number, values[i - 1] as number);
  const top = values[steps] as number;
  return {
    at: (h) => ratedCoefficient * relative(Math.min(1, Math.max(0, h))),
    travelFor(C) {
      if (!(C <= top)) return Number.isNaN(C) ? NaN : C / top;
      let low = 0;
      let high = steps;
      while (high - low > 1) {
        const middle = (low + high) >> 1;
        if ((values[middle] as number) <= C) low = middle;
        else high = middle;
      }
      const below = values[low] as number;
      const above = values[high] as number;
      return above > below
        ? (low + Math.max(0, Math.min(1, (C - below) / (above - below)))) / steps
        : low / steps;
    },
  };
}

const held = (h: number, low: number, high: number) => Math.min(high, Math.max(low, h));

/** Each bin's time, spread over four parts of it so that shares do not jump with the bins; travel in %, above 100 if short. */
function placeDuty(duty: DutySummary, curve: CandidateCurve, low: number, high: number) {
  const parts = 4;
  return duty.secondsByBin.flatMap((seconds, bin) =>
    seconds === 0
      ? []
      : Array.from({ length: parts }, (_, part) => {
          const L = duty.logStart + (bin + (part + 0.5) / parts) * duty.logStep;
          const h = curve.travelFor(Math.exp(L));
          const beyond = h > high ? 101 : 100 * Math.max(0, h);
          return { travel: h < low ? 100 * Math.max(0, h) : beyond, seconds: seconds / parts };
        }),
  );
}

/** ln of the required coefficient below which a share of the duty lies. */
function quantileOf({ secondsByBin, seconds, logStart, logStep }: DutySummary, p: number): number {
  let reached = 0;
  for (let bin = 0; bin < secondsByBin.length; bin++) {
    const here = secondsByBin[bin] as number;
    if (here > 0 && reached + here >= p * seconds)
      return logStart + (bin + (p * seconds - reached) / here) * logStep;
    reached += here;
  }
  return logStart + secondsByBin.length * logStep;
}

/** Installed gain, % of flow span per % of travel, from the line's own relation of flow and coefficient. */
function gainOf(duty: DutySummary, curve: CandidateCurve, from: number, to: number): TrimReplay['gain'] {
  if (duty.relation === null || !(to - from >= 2 * gainHalfWidth)) return null;
  const { coefficient, flow } = duty.relation;
  const flowFor = pchip(
    coefficient.map((C) => Math.log(C)),
    flow,
  );
  const known = (C: number) => C >= (coefficient[0] as number) && C <= (coefficient.at(-1) as number);
  const points = Array.from({ length: gainPoints }, (_, k) => {
    const h = from + ((to - from) * k) / (gainPoints - 1);
    const low = Math.max(0, h - gainHalfWidth);
    const high = Math.min(1, h + gainHalfWidth);
    const [below, above] = [curve.at(low), curve.at(high)];
    const gain =
      known(below) && known(above)
        ? (flowFor(Math.log(above)) - flowFor(Math.log(below))) / (duty.flowSpan * (high - low))
        : NaN;
    return { travel: 100 * h, gain };
  }).filter((point) => Number.isFinite(point.gain));
  if (points.length < 2) return null;
  const gains = points.map((point) => point.gain);
  const min = Math.min(...gains);
  const max = Math.max(...gains);
  return { points, min, max, ratio: max / Math.max(0.05, min) };
}
