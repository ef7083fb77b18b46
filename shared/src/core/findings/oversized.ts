import { cannotJudge } from '../reasons.js';
import { type FindingRule } from './finding-rule.js';

/** The valve lives near its seat: by where 95 % of its time ends, or by the share below its working band (§9.2). */
export const oversized: FindingRule = {
  kind: 'Oversized',
  weight: 0.7,
  explains: [],
  measure({ range, window, gain }, _sheet, limits) {
    if (range === null) return cannotJudge('valve-not-in-service');
    if (!range.judged)
      return cannotJudge('record-too-short', { days: window.runningDays, needed: limits.range.days });
    const { Oversized } = limits.findings.kinds;
    const { belowBandShare } = limits.findings;
    const common = {
      standardError: null,
      severityFactor: 1,
      rests: { onPosition: true, onPressures: false },
      evidence: {
        p95: range.p95,
        p50: range.p50,
        belowLow: range.belowLow,
        bandLow: range.band.low,
        rangeabilityUsed: range.rangeabilityUsed,
        gainAtMedian: gainAt(gain?.points ?? [], range.p50),
      },
    };
    return [
      { ...common, ...Oversized, x: range.p95, rule: 'p95', holds: true },
      {
        ...common,
        ...belowBandShare,
        x: range.belowLow,
        rule: 'below band',
        holds: range.p95 < limits.range.oversizedTop,
      },
    ];
  },
};

function gainAt(points: readonly { travel: number; gain: number }[], travel: number): number | null {
  let nearest: { travel: number; gain: number } | null = null;
  for (const point of points)
    if (nearest === null || Math.abs(point.travel - travel) < Math.abs(nearest.travel - travel))
      nearest = point;
  return nearest?.gain ?? null;
}
