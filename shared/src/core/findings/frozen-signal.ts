import { type FindingRule } from './finding-rule.js';

const secondsPerWeek = 7 * 86_400;
/** Spells a week: more than three raise, two a day want work now (the second is our choice). */
const spellsPerWeek = { raise: 3, actNow: 14 };

/** A signal stood still while its partner moved. The spells are already cut out of everything else (§9.2). */
export const frozenSignal: FindingRule = {
  kind: 'Frozen signal',
  weight: 0.4,
  explains: [],
  measure({ frozen, window }, _sheet, limits) {
    if (frozen.length === 0) return [];
    const hours = frozen.map((spell) => (spell.to - spell.from) / 3_600);
    const longest = Math.max(...hours);
    const weeks = Math.max(1, (window.to - window.from) / secondsPerWeek);
    const of = (role: string) =>
      frozen.reduce((sum, spell, i) => sum + (spell.role === role ? (hours[i] as number) : 0), 0);
    const common = {
      standardError: null,
      severityFactor: 1,
      rests: { onPosition: false, onPressures: false },
      ofRecord: true,
      evidence: {
        spells: frozen.length,
        longestHours: longest,
        flowHours: of('flow'),
        positionHours: of('position'),
      },
    };
    return [
      { ...common, ...limits.findings.kinds['Frozen signal'], x: longest, rule: 'longest', holds: true },
      {
        ...common,
        ...spellsPerWeek,
        x: frozen.length / weeks,
        rule: 'spells',
        holds: frozen.length / weeks > spellsPerWeek.raise,
      },
    ];
  },
};
