import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import {
  assessmentQuery,
  assessmentsQuery,
  findingsOfValveQuery,
  valveQuery,
} from '../../features/valves/api';
import { ValveSheet } from '../../features/valves/ValveSheet';
import { queryClient } from '../../lib/query-client';
import { useUrlState } from '../../lib/useUrlState';

export function loader({ params, request }: LoaderFunctionArgs) {
  const { tag = '' } = params;
  const chosen = new URL(request.url).searchParams.get('assessment') ?? undefined;
  void queryClient.prefetchQuery(valveQuery(tag));
  void queryClient.prefetchQuery(assessmentsQuery(tag));
  void queryClient.prefetchQuery(assessmentQuery(tag, chosen));
  void queryClient.prefetchQuery(findingsOfValveQuery(tag));
  return null;
}

export function Component() {
  const { tag = '' } = useParams();
  const [{ assessment }, change] = useUrlState('assessment');
  return (
    <ValveSheet
      key={tag}
      tag={tag}
      chosen={assessment}
      onChoose={(chosen) => change({ assessment: chosen })}
    />
  );
}
