import { Box, Link } from '@mui/material';
import { type RankingRow as Row } from '@tailrace/shared/contracts/ranking';
import { type MouseEvent } from 'react';
import { Link as RouterLink, useNavigate } from 'react-router-dom';
import { CharacteristicGlyph } from '../../charts/CharacteristicGlyph';
import { TravelRidge } from '../../charts/TravelRidge';
import { FindingPhrase } from '../../ui/FindingPhrase';
import { TripMark } from '../../ui/TripMark';
import { Attention } from './Attention';
import { ridgeWidth, rowColumns } from './row-columns';

const rowLook = {
  ...rowColumns,
  py: { xs: 1.25, md: 0.75 },
  borderBottom: '1px solid var(--tr-line)',
  breakInside: 'avoid',
  cursor: 'pointer',
  scrollMarginTop: '5rem',
  '& > td': { p: 0, minWidth: 0 },
  '&:hover': { bgcolor: 'var(--tr-sheet)' },
  '&:focus-within': { bgcolor: 'var(--tr-sheet)', boxShadow: 'inset 3px 0 0 var(--tr-water)' },
} as const;

/** One valve: its place, where it spends its time, its curve, what is wrong in words, how much attention it deserves. */
export function RankingRow({ row }: { row: Row }) {
  const navigate = useNavigate();
  const sheet = `/valves/${encodeURIComponent(row.tag)}`;
  // The whole row leads to the sheet, except where a person presses a link or marks text to copy it.
  const open = (event: MouseEvent) => {
    if ((event.target as HTMLElement).closest('a') || window.getSelection()?.toString()) return;
    void navigate(sheet);
  };
  return (
    <Box component="tr" role="row" onClick={open} sx={rowLook}>
      <Box
        component="td"
        role="cell"
        sx={{
          gridArea: 'rank',
          textAlign: { xs: 'left', md: 'right' },
          fontSize: '1.125rem',
          fontWeight: 500,
        }}
      >
        {row.rank ?? '–'}
      </Box>
      <Box component="td" role="cell" sx={{ gridArea: 'valve' }}>
        <Link
          component={RouterLink}
          to={sheet}
          data-row-link
          underline="hover"
          sx={{ fontWeight: 700, fontSize: '1.0625rem' }}
        >
          {row.tag}
        </Link>
        {row.trip && <TripMark />}
        <Box sx={{ lineHeight: 1.3 }}>{row.service ?? 'service not entered'}</Box>
        <Box sx={{ color: 'text.secondary', fontSize: '0.8125rem' }}>
          {row.area.name}
          {row.criticality !== 'normal' && `, ${row.criticality} criticality`}
        </Box>
      </Box>
      <Box
        component="td"
        role="cell"
        sx={{ gridArea: 'ridge', lineHeight: 0, '& svg': { maxWidth: '100%', height: 'auto' } }}
      >
        <TravelRidge ridge={row.ridge} label={row.tag} width={ridgeWidth} />
      </Box>
      <Box component="td" role="cell" sx={{ gridArea: 'glyph', lineHeight: 0 }}>
        <CharacteristicGlyph glyph={row.glyph} label={row.tag} />
      </Box>
      <Box component="td" role="cell" sx={{ gridArea: 'findings', display: 'grid', gap: 0.25 }}>
        {row.findings.map((finding) => (
          <FindingPhrase key={finding.number} {...finding} />
        ))}
        <WithoutFinding row={row} />
      </Box>
      <Box component="td" role="cell" sx={{ gridArea: 'attention', justifySelf: 'end' }}>
        <Attention value={row.attention} />
      </Box>
    </Box>
  );
}

/** Why there is nothing to say, or not everything. */
function WithoutFinding({ row }: { row: Row }) {
  if (row.reason !== null)
    return (
      <Box sx={{ color: 'text.secondary', pl: row.findings.length > 0 ? '52px' : 0 }}>
        <Box component="span" sx={{ fontWeight: 700, color: 'text.primary' }}>
          Cannot judge
        </Box>
        {`: ${row.reason}`}
      </Box>
    );
  if (row.findings.length > 0) return null;
  return <Box sx={{ color: 'text.secondary' }}>{row.window ? 'No finding' : 'Not assessed yet'}</Box>;
}
