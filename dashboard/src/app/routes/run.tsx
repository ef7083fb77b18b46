import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { runQuery } from '../../features/runs/api';
import { RunSheet } from '../../features/runs/RunSheet';
import { queryClient } from '../../lib/query-client';
import { useMay } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';

export function loader({ params }: LoaderFunctionArgs) {
  void queryClient.prefetchQuery(runQuery(params.id ?? ''));
  return null;
}

export function Component() {
  const { id = '' } = useParams();
  const [view, change] = useUrlState('outcome', 'page');
  return <RunSheet id={id} mayStop={useMay('runs:start')} view={view} onChange={change} />;
}
