import { queryOptions, useQuery } from '@tanstack/react-query';
import { type Me } from '@tailrace/shared/contracts/people';
import { may, type Action } from '@tailrace/shared/contracts/policy';
import { refreshSession } from './session';

/** Who is signed in, or null. */
export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async (): Promise<Me | null> => (await refreshSession())?.me ?? null,
  staleTime: Infinity,
  gcTime: Infinity,
});

/** Who is signed in. Only for what stands behind the sign-in. */
export function useMe(): Me {
  const { data } = useQuery(meQuery);
  if (!data) throw new Error('Nobody is signed in.');
  return data;
}

/** May the person signed in do this anywhere? For hiding what would be refused; the service decides. */
export function useMay(action: Action): boolean {
  const { role, allAreas, areas } = useMe();
  return may({ role, areas: allAreas ? null : areas.map((area) => area.id) }, action);
}
