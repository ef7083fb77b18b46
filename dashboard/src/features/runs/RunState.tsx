import { Box, LinearProgress } from '@mui/material';
import { type AnalysisRun } from '@tailrace/shared/contracts/runs';
import { percentage } from '../../lib/numbers';
import { shareFinished } from './run-words';

/** Where a run stands, with its progress while it goes on. */
export function RunState({ run }: { run: AnalysisRun }) {
  const share = shareFinished(run);
  if (run.state === 'running')
    return (
      <Box sx={{ maxWidth: 320 }}>
        {`running, ${percentage(share)}\u00a0%`}
        <LinearProgress variant="determinate" value={share * 100} aria-label="Share of the valves finished" />
      </Box>
    );
  return (
    <Box component="span" sx={{ fontWeight: run.state === 'done with failures' ? 700 : undefined }}>
      {run.state}
    </Box>
  );
}
