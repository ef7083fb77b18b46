import { type CharacteristicKind, type DataSheet } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { consensusKind } from './consensus.js';
import { type KindEvidence } from './kind-evidence.js';
import { kindVerdict } from './kind-verdict.js';
import { fitShift, isOffset } from './shift-fit.js';
import { specifiedCurve } from './specified-curve.js';
import { spanOf, type TravelBins } from './travel-bins.js';

/** What the fit needs beside the windows. */
export interface CharacteristicSetting {
  readonly sheet: DataSheet;
  readonly travelSource: 'position' | 'demand';
  /** % travel between demand and response, null where not known */
  readonly deadBand: number | null;
  readonly random: () => number;
  readonly limits: Limits;
}

/**
 * The kind, after every rule of §3.3: the fits' own verdict, its repeatability over days, the tolerance of
 * modelled pressures, the dead band where demand stands in for position, and the sheet's kind with an offset.
 *
 * @param agreement share of day resamples in which the best kind won
 * @param bestRms rms residual of that kind's fit
 */
export function decideKind(
  windows: SteadyWindows,
  bins: TravelBins,
  evidence: KindEvidence,
  agreement: number,
  bestRms: number,
  setting: CharacteristicSetting,
): CharacteristicKind | CannotJudge {
  const { limits, sheet, travelSource, deadBand } = setting;
  const rules = limits.characteristic;
  const span = 100 * spanOf(bins);
  if (travelSource === 'demand' && span < rules.demandOnlySpan) {
    if (deadBand === null || deadBand >= rules.demandOnlyDeadBand)
      return cannotJudge('demand-only', { span, needed: rules.demandOnlySpan });
  }
  const verdict = kindVerdict(evidence, bins, limits);
  if (typeof verdict !== 'string') return verdict;
  if (agreement < rules.kindAgreement) return cannotJudge('not-repeatable', { agreement });
  if (windows.source === 'modelled') {
    const agreed = consensusKind(windows, verdict, travelSource === 'demand', limits);
    if (agreed !== null) return agreed;
  }
  return sheetWithOffset(bins, verdict, bestRms, sheet, limits) ?? verdict;
}

/** Where the sheet's own kind with a shift of travel fits as well, another kind may not be named (§3.3). */
function sheetWithOffset(
  bins: TravelBins,
  verdict: CharacteristicKind,
  bestRms: number,
  sheet: DataSheet,
  limits: Limits,
): CharacteristicKind | CannotJudge | null {
  const specified = specifiedCurve(sheet);
  if (specified === null || sheet.characteristic === verdict || sheet.characteristic === 'table') return null;
  const fit = fitShift(bins, specified, 0, limits);
  if (fit === null || Math.abs(fit.shift) > 0.1) return null;
  // a shift that is proven need fit no better than the kind it would replace
  const allowed = Math.max(limits.characteristic.curveDifference, isOffset(fit, limits) ? bestRms : 0);
  if (fit.jointRms > allowed) return null;
  return fit.shiftError * 100 <= limits.comparison.shiftStandardError
    ? sheet.characteristic
    : cannotJudge('not-separable');
}
