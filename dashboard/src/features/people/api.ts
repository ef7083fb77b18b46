import { type Session, type SignInDraft } from '@tailrace/shared/contracts/people';
import { queryClient } from '../../lib/query-client';
import { problemOf, unreachable } from '../../lib/problem-error';
import { endSession, keepSession } from '../../lib/session';
import { meQuery } from '../../lib/session-query';

/** Opens a session; what an earlier person had fetched is forgotten. */
export async function signIn(draft: SignInDraft): Promise<void> {
  const response = await fetch('/api/session', {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify(draft),
  }).catch((cause: unknown) => {
    throw unreachable(cause);
  });
  if (!response.ok) throw await problemOf(response);
  const session = (await response.json()) as Session;
  queryClient.clear();
  keepSession(session);
  queryClient.setQueryData(meQuery.queryKey, session.me);
}

/** Ends the session here even where the service cannot be told. */
export async function signOut(): Promise<void> {
  await fetch('/api/session', { method: 'DELETE' }).catch(() => undefined);
  endSession();
  queryClient.clear();
  queryClient.setQueryData(meQuery.queryKey, null);
}
