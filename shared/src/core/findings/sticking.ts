import { type FindingRule } from './finding-rule.js';

/** The stem rests while demand moves, then jumps (§6.4, §9.2). */
export const sticking: FindingRule = {
  kind: 'Sticking',
  weight: 1,
  explains: ['Hunting', 'Frozen signal'],
  measure({ movement, resolution }, _sheet, limits) {
    if (movement === null) return [];
    const { demandToPosition: split, jumps } = movement;
    if ('reason' in jumps) return jumps;
    const rules = limits.movement;
    const band =
      jumps.stickBand ??
      ('reason' in split ? null : { value: split.deadBand, standardError: split.standardError });
    if (band === null) return 'reason' in split ? split : [];
    return [
      {
        ...limits.findings.kinds.Sticking,
        x: band.value,
        rule: 'jumps',
        standardError: band.standardError,
        holds: jumps.share >= rules.jumpShare && jumps.median >= rules.jumpMedian,
        severityFactor: 1,
        rests: { onPosition: true, onPressures: false },
        evidence: {
          jump: jumps.median,
          jumpShare: jumps.share,
          jumps: jumps.count,
          deadBand: 'reason' in split ? null : split.deadBand,
          resolution: resolution.travel,
        },
      },
    ];
  },
};
