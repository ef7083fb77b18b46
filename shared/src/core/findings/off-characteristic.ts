import { type Deviation } from '../assessment.js';
import { type Limits } from '../limits.js';
import { cannotJudge } from '../reasons.js';
import { type FindingRule } from './finding-rule.js';

/** Bins beyond the standard's tolerance that make a shape (§9.2). */
const binsBeyond = 3;

/** The shape of the trim is not the sheet's, whatever its capacity (§9.2). */
export const offCharacteristic: FindingRule = {
  kind: 'Off characteristic',
  weight: 0.7,
  explains: [],
  measure({ deviation, characteristic, basis, window }, sheet, limits) {
    if (sheet.characteristic === null) return cannotJudge('no-characteristic-specified');
    if (deviation === null || characteristic === null)
      return basis === 'installed'
        ? cannotJudge('no-pressures')
        : cannotJudge('too-few-windows', { windows: window.steadyWindows });
    const threshold = limits.findings.kinds['Off characteristic'];
    const absolute = absoluteError(deviation);
    const bins = deviation.byTravel.filter((bin) => bin.travel >= limits.comparison.leastTravel);
    const beyond = bins.filter((bin) => Math.abs(bin.percent) > bin.tolerance + 200 * absolute);
    const largest = Math.max(0, ...bins.map((bin) => away(bin.percent)));
    const otherKind =
      characteristic.kind !== 'undecided' &&
      sheet.characteristic !== 'table' &&
      characteristic.kind !== sheet.characteristic;
    return [
      {
        ...threshold,
        x: largest,
        rule: otherKind ? 'kind' : 'tolerance',
        standardError: shapeError(absolute, limits),
        holds: otherKind || beyond.length >= binsBeyond,
        severityFactor: 1,
        rests: { onPosition: true, onPressures: true },
        evidence: {
          worstTravel: deviation.worst?.travel ?? null,
          worstPercent: deviation.worst?.percent ?? null,
          binsBeyond: beyond.length,
          bins: bins.length,
          capacityRatio: deviation.capacityRatio?.value ?? null,
          suspectedUnitFactor: deviation.suspectedUnitFactor,
          lowestBeyond: beyond[0]?.travel ?? null,
          highestBeyond: beyond.at(-1)?.travel ?? null,
        },
      },
    ];
  },
};

function away(percent: number): number {
  return Math.abs(Math.log1p(percent / 100));
}

/** Absolute standard error of ln c, read back from its 95 % interval. */
export function absoluteError(deviation: Deviation): number {
  const ratio = deviation.capacityRatio;
  return ratio === null ? 0 : Math.log(ratio.high / ratio.low) / 3.92;
}

/** A shape is measured against itself, so a factor common to all travels takes no part: what is left is the trim. */
function shapeError(absolute: number, limits: Limits): number {
  return Math.min(absolute, limits.uncertainty.trim);
}
