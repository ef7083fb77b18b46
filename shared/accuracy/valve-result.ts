import { assess } from '../src/core/assess.js';
import { type Assessment } from '../src/core/assessment.js';
import { type FindingKind } from '../src/core/findings/kinds.js';
import { type Family, type Truth } from './family.js';
import { recordOf } from './record.js';

/** What the core made of one simulated valve, held against the truth. Errors are NaN where nothing was claimed. */
export interface ValveResult {
  readonly family: string;
  readonly seed: number;
  readonly found: boolean;
  /** findings that are neither sought, true as well, explained by another nor Uneven gain */
  readonly unrelated: readonly FindingKind[];
  /** error of the family's figure */
  readonly figure: number;
  readonly kind: 'right' | 'wrong' | 'cannot tell';
  /** travel between the outermost bins, % */
  readonly span: number;
  /** c against the trim's law, %; NaN where the flow coefficient is not known */
  readonly capacity: number;
  /** the absolute interval of c holds the truth */
  readonly covered: boolean;
  /** R against its truth, %; NaN unless the trim is equal percentage and named so */
  readonly rangeability: number;
  /** worst of the 5th, 50th and 95th percentile of travel, % travel */
  readonly travel: number;
  /** milliseconds in the core */
  readonly took: number;
}

/** Simulates the valve of one seed and assesses it. */
export function valveResult(family: Family, seed: number): ValveResult {
  const { history, dataSheet, span, truth } = recordOf(family, seed);
  const before = performance.now();
  const assessment = assess({ tag: `${family.name} ${seed}`, dataSheet }, history, span);
  const took = performance.now() - before;
  const raised = assessment.findings
    .filter(({ explainedBy }) => explainedBy === null)
    .map(({ kind }) => kind);
  const sees = (kind: FindingKind) => raised.includes(kind);
  const { sought, related = [] } = family;
  const ratio = assessment.deviation?.capacityRatio ?? null;
  const stated = truth.loop.valve.ratedCoefficient / (dataSheet.ratedCoefficient ?? NaN);
  const c = truth.capacity * stated;
  return {
    family: family.name,
    seed,
    found: family.either ? sought.some(sees) : sought.every(sees),
    unrelated: raised.filter(
      (kind) => kind !== 'Uneven gain' && !sought.includes(kind) && !related.includes(kind),
    ),
    figure: family.figure?.error(assessment, truth) ?? NaN,
    kind: kindVerdict(assessment, truth),
    span: spanOf(assessment),
    capacity: ratio === null ? NaN : 100 * (ratio.value / c - 1),
    covered: ratio !== null && ratio.low <= c && c <= ratio.high,
    rangeability: rangeabilityError(assessment, truth),
    travel: travelError(assessment, truth),
    took,
  };
}

function kindVerdict({ characteristic }: Assessment, { loop }: Truth): ValveResult['kind'] {
  if (characteristic === null || characteristic.kind === 'undecided') return 'cannot tell';
  return characteristic.kind === loop.valve.kind ? 'right' : 'wrong';
}

function spanOf({ characteristic }: Assessment): number {
  return characteristic === null ? NaN : characteristic.span.to - characteristic.span.from;
}

function rangeabilityError({ characteristic }: Assessment, { loop }: Truth): number {
  const { kind, parameter } = loop.valve;
  if (kind !== 'equal percentage' || characteristic?.kind !== kind) return NaN;
  return 100 * ((characteristic.rangeability?.value ?? NaN) / (parameter ?? NaN) - 1);
}

function travelError({ range, travelSource }: Assessment, { travel }: Truth): number {
  if (range === null || travelSource !== 'position') return NaN;
  const { p5, p50, p95 } = range;
  return Math.max(Math.abs(p5 - travel.p5), Math.abs(p50 - travel.p50), Math.abs(p95 - travel.p95));
}
