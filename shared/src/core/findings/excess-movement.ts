import { type FindingRule } from './finding-rule.js';

/** More travel or more reversals a day than packing and actuator are made for (§6.1, §9.2). */
export const excessMovement: FindingRule = {
  kind: 'Excess movement',
  weight: 0.7,
  explains: [],
  measure({ movement }, _sheet, limits) {
    if (movement === null) return [];
    const { threshold, reversalsPerDay, travelPerDay } = movement;
    const common = {
      standardError: null,
      holds: true,
      severityFactor: 1,
      rests: { onPosition: true, onPressures: false },
      evidence: { threshold, reversalsPerDay, travelPerDay },
    };
    return [
      { ...common, ...limits.findings.kinds['Excess movement'], x: travelPerDay, rule: 'travel' },
      { ...common, ...limits.findings.reversalsPerDay, x: reversalsPerDay, rule: 'reversals' },
    ];
  },
};
