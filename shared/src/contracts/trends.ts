import { z } from 'zod';
import { pageOf, pageQuery } from './paging.js';
import { area } from './people.js';
import { historianTagText, instant } from './text.js';
import { signalRole } from './valves.js';

export const trendFileStates = ['received', 'reading', 'taken', 'taken with rejects', 'refused'] as const;
export const trendFileState = z.enum(trendFileStates);
export type TrendFileState = z.infer<typeof trendFileState>;

export const timeFormats = [
  'iso',
  'epoch seconds',
  'epoch milliseconds',
  'year first',
  'day first',
  'month first',
] as const;

/** How one kind of trend file is read. Guessed from the first rows, confirmed by a person. */
export const columnPlan = z
  .object({
    form: z.enum(['wide', 'long']),
    delimiter: z.enum([',', ';', '\t', '|']),
    decimalMark: z.enum(['.', ',']),
    /** 1-based line of the header */
    headerLine: z.number().int().min(1).max(100).default(1),
    time: z.object({
      column: z.string().min(1).max(200),
      format: z.enum(timeFormats),
      /** IANA zone of stamps that do not name their own offset */
      zone: z.string().min(1).max(60),
    }),
    /** long form only */
    long: z
      .object({
        tagColumn: z.string().min(1).max(200),
        valueColumn: z.string().min(1).max(200),
        qualityColumn: z.string().min(1).max(200).nullable(),
      })
      .nullable(),
    /** §1.1: an uncertain sample counts as good only if this says so */
    uncertainIsGood: z.boolean().default(false),
  })
  .refine((plan) => plan.form === 'wide' || plan.long !== null, {
    error: 'The long form names its tag and value columns.',
    path: ['long'],
  })
  .refine((plan) => plan.delimiter !== plan.decimalMark, {
    error: 'The column mark and the decimal mark cannot be the same.',
    path: ['decimalMark'],
  });
export type ColumnPlan = z.infer<typeof columnPlan>;

/** One tag seen in a file, and what it is bound to or could be bound to. */
export const seenTag = z.object({
  historianTag: z.string(),
  /** unit text found in the header, or null */
  unit: z.string().nullable(),
  examples: z.array(z.string()),
  bound: z.array(z.object({ valveTag: z.string(), role: signalRole, unit: z.string().nullable() })),
  proposal: z.object({ valveId: z.uuid(), valveTag: z.string(), role: signalRole }).nullable(),
});

/** The first rows of a file as they will be understood. */
export const trendLook = z.object({
  plan: columnPlan,
  header: z.array(z.string()),
  /** cells as text, first rows after the header */
  rows: z.array(z.array(z.string())),
  /** the same rows understood: UTC instant of each, or what is wrong with it */
  times: z.array(z.object({ instant: instant.nullable(), problem: z.string().nullable() })),
  tags: z.array(seenTag),
  /** things a person must look at before taking the file in */
  doubts: z.array(z.string()),
});
export type TrendLook = z.infer<typeof trendLook>;

export const signalBinding = z.object({
  historianTag: historianTagText,
  valveId: z.uuid(),
  role: signalRole,
  unit: z.string().trim().max(20).nullable(),
  reversed: z.boolean().default(false),
});

/** What is sent to take a file in. Tags bound to no valve are left in the file. */
export const takeInDraft = z.object({ plan: columnPlan, bind: z.array(signalBinding).max(2000).default([]) });
export type TakeInDraft = z.infer<typeof takeInDraft>;

export const lookDraft = z.object({ plan: columnPlan.nullable().default(null) });

export const rejectReasons = [
  'time not understood',
  'time goes backwards',
  'time does not exist',
  'value not a number',
  'wrong number of cells',
  'row too long',
] as const;
export type RejectReason = (typeof rejectReasons)[number];

export const takeInReport = z.object({
  rows: z.number().int(),
  samples: z.number().int(),
  badSamples: z.number().int(),
  tags: z.array(
    z.object({
      historianTag: z.string(),
      taken: z.number().int(),
      bad: z.number().int(),
      from: instant.nullable(),
      to: instant.nullable(),
    }),
  ),
  leftInFile: z.array(z.string()),
  rejects: z.array(
    z.object({
      reason: z.enum(rejectReasons),
      count: z.number().int(),
      firstLines: z.array(z.number().int()),
      example: z.string(),
    }),
  ),
});
export type TakeInReport = z.infer<typeof takeInReport>;

export const trendFile = z.object({
  id: z.uuid(),
  number: z.number().int(),
  name: z.string(),
  /** bytes */
  size: z.number().int(),
  sha256: z.string(),
  area,
  receivedBy: z.string(),
  receivedAt: instant,
  state: trendFileState,
  /** share read, 0 to 1, and rows read so far */
  progress: z.object({ share: z.number(), rows: z.number().int() }),
  plan: columnPlan.nullable(),
  report: takeInReport.nullable(),
  /** why it was refused: what, where and how to mend it */
  refusal: z.string().nullable(),
});
export type TrendFile = z.infer<typeof trendFile>;

export const trendFileQuery = pageQuery.extend({ state: trendFileState.optional() });
export type TrendFileQuery = z.infer<typeof trendFileQuery>;
export const trendFilePage = pageOf(trendFile);

/** Which move a trend file may make next: state × what happens → state. */
export const trendFileMoves: Record<
  TrendFileState,
  Partial<Record<'take in' | 'finish' | 'finish with rejects' | 'refuse' | 'break off', TrendFileState>>
> = {
  received: { 'take in': 'reading', refuse: 'refused' },
  reading: {
    finish: 'taken',
    'finish with rejects': 'taken with rejects',
    refuse: 'refused',
    'break off': 'received',
  },
  taken: { 'take in': 'reading' },
  'taken with rejects': { 'take in': 'reading' },
  refused: { 'take in': 'reading' },
};
