import { type CharacteristicKind } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { type KindEvidence, likeliest } from './kind-evidence.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/**
 * The kind that the bins speak for, or why they do not: enough bins over enough travel, and one kind far more
 * probable than the others together. "The best fit is good enough" is right three times in four, which is no finding.
 *
 * Source: methods.md §3.3, with the probability of kind-evidence.ts in place of the AICc margin
 */
export function kindVerdict(
  evidence: KindEvidence,
  bins: TravelBins,
  limits: Limits,
): CharacteristicKind | CannotJudge {
  const rules = limits.characteristic;
  if (bins.count < rules.kindBins)
    return cannotJudge('too-few-bins', { bins: bins.count, needed: rules.kindBins });
  const span = 100 * spanOf(bins);
  if (span < rules.kindSpan) return cannotJudge('span-too-small', { span, needed: rules.kindSpan });
  const { kind, probability } = likeliest(evidence);
  return probability >= rules.kindProbability ? kind : cannotJudge('models-too-close', { probability });
}
