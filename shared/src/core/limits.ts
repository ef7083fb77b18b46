import { type FindingKind } from './findings/kinds.js';

/**
 * Every threshold of methods.md with its default. Limits travel as an argument, never as a constant read from
 * elsewhere, and are written into the assessment that used them. Times in s, travel in %, shares 0 to 1
 * unless the name says otherwise.
 */
export const defaultLimits = {
  preparation: {
    /** §1.1 position and demand outside this are rejected */
    travelLow: -5,
    travelHigh: 105,
    flowLowShare: -0.02,
    flowHighShare: 1.1,
    pressureCrossShare: 0.02,
    pressureCrossSeconds: 60,
    rejectedShare: 0.2,
    /** §1.2 gap: longer than this, or this many 99th percentiles of spacing */
    gapSeconds: 10_800,
    gapSpacings: 3,
    gapChangeShare: 0.01,
    /** §1.3 */
    frozenSeconds: 7_200,
    frozenPartnerMove: 1,
    outageShare: 0.5,
    /** §1.4 low-flow cut-off of the meter, share of span */
    meterCutOffShare: 0.01,
    /** §1.5 */
    inServiceTravel: 1,
    shutDemand: 0.5,
    shutTravel: 1,
    manualSeconds: 1_800,
    startSkipSeconds: 1_800,
    shutSkipSeconds: 300,
    /** §1.6 */
    lagEarliest: -60,
    lagLatest: 300,
    lagCorrelation: 0.3,
    lagPeakRatio: 1.3,
    /** §1.7 */
    hampelHalfWidth: 5,
    hampelSpread: 3,
    hampelShare: 0.01,
  },
  windows: {
    /** §1.9 */
    seconds: 300,
    fastSeconds: 60,
    fastScan: 10,
    positionRange: 2,
    positionDrift: 0.8,
    flowDriftShare: 0.06,
    coverage: 0.9,
    travelLow: 3,
    travelHigh: 99.5,
    flowLowShare: 0.02,
    /** ΔP above this many of its own uncertainties */
    pressureDropUncertainties: 5,
    least: 30,
    /** §1.10 */
    periodSeconds: 7_200,
  },
  uncertainty: {
    /** §2.6 */
    flowReading: 0.01,
    flowSpan: 0.003,
    pressureSpan: 0.0025,
    density: 0.01,
    meter: 0.01,
    trim: 0.02,
    designDropShut: 0.1,
    designDropSlope: 0.2,
    modelledDropShare: 0.2,
  },
  characteristic: {
    /** §3.1 */
    binWidth: 2,
    binWindows: 4,
    binPeriods: 2,
    weightFloor: 0.006,
    spreadRatio: 3,
    endBinShare: 0.15,
    /** §3.2 */
    huber: 1.345,
    turns: 30,
    rangeabilityLow: 12,
    rangeabilityHigh: 120,
    /** §3.3 */
    kindBins: 5,
    kindSpan: 20,
    aiccMargin: 6,
    /** probability a kind needs to be named */
    kindProbability: 0.95,
    curveDifference: 0.012,
    kindAgreement: 0.9,
    kindResamples: 60,
    bandResamples: 200,
    demandOnlySpan: 40,
    demandOnlyDeadBand: 3,
    /** §3.5 */
    ratioBins: 3,
    ratioPeriods: 10,
    ratioSpan: 5,
  },
  comparison: {
    /** §4 */
    leastTravel: 10,
    shiftStandardError: 1.5,
    shiftResidualFloor: 0.02,
    /** independent trim departures: one every this much travel */
    trimCorrelationTravel: 15,
    shutReadingSeconds: 600,
    modelledRatio: 0.25,
  },
  range: {
    /** §5.1 */
    days: 3,
    shortTravel: 97,
    shortShare: 0.02,
    oversizedTop: 60,
    startHours: 48,
    bands: {
      globe: { low: 10, high: 90 },
      'rotary plug': { low: 15, high: 85 },
      'segment ball': { low: 15, high: 85 },
      butterfly: { low: 20, high: 70 },
    },
    /** §5.2 */
    gainSpan: 12,
    gainBins: 6,
    gainHalfWidth: 8,
    gainFloor: 0.05,
  },
  movement: {
    /** §6.1 zig-zag threshold of the travel */
    zigZag: 1,
    /** §6.2; blocks hold 10 to 20 cycles of the periods they are asked about, whatever the pace (ours) */
    samplesPerCycle: 5,
    longestPeriod: 30_000,
    stepFreeCell: 120,
    blockCycles: 10,
    blockCoverage: 0.8,
    leastBlocks: 3,
    /** steps of the travel are held at this many spreads of its ordinary changes */
    stepClip: 1.5,
    regularity: 1,
    oscillationAmplitude: 0.4,
    /** autocorrelation at one and at three periods */
    oscillationFirst: 0.5,
    oscillationThird: 0.3,
    /** periods within this ratio of each other are one oscillation */
    oscillationSpread: 1.3,
    /** a set point swinging at least this share of the process value is the cause */
    setPointShare: 0.5,
    /** §6.3 */
    directionThreshold: 0.5,
    directionNeed: 1,
    directionNeedRatio: 1.25,
    /** how far the reference may have come back from its furthest point */
    directionRetreat: 0.15,
    /** movement of the stem within these seconds that shows it engaged */
    engagedSeconds: 300,
    engagedMove: 0.2,
    slowSeconds: 60,
    slowMove: 1.5,
    slowShare: 0.05,
    directionBinWidth: 2,
    /** bins wanted over the travel visited; narrower ones are used where it is short */
    directionBinsWanted: 10,
    directionBinNarrowest: 0.5,
    directionBinSamples: 12,
    directionBins: 3,
    /** added to the threshold of a split against the flow where no pressures are recorded */
    withoutPressures: 0.5,
    /** §6.4 */
    jumpScan: 10,
    restTravel: 0.35,
    restSeconds: 30,
    jumpTravel: 0.5,
    jumpSeconds: 20,
    jumpDemandRatio: 2,
    jumpZigZag: 0.3,
    jumpShare: 0.15,
    jumpMedian: 0.6,
    jumpsEachWay: 5,
    /** §6.5 */
    mismatchDays: 0.9,
    mismatchLow: 2,
    mismatchHigh: 98,
  },
  drift: {
    /** how far back an analysis run follows drift, days: a year and a month, so that two like seasons meet */
    days: 400,
    /** §7.1 */
    months: 8,
    weeks: 10,
    windowsPerMonth: 20,
    daysPerMonth: 5,
    /** shorter segments of short records: how many, and the windows each needs */
    segments: 10,
    windowsPerSegment: 3,
    binWidth: 2,
    referenceDays: 60,
    referenceShare: 1 / 3,
    /** §7.2 */
    significance: 0.01,
    change: 0.03,
    /** the same where the record has no ten weeks */
    shortChange: 0.05,
    changeSpreads: 3,
    /** §7.3 */
    stepPenalty: 3,
    stepSpreads: 3,
    /** standard errors a step must stand out by, neighbours counted as they resemble each other */
    stepErrors: 4,
    /** the same in records of less than days, where nothing is raised on it */
    shortStepErrors: 3,
    stepSegments: 3,
    /** more levels than this are a wobble followed, not steps */
    mostLevels: 3,
    mostPoints: 400,
    /** §4.4 */
    endSeconds: 600,
    endDemand: 99.5,
    /** §7.5 */
    passingSeconds: 900,
    passingDropShare: 0.25,
    passingSpells: 2,
    passingTotalSeconds: 7_200,
    passingCutOffs: 2,
  },
  stress: {
    /** §2.1 choked from this share of the choked pressure drop; §8 */
    chokedShare: 0.95,
    nearChoked: 0.1,
  },
  findings: {
    /** §9.1 */
    confidence: 0.5,
    keep: 0.85,
    windowDays: 30,
    sizingDays: 90,
    /** §9.2: raise threshold → act now; in the unit of the kind's figure (travel in %, shares 0 to 1, ln for capacity) */
    kinds: {
      Oversized: { raise: 30, actNow: 10 },
      Undersized: { raise: 0.05, actNow: 0.4 },
      'Pinned at limit': { raise: 0.02, actNow: 0.25 },
      'Off characteristic': { raise: 0.12, actNow: 0.5 },
      'Lost capacity': { raise: 0.105, actNow: 0.35 },
      'Gained capacity': { raise: 0.095, actNow: 0.35 },
      'Travel offset': { raise: 3, actNow: 10 },
      'Passing when shut': { raise: 0.005, actNow: 0.05 },
      Sticking: { raise: 1, actNow: 6 },
      'Lost motion': { raise: 1, actNow: 6 },
      Hunting: { raise: 0.2, actNow: 0.8 },
      'Excess movement': { raise: 5_000, actNow: 30_000 },
      'Position mismatch': { raise: 2, actNow: 8 },
      'Uneven gain': { raise: 4, actNow: 12 },
      'Choked service': { raise: 0.05, actNow: 0.5 },
      'Frozen signal': { raise: 2, actNow: 48 },
    } satisfies Record<FindingKind, { raise: number; actNow: number }>,
    /** second rules of a kind */
    belowBandShare: { raise: 0.1, actNow: 0.5 },
    shortShare: { raise: 0.01, actNow: 0.1 },
    driftChange: { raise: 0.03, actNow: 0.2 },
    endReading: { raise: 1.5, actNow: 6 },
    lostMotionNoPosition: { raise: 2, actNow: 8 },
    reversalsPerDay: { raise: 3_000, actNow: 10_000 },
    huntingAmplitude: 1,
  },
};

