import { type ColumnPlan, columnPlan } from '@tailrace/shared/contracts/trends';
import { type ValveForm, valveForm } from '@tailrace/shared/contracts/valves';
import { defaultLimits, type LimitOverrides, type Limits, withOverrides } from '@tailrace/shared/core/limits';
import { IANAZone } from 'luxon';
import { readFile } from 'node:fs/promises';
import { z } from 'zod';
import { UnusableInput } from './unusable-input.js';

/** What a plan in a valve's file names; the rest is guessed from each trend file. */
const { shape } = columnPlan;
const partialPlan = z.strictObject({
  form: shape.form.optional(),
  delimiter: shape.delimiter.optional(),
  decimalMark: shape.decimalMark.optional(),
  // Without their defaults: what is left out is to be guessed.
  headerLine: shape.headerLine.unwrap().optional(),
  uncertainIsGood: shape.uncertainIsGood.unwrap().optional(),
  time: shape.time.partial().optional(),
  long: shape.long.unwrap().partial().nullable().optional(),
});
export type PartialPlan = z.infer<typeof partialPlan>;

const valveFile = valveForm.extend({
  columnPlan: partialPlan.nullish().transform((plan) => plan ?? null),
});

export interface ValveFile {
  readonly form: ValveForm;
  readonly plan: PartialPlan | null;
}

/** Reads VALVE.json; UnusableInput names each field that is not right by its JSON pointer. */
export async function readValveFile(path: string): Promise<ValveFile> {
  const { columnPlan: plan, ...form } = checked(path, valveFile, await readJson(path));
  const zone = plan?.time?.zone;
  if (zone !== undefined && !IANAZone.isValidZone(zone))
    throw new UnusableInput(`${path}: /columnPlan/time/zone “${zone}” is not a zone such as Europe/Vienna.`);
  return { form, plan };
}

/** Lays a partial plan over the one guessed from a file. */
export function laidOver(guess: ColumnPlan, given: PartialPlan, path: string): ColumnPlan {
  const { time, long, ...rest } = given;
  return checked(path, columnPlan, {
    ...guess,
    ...rest,
    time: { ...guess.time, ...time },
    long: long === undefined ? guess.long : long && { qualityColumn: null, ...guess.long, ...long },
  });
}

/** The plan as it stands, where it names all that reading needs; null where something is left to guess. */
export function wholePlan(given: PartialPlan): ColumnPlan | null {
  const long = given.long && { qualityColumn: null, ...given.long };
  const time = { zone: 'UTC', ...given.time };
  const whole = columnPlan.safeParse({ ...given, time, long: long ?? null });
  return whole.success ? whole.data : null;
}

/** Reads LIMITS.json and lays it over the defaults. */
export async function readLimitsFile(path: string): Promise<Limits> {
  const given = await readJson(path);
  try {
    return withOverrides(defaultLimits, given as LimitOverrides);
  } catch (error) {
    if (error instanceof RangeError) throw new UnusableInput(`${path}: ${error.message}.`);
    throw error;
  }
}

async function readJson(path: string): Promise<unknown> {
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    throw new UnusableInput(`${path} cannot be read: ${(error as Error).message}.`);
  }
  try {
    return JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (error) {
    throw new UnusableInput(`${path} is not valid JSON: ${(error as Error).message}.`);
  }
}

function checked<T>(path: string, schema: z.ZodType<T>, input: unknown): T {
  const read = schema.safeParse(input);
  if (read.success) return read.data;
  const lines = read.error.issues.map(
    ({ path: field, message }) => `  /${field.map(String).join('/')}: ${message}`,
  );
  throw new UnusableInput(`${path} cannot be used:\n${lines.join('\n')}`);
}
