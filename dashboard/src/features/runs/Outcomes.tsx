import { Box, Link, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { type ValveOutcome } from '@tailrace/shared/contracts/runs';
import { number } from '@tailrace/shared/messages/figures';
import { screenWords } from '@tailrace/shared/messages/screens';
import { Link as RouterLink } from 'react-router-dom';
import { pageOfAddress } from '../../lib/useUrlState';
import { Choice } from '../../ui/Choice';
import { EmptyState } from '../../ui/EmptyState';
import { Pages } from '../../ui/Pages';

/** What of the valves of a run lives in the address. */
export interface OutcomesView {
  outcome?: string | undefined;
  page?: string | undefined;
}

interface OutcomesProps {
  outcomes: readonly ValveOutcome[];
  view: OutcomesView;
  onChange: (change: OutcomesView) => void;
}

const rowsOfPage = 100;
const kinds = ['judged', 'not judged', 'failed', 'waiting', 'stopped'] as const;
const words = {
  judged: 'judged',
  'not judged': 'cannot judge',
  failed: 'failed',
  waiting: 'waiting',
  stopped: 'stopped',
} as const;

/** What came out for each valve, and why where nothing did. */
export function Outcomes({ outcomes, view, onChange }: OutcomesProps) {
  const wanted = kinds.find((kind) => kind === view.outcome);
  const chosen = wanted ? outcomes.filter(({ outcome }) => outcome === wanted) : outcomes;
  const page = pageOfAddress(view.page);
  const rows = chosen.slice(page * rowsOfPage, (page + 1) * rowsOfPage);
  const count = (kind: ValveOutcome['outcome']) => outcomes.filter(({ outcome }) => outcome === kind).length;
  return (
    <>
      <Box className="screen-only" sx={{ pt: 1, mb: 1 }}>
        <Choice
          label="Outcome"
          none="any"
          value={wanted}
          options={kinds
            .filter((kind) => count(kind) > 0 || kind === wanted)
            .map((kind) => ({ value: kind, word: `${words[kind]} (${count(kind)})` }))}
          onChoose={(outcome) => onChange({ outcome })}
        />
      </Box>
      {rows.length === 0 ? (
        <EmptyState title={screenWords.nothingFits.title}>{screenWords.nothingFits.detail}</EmptyState>
      ) : (
        <Box sx={{ overflowX: 'auto' }}>
          <Table aria-label="Outcome of each valve">
            <TableHead>
              <TableRow>
                <TableCell>Valve</TableCell>
                <TableCell>Outcome</TableCell>
                <TableCell align="right">Findings</TableCell>
                <TableCell align="right">Computing</TableCell>
                <TableCell sx={{ width: '60%', minWidth: '18rem' }}>Reason</TableCell>
              </TableRow>
            </TableHead>
            <TableBody>
              {rows.map((row) => (
                <TableRow key={row.tag} hover>
                  <TableCell>
                    <Link
                      component={RouterLink}
                      to={`/valves/${encodeURIComponent(row.tag)}`}
                      underline="hover"
                      sx={{ fontWeight: 700, whiteSpace: 'nowrap' }}
                    >
                      {row.tag}
                    </Link>
                  </TableCell>
                  <TableCell
                    sx={{ whiteSpace: 'nowrap', fontWeight: row.outcome === 'failed' ? 700 : undefined }}
                  >
                    {words[row.outcome]}
                  </TableCell>
                  <TableCell align="right">{row.outcome === 'judged' ? row.findings : '–'}</TableCell>
                  <TableCell align="right" sx={{ whiteSpace: 'nowrap' }}>
                    {row.took === null ? '–' : `${number(row.took / 1000, 1)}\u00a0s`}
                  </TableCell>
                  <TableCell sx={{ color: 'text.secondary' }}>{row.reason}</TableCell>
                </TableRow>
              ))}
            </TableBody>
          </Table>
        </Box>
      )}
      <Pages
        page={page}
        pageSize={rowsOfPage}
        total={chosen.length}
        what="valves"
        onPage={(next) => onChange({ page: next > 0 ? String(next + 1) : undefined })}
      />
    </>
  );
}
