import { type Assessment, methodVersion } from './assessment.js';
import { type ValveRecord } from './data-sheet.js';
import { type CannotJudge } from './reasons.js';
import { type Span } from './series.js';

/** The assessment of a valve whose record says nothing at all: every chapter empty, with the reason. */
export function unassessed(valve: ValveRecord, span: Span, reason: CannotJudge): Assessment {
  const { figures } = reason;
  return {
    tag: valve.tag,
    methodVersion,
    window: {
      from: span.from,
      to: span.to,
      samplesSeen: 0,
      samplesUsed: 0,
      runningDays: 0,
      step: 0,
      steadyWindows: 0,
      periods: 0,
      runningPeriods: 0,
      leftOut: {},
    },
    travelSource: 'demand',
    basis: 'installed',
    pressureDrop: 'none',
    judged: false,
    reason,
    lag: { seconds: 0, identified: false },
    resolution: { travel: null, flow: null },
    characteristic: null,
    deviation: null,
    range: null,
    gain: null,
    endReadings: { shut: null, open: null },
    frozen: [],
    movement: null,
    drift: null,
    passing: null,
    service: null,
    findings: [],
    figures: [],
    notJudged: [
      { kind: 'characteristic', reason: reason.reason, figures },
      { kind: 'range', reason: reason.reason, figures },
    ],
    warnings: [],
    attention: valve.dataSheet.trip ? null : 0,
    attentionTerms: [],
  };
}
