import { Box, LinearProgress } from '@mui/material';
import { type TrendFile } from '@tailrace/shared/contracts/trends';
import { number } from '@tailrace/shared/messages/figures';
import { percentage } from '../../lib/numbers';

/** Where a trend file stands, with its progress while it is being read. */
export function FileState({ file }: { file: Pick<TrendFile, 'state' | 'progress' | 'report'> }) {
  const { state, progress, report } = file;
  if (state === 'reading')
    return (
      <Box sx={{ maxWidth: 320 }}>
        {`reading, ${percentage(progress.share)}\u00a0%, ${number(progress.rows)} rows`}
        <LinearProgress
          variant="determinate"
          value={progress.share * 100}
          aria-label="Share of the file read"
        />
      </Box>
    );
  const rejected = report?.rejects.reduce((sum, reject) => sum + reject.count, 0) ?? 0;
  return (
    <Box component="span" sx={{ fontWeight: state === 'refused' ? 700 : undefined }}>
      {state === 'refused' || state === 'taken with rejects' ? (
        <Mark colour={state === 'refused' ? 'var(--tr-rust)' : 'var(--tr-ochre)'} />
      ) : null}
      {state}
      {rejected > 0 && (
        <Box
          component="span"
          sx={{ color: 'text.secondary' }}
        >{` ·\u00a0${number(rejected)}\u00a0${rejected === 1 ? 'reject' : 'rejects'}`}</Box>
      )}
    </Box>
  );
}

function Mark({ colour }: { colour: string }) {
  return (
    <Box
      component="span"
      aria-hidden
      sx={{
        display: 'inline-block',
        width: 8,
        height: 8,
        mr: 0.75,
        bgcolor: colour,
        printColorAdjust: 'exact',
      }}
    />
  );
}
