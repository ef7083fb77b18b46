import { z } from 'zod';
import { characteristicKinds, criticalities, valveStyles } from '../core/data-sheet.js';
import { signalRoles } from '../core/series.js';
import { pageOf, pageQuery } from './paging.js';
import { historianTagText, instant, tagText } from './text.js';
import { area } from './people.js';

const optionalNumber = z
  .number()
  .finite()
  .nullish()
  .transform((v) => v ?? null);
const optionalPositive = z
  .number()
  .finite()
  .positive('Must be above 0.')
  .nullish()
  .transform((v) => v ?? null);
const optionalText = z
  .string()
  .trim()
  .max(200)
  .nullish()
  .transform((v) => v || null);

export const signalRole = z.enum(signalRoles);

export const fluid = z.object({
  phase: z.enum(['liquid', 'gas']),
  name: optionalText,
  /** kg/m³ */
  density: optionalPositive,
  /** kPa(a) */
  vapourPressure: optionalNumber,
  /** kPa(a) */
  criticalPressure: optionalPositive,
  /** mm²/s */
  viscosity: optionalPositive,
  /** kg/kmol */
  molarMass: optionalPositive,
  specificHeatRatio: optionalPositive,
  compressibility: optionalPositive,
  /** K */
  temperature: optionalPositive,
});

export const designCase = z.object({
  name: z.string().trim().min(1).max(60),
  flow: z.number().finite().positive('Must be above 0.'),
  flowUnit: z.string().trim().min(1).max(20),
  upstreamPressure: optionalNumber,
  downstreamPressure: optionalNumber,
  pressureUnit: z
    .string()
    .trim()
    .max(20)
    .nullish()
    .transform((v) => v || null),
});

/** What was specified for a valve, in the register's own units. Every unknown value may be null or absent. */
export const dataSheet = z
  .object({
    service: optionalText,
    characteristic: z
      .enum([...characteristicKinds, 'table'])
      .nullish()
      .transform((v) => v ?? null),
    ratedCoefficient: optionalPositive,
    coefficientUnit: z.enum(['Cv', 'Kv']).default('Kv'),
    rangeability: z
      .number()
      .finite()
      .gt(1, 'Rangeability is above 1.')
      .nullish()
      .transform((v) => v ?? null),
    table: z
      .array(
        z.object({
          travel: z.number().min(0, 'Travel is 0 to 100 %.').max(100, 'Travel is 0 to 100 %.'),
          coefficient: z.number().min(0, 'A coefficient is not negative.'),
        }),
      )
      .max(101)
      .nullish()
      .transform((v) => v ?? null),
    style: z.enum(valveStyles).default('globe'),
    fluid: fluid.nullish().transform((v) => v ?? null),
    FL: optionalPositive,
    xT: optionalPositive,
    Fd: optionalPositive,
    /** mm */
    valveSize: optionalPositive,
    /** mm */
    pipeSize: optionalPositive,
    trip: z
      .boolean()
      .nullish()
      .transform((v) => v ?? false),
    criticality: z.enum(criticalities).default('normal'),
    designBand: z
      .object({ low: z.number().min(0).max(100), high: z.number().min(0).max(100) })
      .refine((band) => band.low < band.high, {
        error: 'The low end lies below the high end.',
        path: ['high'],
      })
      .nullish()
      .transform((v) => v ?? null),
    flowSpan: optionalPositive,
    flowSpanUnit: z
      .string()
      .trim()
      .max(20)
      .nullish()
      .transform((v) => v || null),
    designCases: z
      .array(designCase)
      .max(12)
      .nullish()
      .transform((v) => v ?? []),
    failAction: z
      .enum(['opens', 'closes', 'stays'])
      .nullish()
      .transform((v) => v ?? null),
    leakageClass: z
      .enum(['II', 'III', 'IV', 'V', 'VI'])
      .nullish()
      .transform((v) => v ?? null),
  })
  .refine((sheet) => sheet.characteristic !== 'table' || (sheet.table?.length ?? 0) >= 2, {
    error: 'A table needs at least two points.',
    path: ['table'],
  });
export type RegisterDataSheet = z.infer<typeof dataSheet>;

export const signal = z.object({
  tag: historianTagText,
  unit: z
    .string()
    .trim()
    .max(20)
    .nullish()
    .transform((v) => v || null),
  /** the signal rises as the valve closes */
  reversed: z
    .boolean()
    .nullish()
    .transform((v) => v ?? false),
});
export type Signal = z.infer<typeof signal>;

/** At most one signal a role. */
export const signals = z.partialRecord(signalRole, signal);
export type Signals = z.infer<typeof signals>;

/** The register's own JSON form of a valve: what the command line reads and the register exports. */
export const valveForm = z.object({ tag: tagText, dataSheet, signals });
export type ValveForm = z.infer<typeof valveForm>;

/** What is sent to add or change a valve. `version` is what the editor saw; a stale one is refused. */
export const valveDraft = valveForm.extend({
  areaId: z.uuid('Choose an area.'),
  version: z.number().int().optional(),
});
export type ValveDraft = z.infer<typeof valveDraft>;
export type ValveDraftInput = z.input<typeof valveDraft>;

export const valve = z.object({
  id: z.uuid(),
  tag: z.string(),
  area,
  dataSheet,
  signals,
  version: z.number().int(),
  createdAt: instant,
  updatedAt: instant,
});
export type Valve = z.infer<typeof valve>;

export const valveRow = z.object({
  id: z.uuid(),
  tag: z.string(),
  area,
  service: z.string().nullable(),
  characteristic: z.string().nullable(),
  ratedCoefficient: z.number().nullable(),
  coefficientUnit: z.enum(['Cv', 'Kv']),
  criticality: z.enum(criticalities),
  trip: z.boolean(),
  signalRoles: z.array(signalRole),
});
export type ValveRow = z.infer<typeof valveRow>;

export const valveQuery = pageQuery.extend({
  q: z.string().trim().max(100).optional(),
  area: z.uuid().optional(),
  sort: z.enum(['tag', 'area', 'service', 'criticality']).default('tag'),
  direction: z.enum(['asc', 'desc']).default('asc'),
});
export type ValveQuery = z.infer<typeof valveQuery>;
export const valvePage = pageOf(valveRow);
export type ValvePage = z.infer<typeof valvePage>;