type Widen<T> = T extends number
  ? number
  : T extends readonly number[]
    ? readonly number[]
    : { readonly [K in keyof T]: Widen<T[K]> };
export type Limits = Widen<typeof defaultLimits>;

type Partly<T> = T extends number | readonly number[] ? T : { readonly [K in keyof T]?: Partly<T[K]> };
/** Any part of the limits, to be laid over the defaults. */
export type LimitOverrides = Partly<Limits>;

/** Lays overrides over limits; what is not named keeps its value. Unknown names and wrong types are a RangeError. */
export function withOverrides(limits: Limits, overrides: LimitOverrides): Limits {
  return overlay(limits, overrides, 'limits') as Limits;
}

function overlay(base: unknown, over: unknown, path: string): unknown {
  if (over === undefined) return base;
  if (typeof base === 'number') {
    if (typeof over !== 'number' || !Number.isFinite(over)) throw new RangeError(`${path} must be a number`);
    return over;
  }
  if (Array.isArray(base)) {
    if (!Array.isArray(over) || !over.every((x) => typeof x === 'number' && Number.isFinite(x)))
      throw new RangeError(`${path} must be a list of numbers`);
    return over;
  }
  if (typeof over !== 'object' || over === null || Array.isArray(over))
    throw new RangeError(`${path} must be an object`);
  const known = base as Record<string, unknown>;
  const merged: Record<string, unknown> = { ...known };
  for (const [key, value] of Object.entries(over)) {
    if (!Object.hasOwn(known, key)) throw new RangeError(`${path}.${key} is not a limit`);
    merged[key] = overlay(known[key], value, `${path}.${key}`);
  }
  return merged;
}
