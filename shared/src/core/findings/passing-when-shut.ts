import { type FindingRule } from './finding-rule.js';

/** Flow goes through while the valve is shut (§7.5, §9.2). A fact of its shut spells, however short the record. */
export const passingWhenShut: FindingRule = {
  kind: 'Passing when shut',
  weight: 1,
  explains: ['Gained capacity', 'Off characteristic'],
  measure({ passing }, _sheet, limits) {
    if (passing === null) return [];
    if ('reason' in passing) return passing;
    const rules = limits.drift;
    const threshold = limits.findings.kinds['Passing when shut'];
    return [
      {
        raise: Math.max(threshold.raise, passing.smallestVisible),
        actNow: Math.max(threshold.actNow, 2 * passing.smallestVisible),
        x: passing.share,
        rule: 'shut spells',
        standardError: null,
        holds: passing.spells >= rules.passingSpells || passing.seconds >= rules.passingTotalSeconds,
        severityFactor: 1,
        rests: { onPosition: false, onPressures: true },
        ofRecord: true,
        evidence: {
          coefficient: passing.coefficient,
          spells: passing.spells,
          seconds: passing.seconds,
          smallestVisible: passing.smallestVisible,
        },
      },
    ];
  },
};
