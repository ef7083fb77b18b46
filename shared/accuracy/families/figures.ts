import { type DirectionSplit } from '../../src/core/assessment.js';
import { type CannotJudge } from '../../src/core/reasons.js';
import { type Figure } from '../family.js';

/** c against its truth, where the sheet states the true valve times `stated`. */
export const capacity = (stated = 1): Figure => ({
  name: 'capacity ratio, %',
  error: (assessment, truth) =>
    100 * ((assessment.deviation?.capacityRatio?.value ?? NaN) / (truth.capacity * stated) - 1),
});

export const shift = (truth: number): Figure => ({
  name: 'travel shift, % travel',
  error: ({ deviation }) => (deviation?.travelShift?.value ?? NaN) - truth,
});

/** the worst of the 5th, 50th and 95th percentile */
export const travel: Figure = {
  name: 'percentiles of travel, % travel',
  error: ({ range }, { travel: truth }) =>
    range === null
      ? NaN
      : Math.max(
          Math.abs(range.p5 - truth.p5),
          Math.abs(range.p50 - truth.p50),
          Math.abs(range.p95 - truth.p95),
        ),
};

const bandOf = (split: DirectionSplit | CannotJudge | undefined) =>
  split && 'deadBand' in split ? split.deadBand : NaN;

export const deadBand = (truth: number): Figure => ({
  name: 'dead band, % travel',
  error: ({ movement, travelSource }) =>
    bandOf(travelSource === 'position' ? movement?.demandToPosition : movement?.demandToFlow) - truth,
});

export const play = (truth: number): Figure => ({
  name: 'play, % travel',
  error: ({ movement }) => bandOf(movement?.positionToFlow) - truth,
});

export const jump = (truth: number): Figure => ({
  name: 'jump, % travel',
  error: ({ movement }) => (movement && 'median' in movement.jumps ? movement.jumps.median - truth : NaN),
});

export const stickBand = (truth: number): Figure => ({
  name: 'stick band, % of itself',
  error: ({ movement }) =>
    movement && 'stickBand' in movement.jumps
      ? 100 * ((movement.jumps.stickBand?.value ?? NaN) / truth - 1)
      : NaN,
});

export const period = (truth: number): Figure => ({
  name: 'period, %',
  error: ({ movement }) =>
    movement?.oscillation && 'period' in movement.oscillation
      ? 100 * (movement.oscillation.period / truth - 1)
      : NaN,
});

export const passing = (truth: number): Figure => ({
  name: 'share that passes, % of itself',
  error: ({ passing: found }) => (found && 'share' in found ? 100 * (found.share / truth - 1) : NaN),
});

export const mismatch = (truth: number): Figure => ({
  name: 'mismatch, % travel',
  error: ({ movement }) =>
    movement && 'offset' in movement.mismatch ? Math.abs(movement.mismatch.offset) - truth : NaN,
});

/** change of ln capacity from the first to the last of the drift series, against ln `factor`, in % */
export const change = (factor: number): Figure => ({
  name: 'change, %',
  error: ({ drift }) => {
    const last = drift?.series.at(-1)?.change ?? NaN;
    const first = drift?.series[0]?.change ?? NaN;
    return 100 * (last - first - Math.log(factor));
  },
});

export const trend = (factor: number): Figure => ({
  name: 'trend over the record, %',
  error: ({ drift }) =>
    drift && 'change' in drift.trend ? 100 * (drift.trend.change - Math.log(factor)) : NaN,
});
