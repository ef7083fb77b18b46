import { type LoaderFunctionArgs } from 'react-router-dom';
import { valvesQuery } from '../../features/valves/api';
import { registerAsked, registerNames } from '../../features/valves/register-asked';
import { ValveRegister } from '../../features/valves/ValveRegister';
import { queryClient } from '../../lib/query-client';
import { useMe } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';
import { PageTitle } from '../../ui/PageTitle';

export function loader({ request }: LoaderFunctionArgs) {
  const view = Object.fromEntries(new URL(request.url).searchParams);
  void queryClient.prefetchQuery(valvesQuery(registerAsked(view)));
  return null;
}

export function Component() {
  const [view, change] = useUrlState(...registerNames);
  const { areas } = useMe();
  return (
    <>
      <PageTitle>Valves</PageTitle>
      <ValveRegister view={view} areas={areas} onChange={change} />
    </>
  );
}
