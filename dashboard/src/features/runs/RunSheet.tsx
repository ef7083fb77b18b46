import { Box, Button, LinearProgress, Typography } from '@mui/material';
import { useMutation, useQuery } from '@tanstack/react-query';
import { type RunDetail, stoppable } from '@tailrace/shared/contracts/runs';
import { runInWords } from '@tailrace/shared/messages/screens';
import { FailedState } from '../../ui/FailedState';
import { Fetched } from '../../ui/Fetched';
import { Instant } from '../../ui/Instant';
import { PageTitle } from '../../ui/PageTitle';
import { runQuery, stopRun } from './api';
import { Outcomes, type OutcomesView } from './Outcomes';
import { shareFinished, triggerInWords } from './run-words';

interface RunSheetProps {
  id: string;
  mayStop: boolean;
  view: OutcomesView;
  onChange: (change: OutcomesView) => void;
}

/** One analysis run: how far it is, and what came out for each valve and why. */
export function RunSheet({ id, mayStop, view, onChange }: RunSheetProps) {
  const query = useQuery(runQuery(id));
  const stop = useMutation({ mutationFn: () => stopRun(id) });
  return (
    <Fetched query={query} what="the run">
      {(run) => (
        <>
          <PageTitle
            beside={<span>{run.state}</span>}
            actions={
              mayStop &&
              stoppable.includes(run.state) && (
                <Button variant="outlined" onClick={() => stop.mutate()} disabled={stop.isPending}>
                  Stop this run
                </Button>
              )
            }
          >
            {`Run ${run.number}`}
          </PageTitle>
          {stop.isError && <FailedState error={stop.error} />}
          <Standing run={run} />
          <Outcomes outcomes={run.outcomes} view={view} onChange={onChange} />
        </>
      )}
    </Fetched>
  );
}

function Standing({ run }: { run: RunDetail }) {
  return (
    <>
      <Typography aria-live="polite" sx={{ fontSize: '1.125rem' }}>
        {runInWords(run)}
      </Typography>
      {stoppable.includes(run.state) && (
        <LinearProgress
          variant="determinate"
          value={shareFinished(run) * 100}
          aria-label="Share of the valves finished"
          sx={{ maxWidth: 620, my: 1 }}
        />
      )}
      <Box sx={{ color: 'text.secondary', mb: 1 }}>
        {`Asked for by ${triggerInWords(run)}, `}
        <Instant at={run.createdAt} />
        {run.finishedAt && (
          <>
            {'; finished '}
            <Instant at={run.finishedAt} />
          </>
        )}
        .
      </Box>
    </>
  );
}
