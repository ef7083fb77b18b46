import { type LoaderFunctionArgs } from 'react-router-dom';
import { rankingQuery } from '../../features/ranking/api';
import { askedBy, viewNames, viewOf } from '../../features/ranking/ranking-view';
import { RankingPage } from '../../features/ranking/RankingPage';
import { queryClient } from '../../lib/query-client';
import { useMe } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';
import { PageTitle } from '../../ui/PageTitle';
import { SafetyCaution } from '../../ui/SafetyCaution';

export function loader({ request }: LoaderFunctionArgs) {
  void queryClient.prefetchQuery(rankingQuery(askedBy(viewOf(new URL(request.url).searchParams))));
  return null;
}

export function Component() {
  const [view, change] = useUrlState(...viewNames);
  const { areas } = useMe();
  return (
    <>
      <PageTitle>Ranking</PageTitle>
      <RankingPage view={view} areas={areas} onChange={change} />
      <SafetyCaution trip={view.list === 'trip'} />
    </>
  );
}
