import { z } from 'zod';
import { characteristicKinds } from '../core/data-sheet.js';
import { assessedFinding, findingKind } from './findings.js';
import { pageOf } from './paging.js';
import { instant, interval } from './text.js';

/** An assessment as it is printed, stored and answered: the core's result in the register's units and in words. */

const split = z.object({
  deadBand: z.number(),
  standardError: z.number(),
  bins: z.number().int(),
  lines: z.array(z.object({ at: z.number(), up: z.number(), down: z.number() })),
});
const notJudged = z.object({ judged: z.literal(false), reason: z.string() });

export const presentedCharacteristic = z.object({
  kind: z.enum([...characteristicKinds, 'undecided']),
  undecided: z.string().nullable(),
  pressureDrop: z.enum(['measured', 'modelled', 'none']),
  /** unit of values: Cv, Kv or the flow's unit */
  unit: z.string(),
  ratedCoefficient: interval.nullable(),
  rangeability: interval.nullable(),
  percentStep: interval.nullable(),
  span: z.object({ from: z.number(), to: z.number() }),
  points: z.array(z.object({ travel: z.number(), value: z.number(), count: z.number(), spread: z.number() })),
  curve: z.array(z.object({ travel: z.number(), value: z.number(), low: z.number(), high: z.number() })),
  /** the sheet's curve and its tolerance band, in the same unit; empty where the basis is installed */
  specified: z.array(z.object({ travel: z.number(), value: z.number(), low: z.number(), high: z.number() })),
  fits: z.array(
    z.object({
      kind: z.enum(characteristicKinds),
      ratedCoefficient: z.number(),
      parameter: z.number().nullable(),
      aicc: z.number(),
      rms: z.number(),
    }),
  ),
  agreement: z.number().nullable(),
});

export const presentedAssessment = z.object({
  tag: z.string(),
  methodVersion: z.string(),
  window: z.object({
    from: instant,
    to: instant,
    samplesSeen: z.number().int(),
    samplesUsed: z.number().int(),
    runningDays: z.number(),
    step: z.number(),
    steadyWindows: z.number().int(),
    periods: z.number().int(),
    leftOut: z.record(z.string(), z.number()),
  }),
  travelSource: z.enum(['position', 'demand']),
  basis: z.enum(['inherent', 'installed']),
  pressureDrop: z.enum(['measured', 'modelled', 'none']),
  judged: z.boolean(),
  reason: z.string().nullable(),
  lag: z.object({ seconds: z.number(), identified: z.boolean() }),
  resolution: z.object({ travel: z.number().nullable(), flow: z.number().nullable() }),
  characteristic: presentedCharacteristic.nullable(),
  deviation: z
    .object({
      capacityRatio: interval.nullable(),
      capacityRatioRepeatability: interval.nullable(),
      travelShift: interval.nullable(),
      equivalentShift: z.number().nullable(),
      notSeparable: z.string().nullable(),
      worst: z.object({ travel: z.number(), percent: z.number() }).nullable(),
      byTravel: z.array(z.object({ travel: z.number(), percent: z.number(), tolerance: z.number() })),
      suspectedUnitFactor: z.number().nullable(),
    })
    .nullable(),
  range: z
    .object({
      judged: z.boolean(),
      p5: z.number(),
      p50: z.number(),
      p95: z.number(),
      belowLow: z.number(),
      aboveHigh: z.number(),
      atSeat: z.number(),
      atOpen: z.number(),
      pinned: z.number(),
      short: z.number().nullable(),
      band: z.object({ low: z.number(), high: z.number() }),
      ridge: z.array(z.number()),
      verdict: z
        .enum(['oversized', 'undersized', 'rangeability not enough', 'well sized', 'acceptable'])
        .nullable(),
      rangeabilityUsed: z.number().nullable(),
    })
    .nullable(),
  gain: z
    .object({
      points: z.array(z.object({ travel: z.number(), gain: z.number() })),
      min: interval,
      max: interval,
      ratio: interval,
      absolute: z.boolean(),
    })
    .nullable(),
  movement: z
    .object({
      threshold: z.number(),
      reversalsPerDay: z.number(),
      travelPerDay: z.number(),
      perDay: z.array(z.object({ day: instant, reversals: z.number(), travel: z.number() })),
      demandToPosition: z.union([split, notJudged]),
      positionToFlow: z.union([split, notJudged]),
      demandToFlow: z.union([split, notJudged]),
      jumps: z.union([
        z.object({ count: z.number(), median: z.number(), share: z.number(), sizes: z.array(z.number()) }),
        notJudged,
      ]),
      oscillation: z
        .union([
          z.object({
            period: z.number(),
            regularity: z.number(),
            amplitude: z.number(),
            share: z.number(),
            blocks: z.number(),
            blockHours: z.number(),
            cause: z.enum(['outside', 'line', 'valve', 'loop', 'not decided']),
          }),
          notJudged,
        ])
        .nullable(),
      mismatch: z.union([
        z.object({ offset: z.number(), spread: z.number(), sameSignDays: z.number(), slope: z.number() }),
        notJudged,
      ]),
    })
    .nullable(),
  drift: z
    .object({
      by: z.enum(['month', 'week', 'day', 'hour', 'minute']),
      reference: z.object({ from: instant, to: instant }),
      series: z.array(
        z.object({ at: instant, change: z.number(), low: z.number(), high: z.number(), windows: z.number() }),
      ),
      trend: z.union([
        z.object({
          change: z.number(),
          low: z.number(),
          high: z.number(),
          p: z.number(),
          confirmed: z.boolean(),
        }),
        notJudged,
      ]),
      steps: z.array(z.object({ at: instant, change: z.number() })),
    })
    .nullable(),
  passing: z
    .union([
      z.object({
        share: z.number(),
        coefficient: z.number(),
        spells: z.number(),
        seconds: z.number(),
        smallestVisible: z.number(),
      }),
      notJudged,
    ])
    .nullable(),
  service: z
    .object({
      chokedShare: z.number().nullable(),
      nearChokedShare: z.number().nullable(),
      flashingHours: z.number().nullable(),
      bands: z.array(z.object({ from: z.number(), to: z.number(), hours: z.number() })),
      medianCavitationIndex: z.number().nullable(),
      lowTravelHours: z.number().nullable(),
      reason: z.string().nullable(),
    })
    .nullable(),
  findings: z.array(assessedFinding),
  notJudged: z.array(
    z.object({ kind: z.union([findingKind, z.enum(['characteristic', 'range'])]), reason: z.string() }),
  ),
  warnings: z.array(z.string()),
  attention: z.number().nullable(),
  attentionTerms: z.array(
    z.object({ kind: findingKind, weight: z.number(), severity: z.number(), confidence: z.number() }),
  ),
});
export type PresentedAssessment = z.infer<typeof presentedAssessment>;

/** An assessment with where it came from. */
export const storedAssessment = z.object({
  id: z.uuid(),
  runNumber: z.number().int(),
  assessedAt: instant,
  result: presentedAssessment,
});
export type StoredAssessment = z.infer<typeof storedAssessment>;

/** One line of a valve's assessments. */
export const assessmentRow = z.object({
  id: z.uuid(),
  runNumber: z.number().int(),
  assessedAt: instant,
  judged: z.boolean(),
  attention: z.number().nullable(),
});
export const assessmentPage = pageOf(assessmentRow);
export type AssessmentPage = z.infer<typeof assessmentPage>;
