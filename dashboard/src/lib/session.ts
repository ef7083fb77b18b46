import { type Session } from '@tailrace/shared/contracts/people';
import { ProblemError, problemOf, unreachable } from './problem-error';

/**
 * The signed-in session. The access token is kept here, in memory, and nowhere else; a reload gets a new one for the
 * refresh cookie, which scripts cannot read.
 */
let session: Session | null = null;
let refreshing: Promise<Session | null> | null = null;
let atEnd: () => void = () => undefined;

export function accessToken(): string | null {
  return session?.accessToken ?? null;
}

export function keepSession(opened: Session): void {
  session = opened;
}

/** Forgets the session, without telling anybody. */
export function endSession(): void {
  session = null;
}

/** What to do when a session that was open turns out to have ended: the app shows the sign-in. */
export function onSessionEnd(act: () => void): void {
  atEnd = act;
}

/**
 * A session for the refresh cookie, or null where there is none. Callers at the same moment share one request: the
 * cookie is good for one use only.
 *
 * @throws where the service could not be asked; the session then still stands
 */
export function refreshSession(): Promise<Session | null> {
  refreshing ??= oneTabAtATime(askForSession).finally(() => {
    refreshing = null;
  });
  return refreshing;
}

async function askForSession(): Promise<Session | null> {
  const response = await fetch('/api/session/refresh', { method: 'POST' }).catch((cause: unknown) => {
    throw unreachable(cause);
  });
  if (response.ok) {
    session = (await response.json()) as Session;
    return session;
  }
  const problem = await problemOf(response);
  if (!(problem instanceof ProblemError) || problem.status !== 401) throw problem;
  const wasOpen = session !== null;
  session = null;
  if (wasOpen) atEnd();
  return null;
}

/** Two tabs that used the same cookie at once would look like a stolen one, and end the session of both. */
function oneTabAtATime<T>(act: () => Promise<T>): Promise<T> {
  const locks = (navigator as { locks?: LockManager }).locks;
  return locks ? locks.request('tailrace-session', act) : act();
}
