import { Box, Button, LinearProgress, Typography } from '@mui/material';
import { useMutation, useQuery } from '@tanstack/react-query';
import { type TrendFile, trendFileMoves } from '@tailrace/shared/contracts/trends';
import { number } from '@tailrace/shared/messages/figures';
import { takenInWords, trendFileWords } from '@tailrace/shared/messages/screens';
import { Link as RouterLink, useNavigate } from 'react-router-dom';
import { fileSize, percentage } from '../../lib/numbers';
import { Facts } from '../../ui/Facts';
import { FailedState } from '../../ui/FailedState';
import { Fetched } from '../../ui/Fetched';
import { Instant } from '../../ui/Instant';
import { PageTitle } from '../../ui/PageTitle';
import { Section } from '../../ui/Section';
import { StateOfPage } from '../../ui/StateOfPage';
import { forgetTrendFile, trendFileQuery } from './api';
import { Rejects } from './Rejects';
import { TagsTaken } from './TagsTaken';

interface TrendFileSheetProps {
  id: string;
  mayTakeIn: boolean;
  /** the bytes just sent were already here */
  known: boolean;
}

/** One trend file: its progress, what was taken, what was rejected and why. */
export function TrendFileSheet({ id, mayTakeIn, known }: TrendFileSheetProps) {
  const query = useQuery(trendFileQuery(id));
  return (
    <Fetched query={query} what="the trend file">
      {(file) => (
        <>
          <PageTitle
            beside={<span>{`Trend file ${file.number}`}</span>}
            actions={mayTakeIn && <Actions file={file} />}
          >
            {file.name}
          </PageTitle>
          {known && (
            <StateOfPage title="This file was here already">
              The same bytes had been brought in before, so nothing was kept twice.
            </StateOfPage>
          )}
          <Standing file={file} />
          {file.report && (
            <>
              {file.report.rejects.length > 0 && (
                <Section title="Rejects" note="by reason, with the first lines of each">
                  <Rejects rejects={file.report.rejects} />
                </Section>
              )}
              <Section title="Taken, by tag">
                <TagsTaken report={file.report} />
              </Section>
            </>
          )}
          <Section title="The file">
            <Box sx={{ maxWidth: 620 }}>
              <Facts
                facts={[
                  ['Area', file.area.name],
                  ['Size', fileSize(file.size)],
                  ['Received', <Instant at={file.receivedAt} />],
                  ['By', file.receivedBy],
                  ['Times read in', file.plan?.time.zone],
                  [
                    'SHA-256',
                    <Box component="code" sx={{ overflowWrap: 'anywhere', fontSize: '0.8125rem' }}>
                      {file.sha256}
                    </Box>,
                  ],
                ]}
              />
            </Box>
          </Section>
        </>
      )}
    </Fetched>
  );
}

/** Where the file stands, in words. */
function Standing({ file }: { file: TrendFile }) {
  const { state, progress, report, refusal } = file;
  const rejected = report?.rejects.reduce((sum, reject) => sum + reject.count, 0) ?? 0;
  if (state === 'refused')
    return (
      <StateOfPage alert title="Refused: nothing of it was kept">
        {refusal}
      </StateOfPage>
    );
  return (
    <Box aria-live="polite">
      <Typography sx={{ fontSize: '1.125rem' }}>
        {report && state !== 'reading' ? takenInWords({ ...report, rejected }) : trendFileWords[state]}
      </Typography>
      {state === 'reading' && (
        <Box sx={{ maxWidth: 620, mt: 1 }}>
          <LinearProgress
            variant="determinate"
            value={progress.share * 100}
            aria-label="Share of the file read"
          />
          {`${percentage(progress.share)}\u00a0% read, ${number(progress.rows)} rows so far`}
        </Box>
      )}
    </Box>
  );
}

function Actions({ file }: { file: TrendFile }) {
  const navigate = useNavigate();
  const forget = useMutation({
    mutationFn: () => forgetTrendFile(file.id),
    onSuccess: () => navigate('/trends'),
  });
  const first = file.state === 'received';
  return (
    <>
      {forget.isError && <FailedState error={forget.error} />}
      {(first || file.state === 'refused') && (
        <Button onClick={() => forget.mutate()} disabled={forget.isPending}>
          Forget this file
        </Button>
      )}
      {trendFileMoves[file.state]['take in'] && (
        <Button
          component={RouterLink}
          to={`/trends/new?file=${file.id}`}
          variant={first ? 'contained' : 'outlined'}
        >
          {first ? 'Look and take in' : 'Take in again, read otherwise'}
        </Button>
      )}
    </>
  );
}
