import { cannotJudge } from '../reasons.js';
import { type FindingRule, type Measure } from './finding-rule.js';

/** Spells an end reading has to come from, and the distance from fully open below which nothing is said, %. */
const spells = 2;
const openAway = 2;

/** The trim does not stand where the travel says: by the shape of the curve, or by the readings at the ends (§9.2). */
export const travelOffset: FindingRule = {
  kind: 'Travel offset',
  weight: 0.85,
  explains: ['Lost capacity', 'Gained capacity'],
  measure({ deviation, endReadings }, _sheet, limits) {
    const measures: Measure[] = [];
    const shift = deviation?.travelShift ?? null;
    if (deviation !== null && shift !== null) {
      measures.push({
        ...limits.findings.kinds['Travel offset'],
        x: Math.abs(shift.value),
        rule: 'curve',
        standardError: (shift.high - shift.low) / 3.92,
        holds: deviation.offset,
        severityFactor: 1,
        rests: { onPosition: true, onPressures: true },
        evidence: { shift: shift.value, capacityRatio: deviation.capacityRatio?.value ?? null },
      });
    }
    const end = {
      ...limits.findings.endReading,
      standardError: null,
      severityFactor: 1,
      rests: { onPosition: true, onPressures: false },
    };
    const { shut, open } = endReadings;
    if (shut !== null) {
      measures.push({
        ...end,
        x: Math.abs(shut.travel),
        rule: 'shut end',
        holds: shut.spells >= spells,
        evidence: { reading: shut.travel, spells: shut.spells },
      });
    }
    if (open !== null) {
      const away = Math.abs(open.travel - 100);
      measures.push({
        ...end,
        x: away,
        rule: 'open end',
        holds: open.spells >= spells && away >= openAway,
        evidence: { reading: open.travel, spells: open.spells },
      });
    }
    if (measures.length > 0) return measures;
    return deviation?.notSeparable ?? cannotJudge('not-separable');
  },
};
