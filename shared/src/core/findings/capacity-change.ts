import { type CannotJudge, cannotJudge } from '../reasons.js';
import { type Limits } from '../limits.js';
import { type Chapters, type Measure } from './finding-rule.js';
import { absoluteError } from './off-characteristic.js';

/**
 * The three ways a capacity is found changed, seen from one side: against the sheet, by drift within the record,
 * by a step within the record. Lost and Gained capacity are this with the sign turned.
 *
 * @param sign +1: gained, −1: lost
 * @param sheetThreshold raise and act-now for the comparison with the sheet, in ln
 * Source: methods.md §9.2
 */
export function capacityMeasures(
  chapters: Chapters,
  sign: 1 | -1,
  sheetThreshold: { readonly raise: number; readonly actNow: number },
  limits: Limits,
): readonly Measure[] | CannotJudge {
  const { deviation, drift, basis, pressureDrop, window } = chapters;
  const measures: Measure[] = [];
  const common = {
    severityFactor: 1,
    rests: { onPosition: true, onPressures: true },
  };
  const ratio = deviation?.capacityRatio ?? null;
  const evidence = {
    capacityRatio: ratio?.value ?? null,
    capacityLow: ratio?.low ?? null,
    capacityHigh: ratio?.high ?? null,
    suspectedUnitFactor: deviation?.suspectedUnitFactor ?? null,
    equivalentShift: deviation?.equivalentShift ?? null,
  };
  if (deviation !== null && ratio !== null) {
    const ln = Math.log(ratio.value);
    measures.push({
      ...common,
      ...sheetThreshold,
      x: sign * ln,
      rule: 'sheet',
      standardError: absoluteError(deviation),
      holds: pressureDrop === 'measured' || Math.abs(ln) > limits.comparison.modelledRatio,
      evidence,
    });
  }
  const itself = { ...common, ...limits.findings.driftChange };
  if (drift !== null && 'change' in drift.trend) {
    const { change, low, high, p, confirmed } = drift.trend;
    measures.push({
      ...itself,
      x: sign * change,
      rule: 'drift',
      standardError: (high - low) / 3.92,
      holds: confirmed,
      evidence: { ...evidence, change, p, months: drift.series.length },
    });
  }
  const last = drift?.steps.at(-1);
  if (drift && last) {
    // what was lost and put right again is no finding: the net of all steps counts
    const change = drift.steps.reduce((sum, step) => sum + step.change, 0);
    measures.push({
      ...itself,
      x: sign * change,
      rule: 'step',
      standardError: null,
      holds: true,
      evidence: { ...evidence, change, at: last.at },
    });
  }
  if (measures.length > 0) return measures;
  return basis === 'installed'
    ? cannotJudge('no-pressures')
    : cannotJudge('too-few-windows', { windows: window.steadyWindows, needed: limits.windows.least });
}
