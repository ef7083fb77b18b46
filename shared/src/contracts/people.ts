import { z } from 'zod';
import { role } from './policy.js';

export const signInDraft = z.object({
  email: z.email('Give your e-mail address.').trim().toLowerCase().max(254),
  password: z.string().min(1, 'Give your password.').max(200, 'A password has 200 characters at most.'),
});
export type SignInDraft = z.infer<typeof signInDraft>;

export const area = z.object({ id: z.uuid(), code: z.string(), name: z.string() });
export type Area = z.infer<typeof area>;

export const site = z.object({
  name: z.string(),
  /** IANA zone all times are shown in */
  zone: z.string(),
  coefficientUnit: z.enum(['Cv', 'Kv']),
});
export type Site = z.infer<typeof site>;

export const me = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role,
  allAreas: z.boolean(),
  areas: z.array(area),
  site,
});
export type Me = z.infer<typeof me>;

/** What sign-in and refresh answer. The access token lives in memory only; the refresh token is a cookie. */
export const session = z.object({
  accessToken: z.string(),
  /** s */
  expiresIn: z.number().int(),
  me,
});
export type Session = z.infer<typeof session>;

export const areaDraft = z.object({
  code: z
    .string()
    .trim()
    .regex(/^[A-Za-z0-9-]{1,12}$/, 'A code has 1 to 12 letters, digits or dashes.'),
  name: z.string().trim().min(1, 'Give the area a name.').max(60, 'A name has 60 characters at most.'),
});
export type AreaDraft = z.infer<typeof areaDraft>;

export const personDraft = z.object({
  name: z.string().trim().min(1, 'Give the name.').max(100, 'A name has 100 characters at most.'),
  email: z.email('Give an e-mail address.').trim().toLowerCase().max(254),
  role,
  /** null: all areas */
  areaIds: z.array(z.uuid()).max(500).nullable(),
  password: z
    .string()
    .min(10, 'A password has 10 characters or more.')
    .max(200, 'A password has 200 characters at most.'),
});
export type PersonDraft = z.infer<typeof personDraft>;

export const person = personDraft.omit({ password: true }).extend({ id: z.uuid() });
export type Person = z.infer<typeof person>;
