import { cannotJudge } from '../reasons.js';
import { type FindingRule } from './finding-rule.js';

/** The valve lives near its open end, or stands wide open with its set point not reached (§9.2). */
export const undersized: FindingRule = {
  kind: 'Undersized',
  weight: 1,
  explains: ['Pinned at limit'],
  measure({ range, window }, _sheet, limits) {
    if (range === null) return cannotJudge('valve-not-in-service');
    if (!range.judged)
      return cannotJudge('record-too-short', { days: window.runningDays, needed: limits.range.days });
    const common = {
      standardError: null,
      severityFactor: 1,
      holds: true,
      rests: { onPosition: true, onPressures: false },
      evidence: {
        aboveHigh: range.aboveHigh,
        bandHigh: range.band.high,
        short: range.short,
        p95: range.p95,
        atOpen: range.atOpen,
      },
    };
    const above = { ...common, ...limits.findings.kinds.Undersized, x: range.aboveHigh, rule: 'above band' };
    if (range.short === null) return [above];
    return [above, { ...common, ...limits.findings.shortShare, x: range.short, rule: 'short' }];
  },
};
