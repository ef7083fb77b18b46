import { type CharacteristicKind } from '../data-sheet.js';
import { type Limits } from '../limits.js';
import { type SteadyWindows } from '../preparation/steady-windows.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';
import { kindEvidence } from './kind-evidence.js';
import { kindVerdict } from './kind-verdict.js';
import { regularBins, travelBins } from './travel-bins.js';

/**
 * A kind from a modelled pressure drop stands only if it stays the verdict when the design drop is wrong by its
 * tolerance: the drop at shut up and down, the resistance of the line up and down.
 *
 * @param kind the verdict on the windows as they are
 * @returns null where all agree
 * Source: methods.md §2.5
 */
export function consensusKind(
  windows: SteadyWindows,
  kind: CharacteristicKind,
  demandOnly: boolean,
  limits: Limits,
): CannotJudge | null {
  const { line } = windows;
  if (line === null) return null;
  const shut = limits.uncertainty.designDropShut * line.a;
  const slope = limits.uncertainty.designDropSlope * line.b;
  const trials = [
    { shut, slope: 0 },
    { shut: -shut, slope: 0 },
    { shut: 0, slope },
    { shut: 0, slope: -slope },
  ];
  for (const trial of trials) {
    const L = windows.L.map((value, i) => {
      const drop = windows.pressureDrop[i] as number;
      const other = drop + trial.shut - trial.slope * (windows.flow[i] as number) ** 2;
      // C ∝ 1/√ΔP: exact for liquids, close for gases below choking
      return other > 0 ? value + 0.5 * Math.log(drop / other) : NaN;
    });
    const bins = travelBins(windows, L, regularBins(demandOnly, limits), limits);
    if (bins.count < 3 || kindVerdict(kindEvidence(bins, limits)(bins.y), bins, limits) !== kind)
      return cannotJudge('design-pressures-disagree');
  }
  return null;
}
