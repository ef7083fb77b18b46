import { Box, Link, Table, TableBody, TableCell, TableHead, TableRow, Typography } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { type AnalysisRun } from '@tailrace/shared/contracts/runs';
import { number } from '@tailrace/shared/messages/figures';
import { scheduleInWords, screenWords } from '@tailrace/shared/messages/screens';
import { Link as RouterLink } from 'react-router-dom';
import { siteTime } from '../../lib/dates';
import { useMe } from '../../lib/session-query';
import { EmptyState } from '../../ui/EmptyState';
import { Fetched } from '../../ui/Fetched';
import { Instant } from '../../ui/Instant';
import { Pages } from '../../ui/Pages';
import { runsQuery } from './api';
import { runsOfPage, triggerInWords } from './run-words';
import { RunState } from './RunState';

interface RunListProps {
  page: number;
  onPage: (page: number) => void;
}

/** The schedule in words, then the runs, newest first. */
export function RunList({ page, onPage }: RunListProps) {
  const query = useQuery(runsQuery(page, runsOfPage));
  const { zone } = useMe().site;
  return (
    <Fetched query={query} what="the analysis runs">
      {({ rows, total, schedule }) => (
        <>
          <Typography sx={{ fontSize: '1.125rem', mb: 1 }}>
            {scheduleInWords(schedule.at, schedule.zone, schedule.next && siteTime(schedule.next, zone))}
          </Typography>
          {rows.length === 0 ? (
            <EmptyState title={screenWords.runsEmpty.title}>{screenWords.runsEmpty.detail}</EmptyState>
          ) : (
            <Rows runs={rows} />
          )}
          <Pages page={page} pageSize={runsOfPage} total={total} what="runs" onPage={onPage} />
        </>
      )}
    </Fetched>
  );
}

function Rows({ runs }: { runs: readonly AnalysisRun[] }) {
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table aria-label="Analysis runs">
        <TableHead>
          <TableRow>
            <TableCell>Run</TableCell>
            <TableCell>State</TableCell>
            <TableCell align="right">Valves</TableCell>
            <TableCell align="right">Judged</TableCell>
            <TableCell align="right">Cannot judge</TableCell>
            <TableCell align="right">Failed</TableCell>
            <TableCell>Asked for by</TableCell>
            <TableCell>Started</TableCell>
            <TableCell>Finished</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {runs.map((run) => (
            <TableRow key={run.id} hover>
              <TableCell>
                <Link
                  component={RouterLink}
                  to={`/runs/${run.id}`}
                  underline="hover"
                  sx={{ fontWeight: 700, whiteSpace: 'nowrap' }}
                >
                  {`Run ${run.number}`}
                </Link>
              </TableCell>
              <TableCell sx={{ minWidth: '9rem' }}>
                <RunState run={run} />
              </TableCell>
              <TableCell align="right">{number(run.valves)}</TableCell>
              <TableCell align="right">{number(run.judged)}</TableCell>
              <TableCell align="right">{number(run.notJudged)}</TableCell>
              <TableCell align="right">{number(run.failed)}</TableCell>
              <TableCell>{triggerInWords(run)}</TableCell>
              <TableCell>
                <Instant at={run.startedAt} />
              </TableCell>
              <TableCell>
                <Instant at={run.finishedAt} />
              </TableCell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </Box>
  );
}
