import { cannotJudge } from '../reasons.js';
import { type FindingRule } from './finding-rule.js';

/** The valve stands at an end of its travel in automatic. A fact of the record, however short that is (§9.2). */
export const pinnedAtLimit: FindingRule = {
  kind: 'Pinned at limit',
  weight: 0.85,
  explains: [],
  measure({ range, window }, _sheet, limits) {
    if (range === null) return cannotJudge('valve-not-in-service');
    return [
      {
        ...limits.findings.kinds['Pinned at limit'],
        x: range.pinned,
        rule: 'pinned',
        standardError: null,
        holds: true,
        severityFactor: 1,
        rests: { onPosition: false, onPressures: false },
        ofRecord: true,
        evidence: {
          atOpen: range.atOpen,
          atSeat: range.atSeat,
          hours: range.pinned * window.runningDays * 24,
          p95: range.p95,
        },
      },
    ];
  },
};
