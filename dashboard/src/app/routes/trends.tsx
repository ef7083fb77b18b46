import { Button } from '@mui/material';
import { Link, type LoaderFunctionArgs } from 'react-router-dom';
import { trendFilesQuery } from '../../features/trends/api';
import { filesAsked } from '../../features/trends/files-asked';
import { TrendFiles } from '../../features/trends/TrendFiles';
import { queryClient } from '../../lib/query-client';
import { useMay } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';
import { PageTitle } from '../../ui/PageTitle';

export function loader({ request }: LoaderFunctionArgs) {
  const view = Object.fromEntries(new URL(request.url).searchParams);
  void queryClient.prefetchQuery(trendFilesQuery(filesAsked(view)));
  return null;
}

export function Component() {
  const [view, change] = useUrlState('state', 'page');
  const mayTakeIn = useMay('trends:take-in');
  return (
    <>
      <PageTitle
        actions={
          mayTakeIn && (
            <Button component={Link} to="/trends/new" variant="contained">
              Bring in a trend file
            </Button>
          )
        }
      >
        Trends
      </PageTitle>
      <TrendFiles view={view} mayTakeIn={mayTakeIn} onChange={change} />
    </>
  );
}
