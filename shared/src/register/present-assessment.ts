import { type PresentedAssessment } from '../contracts/assessments.js';
import { type ValveForm } from '../contracts/valves.js';
import { type Assessment, type Finding, type Interval } from '../core/assessment.js';
import { type DataSheet } from '../core/data-sheet.js';
import { type CannotJudge } from '../core/reasons.js';
import { findingDoubts, findingPhrase, nextStep } from '../messages/findings.js';
import { reasonSentence } from '../messages/reasons.js';
import { warningSentence } from '../messages/warnings.js';
import { registerUnits, type RegisterUnits } from './register-units.js';
import { specifiedBand } from './specified-band.js';

type Presented = PresentedAssessment;
type NotJudged = { judged: false; reason: string };

/**
 * The core's assessment in the register's units and in words: what the command line prints and the service
 * stores and answers.
 */
export function presentAssessment(assessment: Assessment, form: ValveForm, sheet: DataSheet): Presented {
  const units = registerUnits(form, sheet.flowBasis);
  const { window } = assessment;
  return {
    tag: assessment.tag,
    methodVersion: assessment.methodVersion,
    window: { ...window, from: instant(window.from), to: instant(window.to), leftOut: { ...window.leftOut } },
    travelSource: assessment.travelSource,
    basis: assessment.basis,
    pressureDrop: assessment.pressureDrop,
    judged: assessment.judged,
    reason: assessment.reason && sentence(assessment.reason),
    lag: { ...assessment.lag },
    resolution: {
      travel: assessment.resolution.travel,
      flow: assessment.resolution.flow === null ? null : units.flow(assessment.resolution.flow),
    },
    characteristic:
      assessment.characteristic && presentCharacteristic(assessment.characteristic, sheet, units),
    deviation: assessment.deviation && {
      ...assessment.deviation,
      notSeparable: assessment.deviation.notSeparable && sentence(assessment.deviation.notSeparable),
      byTravel: [...assessment.deviation.byTravel],
    },
    range: assessment.range && { ...assessment.range, ridge: [...assessment.range.ridge] },
    gain: assessment.gain && { ...assessment.gain, points: [...assessment.gain.points] },
    movement: assessment.movement && presentMovement(assessment.movement),
    drift: assessment.drift && presentDrift(assessment.drift),
    passing: assessment.passing && judgedOr(assessment.passing, (passing) => presentPassing(passing, units)),
    service: assessment.service && {
      ...assessment.service,
      bands: [...assessment.service.bands],
      reason: assessment.service.reason && sentence(assessment.service.reason),
    },
    findings: assessment.findings.map(presentFinding),
    notJudged: assessment.notJudged.map(({ kind, reason, figures }) => ({
      kind,
      reason: reasonSentence(reason, figures),
    })),
    warnings: assessment.warnings.map(({ code, figures }) => warningSentence(code, figures)),
    attention: assessment.attention,
    attentionTerms: [...assessment.attentionTerms],
  };
}

function instant(seconds: number): string {
  return new Date(Math.round(seconds * 1000)).toISOString();
}

function sentence(refusal: CannotJudge): string {
  return reasonSentence(refusal.reason, refusal.figures);
}

/** A chapter's result, or its refusal in words. */
function judgedOr<T extends object, P>(result: T | CannotJudge, present: (result: T) => P): P | NotJudged {
  return 'judged' in result && 'reason' in result
    ? { judged: false, reason: sentence(result) }
    : present(result);
}

function presentFinding(finding: Finding): Presented['findings'][number] {
  return {
    ...finding,
    evidence: { ...finding.evidence },
    text: findingPhrase(finding),
    nextStep: nextStep(finding.kind),
    doubts: [...findingDoubts(finding.kind)],
  };
}

function presentCharacteristic(
  characteristic: NonNullable<Assessment['characteristic']>,
  sheet: DataSheet,
  units: RegisterUnits,
): NonNullable<Presented['characteristic']> {
  const inherent = characteristic.basis === 'inherent';
  const value = (x: number) => (inherent ? units.coefficient(x) : units.flow(x));
  const interval = (i: Interval): Interval => ({
    value: value(i.value),
    low: value(i.low),
    high: value(i.high),
  });
  return {
    kind: characteristic.kind,
    undecided: characteristic.undecided && sentence(characteristic.undecided),
    pressureDrop: characteristic.pressureDrop,
    unit: inherent ? units.coefficientUnit : units.flowUnit,
    ratedCoefficient: characteristic.ratedCoefficient && interval(characteristic.ratedCoefficient),
    rangeability: characteristic.rangeability,
    percentStep: characteristic.percentStep,
    span: characteristic.span,
    points: characteristic.points.map((point) => ({ ...point, value: value(point.value) })),
    curve: characteristic.curve.map((p) => ({ travel: p.travel, ...interval(p) })),
    specified: inherent ? specifiedBand(sheet).map((p) => ({ travel: p.travel, ...interval(p) })) : [],
    fits: characteristic.fits.map((fit) => ({ ...fit, ratedCoefficient: value(fit.ratedCoefficient) })),
    agreement: characteristic.agreement,
  };
}

function presentMovement(movement: NonNullable<Assessment['movement']>): Presented['movement'] {
  const split = (result: typeof movement.demandToPosition) =>
    judgedOr(result, (s) => ({ ...s, lines: [...s.lines] }));
  return {
    threshold: movement.threshold,
    reversalsPerDay: movement.reversalsPerDay,
    travelPerDay: movement.travelPerDay,
    perDay: movement.perDay.map((day) => ({ ...day, day: instant(day.day) })),
    demandToPosition: split(movement.demandToPosition),
    positionToFlow: split(movement.positionToFlow),
    demandToFlow: split(movement.demandToFlow),
    jumps: judgedOr(movement.jumps, (jumps) => ({ ...jumps, sizes: [...jumps.sizes] })),
    oscillation: movement.oscillation && judgedOr(movement.oscillation, (o) => ({ ...o })),
    mismatch: judgedOr(movement.mismatch, (m) => ({ ...m })),
  };
}

function presentDrift(drift: NonNullable<Assessment['drift']>): Presented['drift'] {
  return {
    by: drift.by,
    reference: { from: instant(drift.reference.from), to: instant(drift.reference.to) },
    series: drift.series.map((point) => ({ ...point, at: instant(point.at) })),
    trend: judgedOr(drift.trend, (trend) => ({ ...trend })),
    steps: drift.steps.map((step) => ({ ...step, at: instant(step.at) })),
  };
}

function presentPassing(
  passing: Exclude<NonNullable<Assessment['passing']>, CannotJudge>,
  units: RegisterUnits,
): Exclude<NonNullable<Presented['passing']>, NotJudged> {
  return { ...passing, coefficient: units.coefficient(passing.coefficient) };
}
