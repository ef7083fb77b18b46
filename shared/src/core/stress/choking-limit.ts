import { type DataSheet } from '../data-sheet.js';
import {
  dropRatioWithFittings,
  fittingLosses,
  pipingFactor,
  recoveryWithFittings,
} from '../flow-coefficient/fittings.js';
import { criticalRatioFactor } from '../flow-coefficient/liquid.js';
import { cannotJudge, type CannotJudge } from '../reasons.js';

/** What a pressure drop is compared with to say how hard it is on the valve. */
export interface ChokingLimit {
  /** xF = ΔP/(P1 − Pv) of a liquid, x = ΔP/P1 of a gas */
  readonly ratioAt: (upstreamPressure: number, drop: number) => number;
  /** the drop from which flow is choked, kPa */
  readonly chokedDropAt: (upstreamPressure: number) => number;
  /** the ratio at which it chokes: about FL² for a liquid, Fγ·xT for a gas */
  readonly ratio: number;
  /** kPa(a); null for a gas */
  readonly vapourPressure: number | null;
}

/**
 * Where a valve chokes, from the sheet's own FL or xT. Typical values of a style are no ground for this verdict, and a
 * liquid without a vapour pressure has none. γ not given counts as 1.4.
 *
 * @param coefficient Kv the valve mostly worked at, for the reducers; null: reducers left out
 * Source: methods.md §2.1, §2.2, §2.3, §8
 */
export function chokingLimit(sheet: DataSheet, coefficient: number | null): ChokingLimit | CannotJudge {
  const { fluid, FL, xT, valveSize: d, pipeSize } = sheet;
  if (fluid === null) return cannotJudge('no-fluid-data');
  const losses = fittingLosses(d, pipeSize, pipeSize);
  const reduced = d !== null && coefficient !== null && losses.inlet > 0;
  if (fluid.phase === 'liquid') {
    const Pv = fluid.vapourPressure;
    if (Pv === null) return cannotJudge('no-fluid-data');
    if (FL === null) return cannotJudge('no-recovery-factor');
    const FF = criticalRatioFactor(Pv, fluid.criticalPressure);
    const factor = reduced
      ? recoveryWithFittings(FL, losses.inlet, coefficient, d) / pipingFactor(losses.sum, coefficient, d)
      : FL;
    return {
      ratioAt: (P1, drop) => drop / (P1 - Pv),
      chokedDropAt: (P1) => factor ** 2 * (P1 - FF * Pv),
      ratio: factor ** 2,
      vapourPressure: Pv,
    };
  }
  if (xT === null) return cannotJudge('no-recovery-factor');
  const gamma = (fluid.specificHeatRatio ?? 1.4) / 1.4;
  const limit =
    gamma *
    (reduced
      ? dropRatioWithFittings(xT, pipingFactor(losses.sum, coefficient, d), losses.inlet, coefficient, d)
      : xT);
  return {
    ratioAt: (P1, drop) => drop / P1,
    chokedDropAt: (P1) => limit * P1,
    ratio: limit,
    vapourPressure: null,
  };
}
