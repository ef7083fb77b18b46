import { Box, Button, Link, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { type TrendFile, trendFileStates } from '@tailrace/shared/contracts/trends';
import { number } from '@tailrace/shared/messages/figures';
import { screenWords } from '@tailrace/shared/messages/screens';
import { Link as RouterLink } from 'react-router-dom';
import { fileSize } from '../../lib/numbers';
import { Choice } from '../../ui/Choice';
import { EmptyState } from '../../ui/EmptyState';
import { Fetched } from '../../ui/Fetched';
import { Instant } from '../../ui/Instant';
import { Pages } from '../../ui/Pages';
import { trendFilesQuery } from './api';
import { FileState } from './FileState';
import { filesAsked, filesOfPage, type TrendsView } from './files-asked';

interface TrendFilesProps {
  view: TrendsView;
  mayTakeIn: boolean;
  onChange: (change: TrendsView) => void;
}

/** The trend files brought in, newest first, and how it went. */
export function TrendFiles({ view, mayTakeIn, onChange }: TrendFilesProps) {
  const asked = filesAsked(view);
  const query = useQuery(trendFilesQuery(asked));
  return (
    <Fetched query={query} what="the trend files">
      {({ rows, total }) =>
        total === 0 && !asked.state ? (
          <EmptyState
            title={screenWords.trendsEmpty.title}
            actions={
              mayTakeIn && (
                <Button component={RouterLink} to="/trends/new" variant="contained">
                  Bring in a trend file
                </Button>
              )
            }
          >
            {screenWords.trendsEmpty.detail}
          </EmptyState>
        ) : (
          <>
            <Box className="screen-only" sx={{ pt: 1, mb: 1 }}>
              <Choice
                label="State"
                none="any"
                value={asked.state}
                options={trendFileStates.map((state) => ({ value: state, word: state }))}
                onChoose={(state) => onChange({ state })}
              />
            </Box>
            {rows.length === 0 ? (
              <EmptyState title={screenWords.nothingFits.title}>{screenWords.nothingFits.detail}</EmptyState>
            ) : (
              <Rows files={rows} />
            )}
            <Pages
              page={asked.page}
              pageSize={filesOfPage}
              total={total}
              what="trend files"
              onPage={(page) => onChange({ page: page > 0 ? String(page + 1) : undefined })}
            />
          </>
        )
      }
    </Fetched>
  );
}

function Rows({ files }: { files: readonly TrendFile[] }) {
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table aria-label="Trend files">
        <TableHead>
          <TableRow>
            <TableCell align="right">No.</TableCell>
            <TableCell>File</TableCell>
            <TableCell>State</TableCell>
            <TableCell align="right">Samples</TableCell>
            <TableCell align="right">Size</TableCell>
            <TableCell>Area</TableCell>
            <TableCell>Received</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {files.map((file) => (
            <TableRow key={file.id} hover>
              <TableCell align="right">{file.number}</TableCell>
              <TableCell sx={{ overflowWrap: 'anywhere', minWidth: '12rem' }}>
                <Link
                  component={RouterLink}
                  to={`/trends/${file.id}`}
                  underline="hover"
                  sx={{ fontWeight: 700 }}
                >
                  {file.name}
                </Link>
              </TableCell>
              <TableCell sx={{ minWidth: '9rem' }}>
                <FileState file={file} />
              </TableCell>
              <TableCell align="right">{file.report ? number(file.report.samples) : '–'}</TableCell>
              <TableCell align="right" sx={{ whiteSpace: 'nowrap' }}>
                {fileSize(file.size)}
              </TableCell>
              <TableCell>{file.area.name}</TableCell>
              <TableCell>
                <Instant at={file.receivedAt} />
                <Box sx={{ color: 'text.secondary', fontSize: '0.8125rem' }}>{file.receivedBy}</Box>
              </TableCell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </Box>
  );
}
