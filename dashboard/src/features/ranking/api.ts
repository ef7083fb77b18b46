import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { type RankingPage, type RankingQuery } from '@tailrace/shared/contracts/ranking';
import { api } from '../../lib/api-client';

export const rankingQuery = (query: Partial<RankingQuery>) =>
  queryOptions({
    queryKey: ['ranking', query],
    queryFn: ({ signal }) => api.get<RankingPage>('/ranking', { query, signal }),
    placeholderData: keepPreviousData,
  });
