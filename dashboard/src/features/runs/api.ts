import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import {
  type AnalysisRun,
  type RunDetail,
  type RunDraft,
  type RunPage,
  stoppable,
} from '@tailrace/shared/contracts/runs';
import { api } from '../../lib/api-client';
import { queryClient } from '../../lib/query-client';

/** ms between two looks at a run that goes on */
const pace = 1_500;

export const runsQuery = (page: number, pageSize: number) =>
  queryOptions({
    queryKey: ['runs', 'page', page, pageSize],
    queryFn: ({ signal }) => api.get<RunPage>('/runs', { query: { page, pageSize }, signal }),
    placeholderData: keepPreviousData,
    refetchInterval: ({ state }) =>
      state.data?.rows.some((run) => stoppable.includes(run.state)) ? 2 * pace : false,
  });

/** One run with its valves; asked again and again while it goes on. */
export const runQuery = (id: string) =>
  queryOptions({
    queryKey: ['runs', 'one', id],
    queryFn: ({ signal }) => api.get<RunDetail>(`/runs/${id}`, { signal }),
    refetchInterval: ({ state }) => (state.data && stoppable.includes(state.data.state) ? pace : false),
  });

export async function startRun(draft: RunDraft): Promise<AnalysisRun> {
  const run = await api.post<AnalysisRun>('/runs', draft);
  await queryClient.invalidateQueries({ queryKey: ['runs', 'page'] });
  return run;
}

export async function stopRun(id: string): Promise<void> {
  const run = await api.post<RunDetail>(`/runs/${id}/stop`);
  queryClient.setQueryData(runQuery(id).queryKey, run);
  await queryClient.invalidateQueries({ queryKey: ['runs', 'page'] });
}
