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
