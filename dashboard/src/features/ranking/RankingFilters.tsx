import { Box, Button } from '@mui/material';
import { type Area } from '@tailrace/shared/contracts/people';
import { criticalities } from '@tailrace/shared/core/data-sheet';
import { findingKinds } from '@tailrace/shared/core/findings/kinds';
import { Choice } from '../../ui/Choice';
import { WordFilter } from '../../ui/WordFilter';
import { narrowed, type RankingView } from './ranking-view';

interface RankingFiltersProps {
  view: RankingView;
  areas: readonly Area[];
  onChange: (change: RankingView) => void;
}

const alike = (values: readonly string[]) => values.map((value) => ({ value, word: value }));

/** Narrows the ranking down. */
export function RankingFilters({ view, areas, onChange }: RankingFiltersProps) {
  return (
    <Box
      className="screen-only"
      role="search"
      aria-label="Narrow the ranking down"
      sx={{ display: 'flex', flexWrap: 'wrap', gap: 1.5, alignItems: 'center', pt: 1, mb: 1 }}
    >
      <Choice
        label="Area"
        none="all areas"
        value={view.area}
        options={areas.map((area) => ({ value: area.id, word: area.name }))}
        onChoose={(area) => onChange({ area })}
      />
      <Choice
        label="Finding"
        none="any"
        value={view.kind}
        options={alike(findingKinds)}
        onChoose={(kind) => onChange({ kind })}
      />
      <Choice
        label="Criticality"
        none="any"
        value={view.criticality}
        options={alike(criticalities)}
        onChoose={(criticality) => onChange({ criticality })}
        width={120}
      />
      <WordFilter label="Tag or service" value={view.q} onChange={(q) => onChange({ q })} />
      {narrowed(view) && (
        <Button
          onClick={() => onChange({ area: undefined, kind: undefined, criticality: undefined, q: undefined })}
        >
          Take all filters away
        </Button>
      )}
    </Box>
  );
}
