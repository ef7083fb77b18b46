import { redirect, type LoaderFunctionArgs } from 'react-router-dom';
import { meQuery } from '../lib/session-query';
import { queryClient } from '../lib/query-client';

/** The sign-in, remembering where one was. */
export function signInAddress(from: string): string {
  return from === '/' ? '/sign-in' : `/sign-in?from=${encodeURIComponent(from)}`;
}

/** Where to go after the sign-in: only an address of ours. */
export function addressAfterSignIn(from: string | null): string {
  return from && /^\/(?![/\\])/.test(from) && !from.startsWith('/sign-in') ? from : '/';
}

/** Lets only a signed-in person through. */
export async function requireMe({ request }: LoaderFunctionArgs) {
  const me = await queryClient.ensureQueryData(meQuery);
  const { pathname, search } = new URL(request.url);
  return me ?? redirect(signInAddress(pathname + search));
}
