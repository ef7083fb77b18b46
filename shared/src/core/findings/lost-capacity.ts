import { capacityMeasures } from './capacity-change.js';
import { type FindingRule } from './finding-rule.js';

/** The valve passes less than its sheet, or less than it did (§9.2). */
export const lostCapacity: FindingRule = {
  kind: 'Lost capacity',
  weight: 0.85,
  explains: [],
  measure: (chapters, _sheet, limits) =>
    capacityMeasures(chapters, -1, limits.findings.kinds['Lost capacity'], limits),
};
