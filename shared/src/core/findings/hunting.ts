import { type FindingRule } from './finding-rule.js';

/** Amplitude from which hunting counts in full, % travel (§9.2). */
const fullAmplitude = 3;

/** The travel swings with one period in a good share of the time (§6.2, §9.2). */
export const hunting: FindingRule = {
  kind: 'Hunting',
  weight: 0.85,
  explains: ['Excess movement'],
  measure({ movement }, _sheet, limits) {
    const oscillation = movement?.oscillation ?? null;
    if (oscillation === null) return [];
    if ('reason' in oscillation) return oscillation;
    const { period, amplitude, regularity, share, blocks, blockHours, cause } = oscillation;
    return [
      {
        ...limits.findings.kinds.Hunting,
        x: share,
        rule: 'oscillation',
        standardError: null,
        holds: amplitude >= limits.findings.huntingAmplitude,
        severityFactor: Math.min(1, amplitude / fullAmplitude),
        rests: { onPosition: true, onPressures: false },
        evidence: {
          period,
          amplitude,
          regularity,
          blocks,
          blockHours,
          fromOutside: cause === 'outside' || cause === 'line' ? 1 : 0,
        },
      },
    ];
  },
};
