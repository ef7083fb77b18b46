import { Button } from '@mui/material';
import { type LoaderFunctionArgs, useNavigate } from 'react-router-dom';
import { runsQuery } from '../../features/runs/api';
import { RunList } from '../../features/runs/RunList';
import { runsOfPage } from '../../features/runs/run-words';
import { StartRun } from '../../features/runs/StartRun';
import { queryClient } from '../../lib/query-client';
import { useMay } from '../../lib/session-query';
import { pageOfAddress, useUrlState } from '../../lib/useUrlState';
import { PageTitle } from '../../ui/PageTitle';

export function loader({ request }: LoaderFunctionArgs) {
  const page = pageOfAddress(new URL(request.url).searchParams.get('page') ?? undefined);
  void queryClient.prefetchQuery(runsQuery(page, runsOfPage));
  return null;
}

export function Component() {
  const [{ page, start }, change] = useUrlState('page', 'start');
  const navigate = useNavigate();
  const mayStart = useMay('runs:start');
  return (
    <>
      <PageTitle
        actions={
          mayStart &&
          !start && (
            <Button variant="contained" onClick={() => change({ start: '1' })}>
              Start a run
            </Button>
          )
        }
      >
        Runs
      </PageTitle>
      {mayStart && start && (
        <StartRun
          onStarted={(run) => void navigate(`/runs/${run.id}`)}
          onCancel={() => change({ start: undefined })}
        />
      )}
      <RunList
        page={pageOfAddress(page)}
        onPage={(next) => change({ page: next > 0 ? String(next + 1) : undefined })}
      />
    </>
  );
}
