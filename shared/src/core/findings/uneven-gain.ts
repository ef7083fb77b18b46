import { cannotJudge } from '../reasons.js';
import { type FindingRule } from './finding-rule.js';

const leastBins = 8;
const leastSpan = 20;
/** Many healthy equal-percentage valves in lines with little pipe loss have it: it counts less unless it shows. */
const unlessItShows = 0.6;

/** The loop's gain changes several times over the travel used: its lower bound, because the ratio is ill-conditioned (§9.2). */
export const unevenGain: FindingRule = {
  kind: 'Uneven gain',
  weight: 0.4,
  explains: [],
  measure({ gain, characteristic, movement }, _sheet, limits) {
    if (gain === null) {
      const span = characteristic === null ? 0 : characteristic.span.to - characteristic.span.from;
      return cannotJudge('span-too-small', { span, needed: leastSpan });
    }
    if (gain.bins < leastBins) return cannotJudge('too-few-bins', { bins: gain.bins, needed: leastBins });
    if (gain.span < leastSpan) return cannotJudge('span-too-small', { span: gain.span, needed: leastSpan });
    const oscillation = movement?.oscillation ?? null;
    const hunting =
      oscillation !== null &&
      'share' in oscillation &&
      oscillation.share >= limits.findings.kinds.Hunting.raise;
    return [
      {
        ...limits.findings.kinds['Uneven gain'],
        x: gain.ratio.low,
        rule: 'ratio',
        standardError: null,
        holds: true,
        severityFactor: hunting ? 1 : unlessItShows,
        rests: { onPosition: true, onPressures: false },
        evidence: { ratio: gain.ratio.value, min: gain.min.value, max: gain.max.value, bins: gain.bins },
      },
    ];
  },
};
