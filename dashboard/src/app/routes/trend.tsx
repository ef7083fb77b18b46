import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { trendFileQuery } from '../../features/trends/api';
import { TrendFileSheet } from '../../features/trends/TrendFileSheet';
import { queryClient } from '../../lib/query-client';
import { useMay } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';

export function loader({ params }: LoaderFunctionArgs) {
  void queryClient.prefetchQuery(trendFileQuery(params.id ?? ''));
  return null;
}

export function Component() {
  const { id = '' } = useParams();
  const [{ known }] = useUrlState('known');
  return <TrendFileSheet id={id} mayTakeIn={useMay('trends:take-in')} known={known !== undefined} />;
}
