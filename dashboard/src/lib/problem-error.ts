import { problemKinds, type ProblemDetails, type ProblemKind } from '@tailrace/shared/contracts/problems';

/** The API said no, in its own words (RFC 9457 problem details). */
export class ProblemError extends Error {
  readonly status: number;
  readonly kind: ProblemKind;
  readonly title: string;
  readonly detail: string;
  /** the request's id, as in the service's log */
  readonly instance: string;
  readonly errors: readonly { pointer: string; detail: string }[];

  constructor(details: ProblemDetails) {
    super(`${details.title}. ${details.detail}`);
    this.name = 'ProblemError';
    this.status = details.status;
    this.kind = kindOf(details);
    this.title = details.title;
    this.detail = details.detail;
    this.instance = details.instance;
    this.errors = details.errors ?? [];
  }
}

function kindOf({ type, status }: ProblemDetails): ProblemKind {
  const kind = type.slice(type.lastIndexOf('/') + 1);
  if (kind in problemKinds) return kind as ProblemKind;
  return status === 404 ? 'not-found' : status === 403 ? 'not-allowed' : 'unexpected';
}

/** The service was not reached at all. */
export function unreachable(cause: unknown): Error {
  return new Error('Tailrace cannot be reached. Check the connection; nothing was changed.', { cause });
}

/** The problem an answer carries, also where something in between answered in its own form. */
export async function problemOf(response: Pick<Response, 'status' | 'text'>): Promise<ProblemError> {
  return problemFrom(response.status, await response.text());
}

/** The same from an answer's text. */
export function problemFrom(status: number, text: string): ProblemError {
  const details = parsed(text);
  if (details) return new ProblemError(details);
  return new ProblemError({
    type: '/problems/unexpected',
    title: 'The service did not answer as it should',
    status,
    detail: 'Try again in a moment. If it stays, tell your site administrator.',
    instance: '',
  });
}

function parsed(text: string): ProblemDetails | null {
  try {
    const body: unknown = JSON.parse(text);
    const looksRight = typeof body === 'object' && body !== null && 'title' in body && 'status' in body;
    return looksRight ? ({ type: '', detail: '', instance: '', ...body } as ProblemDetails) : null;
  } catch {
    return null;
  }
}
