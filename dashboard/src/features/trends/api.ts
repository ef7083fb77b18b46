import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import {
  type ColumnPlan,
  type TakeInDraft,
  type TrendFile,
  type TrendFileQuery,
  type TrendLook,
} from '@tailrace/shared/contracts/trends';
import { api } from '../../lib/api-client';
import { queryClient } from '../../lib/query-client';
import { upload } from '../../lib/upload';

export interface TrendFilePage {
  readonly rows: readonly TrendFile[];
  readonly total: number;
}

/** ms between two looks at work that goes on */
const pace = 1_500;

export const trendFilesQuery = (query: Partial<TrendFileQuery>) =>
  queryOptions({
    queryKey: ['trends', 'page', query],
    queryFn: ({ signal }) => api.get<TrendFilePage>('/trends', { query, signal }),
    placeholderData: keepPreviousData,
    refetchInterval: ({ state }) =>
      state.data?.rows.some((file) => file.state === 'reading') ? 2 * pace : false,
  });

/** One trend file; asked again and again while it is being read. */
export const trendFileQuery = (id: string) =>
  queryOptions({
    queryKey: ['trends', 'one', id],
    queryFn: ({ signal }) => api.get<TrendFile>(`/trends/${id}`, { signal }),
    refetchInterval: ({ state }) => (state.data?.state === 'reading' ? pace : false),
  });

/** The first rows of a file as a plan reads them; without a plan, as the service guesses it. */
export const lookQuery = (id: string, plan: ColumnPlan | null) =>
  queryOptions({
    queryKey: ['trends', 'look', id, plan],
    queryFn: ({ signal }) => api.post<TrendLook>(`/trends/${id}/look`, { plan }, { signal }),
    placeholderData: keepPreviousData,
    staleTime: Infinity,
  });

/** Sends a file; the same bytes again answer the file that is there already. */
export async function sendTrendFile(
  file: File,
  areaId: string | undefined,
  progress: { onProgress: (share: number) => void; signal?: AbortSignal },
): Promise<TrendFile> {
  const form = new FormData();
  // fields before the file, so that the service knows the area before the bytes arrive
  if (areaId) form.append('areaId', areaId);
  form.append('file', file);
  const received = await upload<TrendFile>('/trends', form, progress);
  await queryClient.invalidateQueries({ queryKey: ['trends', 'page'] });
  return received;
}

export async function takeIn(id: string, draft: TakeInDraft): Promise<TrendFile> {
  const file = await api.post<TrendFile>(`/trends/${id}/take-in`, draft);
  queryClient.setQueryData(trendFileQuery(id).queryKey, file);
  await queryClient.invalidateQueries({ queryKey: ['trends', 'page'] });
  return file;
}

export async function forgetTrendFile(id: string): Promise<void> {
  await api.delete(`/trends/${id}`);
  queryClient.removeQueries({ queryKey: ['trends', 'one', id] });
  await queryClient.invalidateQueries({ queryKey: ['trends', 'page'] });
}
