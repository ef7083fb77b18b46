import { z } from 'zod';

/** Every way the API says no, once: kind → HTTP status and title (RFC 9457). Details in words come from `messages`. */
export const problemKinds = {
  'invalid-input': { status: 400, title: 'Something in the request is not right' },
  'sign-in-failed': { status: 401, title: 'E-mail or password is wrong' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'session-ended': { status: 401, title: 'The session has ended' },
  'not-allowed': { status: 403, title: 'Your role does not allow this' },
  'not-found': { status: 404, title: 'Not found' },
  'already-exists': { status: 409, title: 'It exists already' },
  'edited-meanwhile': { status: 409, title: 'Somebody else changed it meanwhile' },
  'wrong-state': { status: 409, title: 'Not possible in its present state' },
  'too-large': { status: 413, title: 'Too large' },
  'unusable-file': { status: 422, title: 'The file cannot be used' },
  'upload-cut': { status: 400, title: 'The upload broke off' },
  'too-many-requests': { status: 429, title: 'Too many tries' },
  unexpected: { status: 500, title: 'Something went wrong here' },
  'not-ready': { status: 503, title: 'Not ready' },
} as const;
export type ProblemKind = keyof typeof problemKinds;

export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  /** the request's id, also in the log */
  instance: z.string(),
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
});
export type ProblemDetails = z.infer<typeof problem>;
