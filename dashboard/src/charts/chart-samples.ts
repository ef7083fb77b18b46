import { type Ridge } from '@tailrace/shared/charts/travel-ridge';
import { type Glyph } from '@tailrace/shared/charts/characteristic-glyph';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';

/** Invented valves for the `/design` page and the charts' tests; none of them stands anywhere. */

interface Spell {
  centre: number;
  width: number;
  weight: number;
}

/** Shares of time of a valve that has worked around some travels, each 1 % of travel one part. */
export function aRidge(spells: Spell[], band = { low: 10, high: 90 }): Ridge {
  const raw = Array.from({ length: 100 }, (_, i) =>
    spells.reduce(
      (sum, { centre, width, weight }) =>
        sum + (weight / width) * Math.exp(-0.5 * ((i + 0.5 - centre) / width) ** 2),
      0,
    ),
  );
  const total = raw.reduce((sum, share) => sum + share, 0);
  const shares = raw.map((share) => share / total);
  const travelBelow = (part: number) => {
    let sum = 0;
    return shares.findIndex((share) => (sum += share) >= part) + 0.5;
  };
  return { shares, band, p5: travelBelow(0.05), p50: travelBelow(0.5), p95: travelBelow(0.95) };
}

/** Five valves an engineer has met: healthy, too large, too small, pinned open, two duties. */
export const sampleRidges: { tag: string; words: string; ridge: Ridge | null }[] = [
  {
    tag: 'FV-2101',
    words: 'works where it was meant to',
    ridge: aRidge([{ centre: 48, width: 9, weight: 1 }]),
  },
  {
    tag: 'PV-2204',
    words: 'too large: lives near its seat',
    ridge: aRidge([{ centre: 9, width: 3.5, weight: 1 }]),
  },
  {
    tag: 'FV-3110',
    words: 'too small: a third of its time above 90 %',
    ridge: aRidge([
      { centre: 78, width: 10, weight: 0.7 },
      { centre: 97, width: 2, weight: 0.3 },
    ]),
  },
  {
    tag: 'LV-3307',
    words: 'pinned wide open for half of its time',
    ridge: aRidge([
      { centre: 70, width: 9, weight: 0.5 },
      { centre: 100, width: 0.3, weight: 0.5 },
    ]),
  },
  {
    tag: 'TV-4012',
    words: 'butterfly on two duties',
    ridge: aRidge(
      [
        { centre: 24, width: 3, weight: 0.6 },
        { centre: 62, width: 6, weight: 0.4 },
      ],
      { low: 20, high: 70 },
    ),
  },
  { tag: 'FV-4020', words: 'never assessed', ridge: null },
];

const travels = (from: number, to: number, step: number) =>
  Array.from({ length: Math.floor((to - from) / step) + 1 }, (_, i) => from + i * step);
const equalPercentage = (travel: number, rated: number) => rated * 50 ** (travel / 100 - 1);
/** A steady scatter without chance, so that pictures and tests repeat. */
const wobble = (i: number) => Math.sin(i * 2.4) * 0.6 + Math.sin(i * 5.1) * 0.4;

export const sampleGlyphs: { tag: string; glyph: Glyph | null }[] = [
  {
    tag: 'FV-2101',
    glyph: {
      basis: 'inherent',
      specified: travels(0, 100, 5).map((travel) => ({ travel, value: equalPercentage(travel, 1) })),
      asFound: travels(25, 70, 5).map((travel) => ({ travel, value: equalPercentage(travel, 0.97) })),
    },
  },
  {
    tag: 'FV-3110',
    glyph: {
      basis: 'inherent',
      specified: travels(0, 100, 5).map((travel) => ({ travel, value: equalPercentage(travel, 1) })),
      asFound: travels(50, 100, 5).map((travel) => ({ travel, value: (0.62 * travel) / 100 })),
    },
  },
  {
    tag: 'LV-3307',
    glyph: {
      basis: 'installed',
      specified: [],
      asFound: travels(40, 100, 5).map((travel) => ({ travel, value: Math.sqrt(travel / 100) })),
    },
  },
  { tag: 'FV-4020', glyph: null },
];

