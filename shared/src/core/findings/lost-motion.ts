import { type DirectionSplit } from '../assessment.js';
import { type FindingRule, type Measure } from './finding-rule.js';

/**
 * Jitters of the stem a band to the flow must exceed. On simulated loops healthy ones read up to 5.2 of them; where
 * jitter is above half a per cent, no play and play of 4 % read alike, so less cannot be told.
 */
const jitters = 5.5;

/**
 * A dead band: between demand and stem without jumps, between stem and flow, or between demand and flow where the
 * position is not recorded (§6.3, §9.2). Where jumps cannot be seen, sticking is not excluded, and it says so.
 */
export const lostMotion: FindingRule = {
  kind: 'Lost motion',
  weight: 0.85,
  explains: ['Frozen signal'],
  measure({ movement, travelSource, pressureDrop }, _sheet, limits) {
    if (movement === null) return [];
    const { demandToPosition, positionToFlow, demandToFlow, jumps } = movement;
    const rules = limits.movement;
    const jumping = 'count' in jumps && jumps.share >= rules.jumpShare && jumps.median >= rules.jumpMedian;
    const evidence = (split: DirectionSplit) => ({
      bins: split.bins,
      standardError: split.standardError,
      jumpShare: 'count' in jumps ? jumps.share : null,
      stickingExcluded: 'count' in jumps ? 1 : 0,
    });
    const without = pressureDrop === 'measured' ? 0 : rules.withoutPressures;
    const against = (
      split: DirectionSplit,
      rule: string,
      threshold: { readonly raise: number; readonly actNow: number },
    ): Measure => ({
      raise: Math.max(threshold.raise + without, jitters * (split.jitter ?? 0)),
      actNow: Math.max(threshold.actNow + without, 2 * jitters * (split.jitter ?? 0)),
      x: split.deadBand,
      rule,
      standardError: split.standardError,
      holds: true,
      severityFactor: 1,
      rests: { onPosition: true, onPressures: true },
      evidence: evidence(split),
    });
    const thresholds = limits.findings.kinds['Lost motion'];
    const measures: Measure[] = [];
    if ('deadBand' in demandToPosition)
      measures.push({
        ...against(demandToPosition, 'demand to position', thresholds),
        ...thresholds,
        holds: !jumping,
        rests: { onPosition: true, onPressures: false },
      });
    if (travelSource === 'position' && 'deadBand' in positionToFlow)
      measures.push(against(positionToFlow, 'position to flow', thresholds));
    if (travelSource === 'demand' && 'deadBand' in demandToFlow)
      measures.push(against(demandToFlow, 'demand to flow', limits.findings.lostMotionNoPosition));
    if (measures.length > 0) return measures;
    const refusal = travelSource === 'position' ? demandToPosition : demandToFlow;
    return 'reason' in refusal ? refusal : [];
  },
};
