import { Box, Button } from '@mui/material';
import { type RankingPage } from '@tailrace/shared/contracts/ranking';
import { lists, type RankingView } from './ranking-view';

interface RankingListsProps {
  chosen: (typeof lists)[number];
  summary: RankingPage['summary'];
  onChange: (change: RankingView) => void;
}

/** Which list: the ranked valves, the trip valves, or those that cannot be judged. */
export function RankingLists({ chosen, summary, onChange }: RankingListsProps) {
  const words = {
    ranked: 'Ranked',
    trip: `Trip valves (${summary.trips})`,
    'not judged': `Cannot judge (${summary.notJudged})`,
  };
  return (
    <Box className="screen-only" role="group" aria-label="List" sx={{ display: 'flex', gap: 2, ml: -1 }}>
      {lists.map((list) => (
        <Button
          key={list}
          aria-pressed={list === chosen}
          onClick={() => onChange({ list: list === 'ranked' ? undefined : list })}
          sx={{
            px: 1,
            borderRadius: 0,
            borderBottom: '2px solid',
            borderColor: list === chosen ? 'var(--tr-ink)' : 'transparent',
            color: list === chosen ? 'text.primary' : undefined,
          }}
        >
          {words[list]}
        </Button>
      ))}
    </Box>
  );
}