/** An equal-percentage valve that has lost a fifth of its capacity and bends away near 60 % travel. */
export const sampleCharacteristic: NonNullable<PresentedAssessment['characteristic']> = (() => {
  const found = (travel: number) => equalPercentage(travel, 126) * 0.8 * (1 + 0.002 * (travel - 45));
  return {
    kind: 'equal percentage',
    undecided: null,
    pressureDrop: 'measured',
    unit: 'Kv',
    ratedCoefficient: { value: 104, low: 97, high: 112 },
    rangeability: { value: 44, low: 39, high: 51 },
    percentStep: { value: 3.9, low: 3.7, high: 4 },
    span: { from: 27, to: 69 },
    points: travels(27, 69, 2).map((travel, i) => ({
      travel,
      value: found(travel) * (1 + 0.03 * wobble(i)),
      count: Math.round(6 + 120 * Math.exp(-0.5 * ((travel - 46) / 9) ** 2)),
      spread: 0.02,
    })),
    curve: travels(22, 74, 1).map((travel) => ({
      travel,
      value: found(travel),
      low: found(travel) * (0.97 - 0.0012 * Math.abs(travel - 46)),
      high: found(travel) * (1.03 + 0.0012 * Math.abs(travel - 46)),
    })),
    specified: travels(0, 100, 2).map((travel) => {
      const value = equalPercentage(travel, 126);
      const tolerance = 0.1 * (126 / value) ** 0.2;
      return { travel, value, low: value * (1 - tolerance), high: value * (1 + tolerance) };
    }),
    fits: [],
    agreement: 0.97,
  };
})();

/** A valve with no pressures: flow against travel, nothing to hold it against. */
export const sampleInstalled: typeof sampleCharacteristic = {
  ...sampleCharacteristic,
  kind: 'undecided',
  undecided: 'Without pressures no kind can be named.',
  pressureDrop: 'none',
  unit: 'm³/h',
  specified: [],
  ratedCoefficient: null,
  rangeability: null,
  percentStep: null,
};

export const sampleRange: NonNullable<PresentedAssessment['range']> = (() => {
  const { shares, ...rest } = aRidge([{ centre: 46, width: 10, weight: 1 }], { low: 20, high: 60 });
  return {
    ...rest,
    ridge: [...shares],
    judged: true,
    belowLow: 0.01,
    aboveHigh: 0.08,
    atSeat: 0,
    atOpen: 0,
    pinned: 0,
    short: null,
    verdict: 'acceptable',
    rangeabilityUsed: 3.6,
  };
})();

export const sampleDeviation: NonNullable<PresentedAssessment['deviation']> = {
  capacityRatio: { value: 0.81, low: 0.77, high: 0.85 },
  capacityRatioRepeatability: { value: 0.81, low: 0.8, high: 0.82 },
  travelShift: null,
  equivalentShift: -5.4,
  notSeparable:
    'A pure equal-percentage valve tells a lost capacity and a travel offset apart only at its ends.',
  worst: { travel: 67, percent: 21 },
  byTravel: travels(27, 69, 2).map((travel, i) => ({
    travel,
    percent: 2.5 * wobble(i) + (travel > 58 ? (travel - 58) * 2.1 : 0),
    tolerance: 10 * (50 ** (1 - travel / 100)) ** 0.2,
  })),
  suspectedUnitFactor: null,
};

export const sampleGain: NonNullable<PresentedAssessment['gain']> = {
  points: travels(31, 65, 1).map((travel) => ({ travel, gain: 0.35 * Math.exp(0.055 * (travel - 31)) })),
  min: { value: 0.35, low: 0.31, high: 0.4 },
  max: { value: 2.3, low: 2.1, high: 2.5 },
  ratio: { value: 6.5, low: 5.4, high: 7.8 },
  absolute: true,
};

const day = (i: number) => new Date(Date.UTC(2026, 8, 1) + i * 86_400_000).toISOString();

export const sampleMovement = {
  threshold: 1,
  reversalsPerDay: 412,
  travelPerDay: 1840,
  perDay: travels(0, 29, 1)
    .filter((i) => i < 12 || i > 14)
    .map((i) => ({
      day: day(i),
      reversals: Math.round(400 + 90 * wobble(i) + (i > 22 ? 300 : 0)),
      travel: Math.round(1700 + 350 * wobble(i + 3) + (i > 22 ? 1500 : 0)),
    })),
};

export const sampleSplit = {
  deadBand: 2.4,
  standardError: 0.21,
  bins: 12,
  lines: travels(34, 58, 2).map((at, i) => ({
    at,
    up: at - 1.6 + 0.2 * wobble(i),
    down: at + 0.8 + 0.2 * wobble(i + 7),
  })),
};

export const sampleDrift: NonNullable<PresentedAssessment['drift']> = {
  by: 'month',
  reference: { from: day(-360), to: day(-300) },
  series: travels(0, 11, 1).map((i) => {
    const change = -0.004 * i + (i > 7 ? -0.06 : 0) + 0.008 * wobble(i);
    return {
      at: day(-345 + i * 30.4),
      change,
      low: change - 0.018,
      high: change + 0.018,
      windows: 240 - 9 * i,
    };
  }),
  trend: { change: -0.12, low: -0.15, high: -0.09, p: 0.0004, confirmed: true },
  steps: [{ at: day(-345 + 7.5 * 30.4), change: -0.062 }],
};
