import { problemOf, unreachable } from './problem-error';
import { accessToken, refreshSession } from './session';

type Value = string | number | boolean | null | undefined;
type Query = Readonly<Record<string, Value>>;

interface Request {
  readonly query?: Query | object;
  readonly body?: unknown;
  readonly signal?: AbortSignal;
}

/** An API address with what is asked of it; what is empty is not asked. */
export function address(path: string, query: Query | object = {}): string {
  const asked = Object.entries(query as Query).filter(
    ([, value]) => value !== undefined && value !== null && value !== '',
  );
  const text = new URLSearchParams(asked.map(([name, value]) => [name, String(value)])).toString();
  return text ? `/api${path}?${text}` : `/api${path}`;
}

/**
 * Asks the API. An access token that has run out is replaced once, silently, and the request sent again.
 *
 * @throws ProblemError where the API says no; Error where it was not reached
 */
async function ask<T>(method: string, path: string, { query, body, signal }: Request = {}): Promise<T> {
  const send = () =>
    fetch(address(path, query), {
      method,
      signal: signal ?? null,
      headers: {
        Accept: 'application/json',
        ...(body === undefined ? {} : { 'Content-Type': 'application/json' }),
        ...(accessToken() ? { Authorization: `Bearer ${accessToken()}` } : {}),
      },
      body: body === undefined ? null : JSON.stringify(body),
    }).catch((cause: unknown) => {
      throw signal?.aborted ? cause : unreachable(cause);
    });

  if (!accessToken()) await refreshSession();
  const signedIn = accessToken() !== null;
  let response = await send();
  if (response.status === 401 && signedIn && (await refreshSession())) response = await send();
  if (!response.ok) throw await problemOf(response);
  return (response.status === 204 ? undefined : await response.json()) as T;
}

/** The one way to the API. Answers are checked against their contracts by the service's tests, not again here. */
export const api = {
  get: <T>(path: string, request?: Request) => ask<T>('GET', path, request),
  post: <T>(path: string, body?: unknown, request?: Request) => ask<T>('POST', path, { ...request, body }),
  put: <T>(path: string, body: unknown) => ask<T>('PUT', path, { body }),
  delete: <T = void>(path: string) => ask<T>('DELETE', path),
};
