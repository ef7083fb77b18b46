import { type UseQueryResult } from '@tanstack/react-query';
import { type ReactNode } from 'react';
import { FailedState } from './FailedState';
import { Loading } from './Loading';

interface FetchedProps<T> {
  query: UseQueryResult<T>;
  /** what is fetched, in words */
  what: string;
  lines?: number;
  children: (answer: T) => ReactNode;
}

/** What every fetching part of a page shows alike: loading, failed, forbidden, or the answer. */
export function Fetched<T>({ query, what, lines, children }: FetchedProps<T>) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.isError) return <FailedState error={query.error} onRetry={() => void query.refetch()} />;
  return <Loading what={what} lines={lines} />;
}
