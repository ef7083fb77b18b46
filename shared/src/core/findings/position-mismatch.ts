import { type FindingRule } from './finding-rule.js';

/** The stem stands elsewhere than the demand asks, day after day (§6.5, §9.2). */
export const positionMismatch: FindingRule = {
  kind: 'Position mismatch',
  weight: 0.7,
  explains: [],
  measure({ movement }, _sheet, limits) {
    if (movement === null) return [];
    const { mismatch } = movement;
    if ('reason' in mismatch) return mismatch;
    const { offset, spread, sameSignDays, slope, characterised } = mismatch;
    return [
      {
        ...limits.findings.kinds['Position mismatch'],
        x: Math.abs(offset),
        rule: 'offset',
        standardError: null,
        holds: sameSignDays >= limits.movement.mismatchDays && !characterised,
        severityFactor: 1,
        rests: { onPosition: true, onPressures: false },
        evidence: { offset, spread, sameSignDays, slope, characterised: characterised ? 1 : 0 },
      },
    ];
  },
};
