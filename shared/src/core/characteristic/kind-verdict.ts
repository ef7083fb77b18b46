import { type CharacteristicKind } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { fittedLog, type KindFit } from './fit-kinds.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/**
 * The kind that the bins speak for, or why they do not: enough bins over enough travel, the runner-up clearly
 * worse, and the two curves visibly apart. "The best is good enough" is right three times in four, which is no
 * finding.
 *
 * @param fits best first
 * Source: methods.md §3.3
 */
export function kindVerdict(
  fits: readonly KindFit[],
  bins: TravelBins,
  limits: Limits,
): CharacteristicKind | CannotJudge {
  const rules = limits.characteristic;
  const [best, second] = fits;
  if (bins.count < rules.kindBins || best === undefined || second === undefined)
    return cannotJudge('too-few-bins', { bins: bins.count, needed: rules.kindBins });
  const span = 100 * spanOf(bins);
  if (span < rules.kindSpan) return cannotJudge('span-too-small', { span, needed: rules.kindSpan });
  const margin = second.aicc - best.aicc;
  if (!(margin >= rules.aiccMargin)) return cannotJudge('models-too-close', { margin });
  if (curvesApart(best, second, bins, limits) < rules.curveDifference)
    return cannotJudge('models-too-close', { margin });
  return best.kind;
}

/** rms difference of two fitted curves over the visited bins, in ln C. */
function curvesApart(a: KindFit, b: KindFit, bins: TravelBins, limits: Limits): number {
  let sum = 0;
  for (const h of bins.h) sum += (fittedLog(a, h, limits) - fittedLog(b, h, limits)) ** 2;
  return Math.sqrt(sum / bins.count);
}
