import { Box, Button, Typography } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { type Area } from '@tailrace/shared/contracts/people';
import { type RankingPage as Page } from '@tailrace/shared/contracts/ranking';
import { rankingInWords, screenWords } from '@tailrace/shared/messages/screens';
import { Link } from 'react-router-dom';
import { siteTime } from '../../lib/dates';
import { useMe } from '../../lib/session-query';
import { pageOfAddress } from '../../lib/useUrlState';
import { EmptyState } from '../../ui/EmptyState';
import { Fetched } from '../../ui/Fetched';
import { Instant } from '../../ui/Instant';
import { Pages } from '../../ui/Pages';
import { rankingQuery } from './api';
import { askedBy, narrowed, rowsOfPage, type RankingView } from './ranking-view';
import { RankingFilters } from './RankingFilters';
import { RankingLists } from './RankingLists';
import { RankingRows } from './RankingRows';

interface RankingPageProps {
  view: RankingView;
  areas: readonly Area[];
  onChange: (change: RankingView) => void;
}

const listNames = {
  ranked: 'Ranked valves',
  trip: 'Trip valves',
  'not judged': 'Valves that cannot be judged',
};

/** The ranking: one sentence, then the valves that deserve work first. */
export function RankingPage({ view, areas, onChange }: RankingPageProps) {
  const asked = askedBy(view);
  const query = useQuery(rankingQuery(asked));
  const list = asked.list ?? 'ranked';
  return (
    <Fetched query={query} what="the ranking" lines={8}>
      {(page) => (
        <>
          <Sentence summary={page.summary} />
          <RankingFilters view={view} areas={areas} onChange={onChange} />
          <RankingLists chosen={list} summary={page.summary} onChange={onChange} />
          <Box
            aria-busy={query.isPlaceholderData}
            sx={{ opacity: query.isPlaceholderData ? 0.6 : 1, borderTop: '1px solid var(--tr-line)' }}
          >
            {page.rows.length > 0 ? (
              <RankingRows rows={page.rows} label={listNames[list]} />
            ) : (
              <NothingRanked narrow={narrowed(view)} list={list} />
            )}
          </Box>
          <Pages
            page={pageOfAddress(view.page)}
            pageSize={rowsOfPage}
            total={page.total}
            what="valves"
            onPage={(wanted) => onChange({ page: wanted > 0 ? String(wanted + 1) : undefined })}
          />
        </>
      )}
    </Fetched>
  );
}

function Sentence({ summary }: { summary: Page['summary'] }) {
  const { zone } = useMe().site;
  const since = summary.since && siteTime(summary.since, zone, 'day');
  return (
    <Typography sx={{ fontSize: '1.125rem', maxWidth: '90ch' }}>
      {rankingInWords(summary, since)}{' '}
      {summary.lastRun && (
        <Box component="span" sx={{ color: 'text.secondary' }}>
          {`Run ${summary.lastRun.number} finished `}
          <Instant at={summary.lastRun.finishedAt} />.
        </Box>
      )}
    </Typography>
  );
}

function NothingRanked({ narrow, list }: { narrow: boolean; list: keyof typeof listNames }) {
  if (narrow)
    return <EmptyState title={screenWords.nothingFits.title}>{screenWords.nothingFits.detail}</EmptyState>;
  if (list === 'trip') return <EmptyState title="No trip valve in your areas" />;
  if (list === 'not judged') return <EmptyState title="Every assessed valve could be judged" />;
  return (
    <EmptyState
      title={screenWords.rankingEmpty.title}
      actions={
        <Button component={Link} to="/trends/new" variant="outlined">
          Bring in a trend file
        </Button>
      }
    >
      {screenWords.rankingEmpty.detail}
    </EmptyState>
  );
}
