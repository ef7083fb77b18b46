import { capacityMeasures } from './capacity-change.js';
import { type FindingRule } from './finding-rule.js';

/** The valve passes more than its sheet, or more than it did (§9.2). */
export const gainedCapacity: FindingRule = {
  kind: 'Gained capacity',
  weight: 0.85,
  explains: [],
  measure: (chapters, _sheet, limits) =>
    capacityMeasures(chapters, 1, limits.findings.kinds['Gained capacity'], limits),
};
