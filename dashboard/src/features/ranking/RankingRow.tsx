import { Box, Link } from '@mui/material';
import { type RankingRow as Row } from '@tailrace/shared/contracts/ranking';
import { Link as RouterLink } from 'react-router-dom';
import { CharacteristicGlyph } from '../../charts/CharacteristicGlyph';
import { TravelRidge } from '../../charts/TravelRidge';
import { FindingPhrase } from '../../ui/FindingPhrase';
import { Attention } from './Attention';
import { rowColumns, ridgeWidth } from './row-columns';

interface RankingRowProps {
  row: Row;
}

/** One valve: its place, where it spends its time, its curve, what is wrong in words, and how much attention it deserves. */
export function RankingRow({ row }: RankingRowProps) {
  return (
    <Box
      component="li"
      sx={{
        ...rowColumns,
        position: 'relative',
        py: { xs: 1.25, md: 0.75 },
        borderBottom: '1px solid var(--tr-line)',
        breakInside: 'avoid',
        '&:hover': { bgcolor: 'var(--tr-sheet)' },
        '&:focus-within': { bgcolor: 'var(--tr-sheet)', boxShadow: 'inset 3px 0 0 var(--tr-water)' },
      }}
    >
      <Box sx={{ gridArea: 'rank', textAlign: 'right', fontSize: '1.125rem', fontWeight: 500 }}>
        {row.rank ?? '–'}
      </Box>
      <Box sx={{ gridArea: 'valve', minWidth: 0 }}>
        <Link
          component={RouterLink}
          to={`/valves/${encodeURIComponent(row.tag)}`}
          data-row-link
          underline="none"
          sx={{
            fontWeight: 700,
            fontSize: '1.0625rem',
            '&::after': { content: '""', position: 'absolute', inset: 0 },
            '&:hover': { textDecoration: 'underline' },
          }}
        >
          {row.tag}
        </Link>
        {row.trip && (
          <Box
            component="span"
            sx={{ ml: 1, px: 0.5, border: '1px solid var(--tr-ink)', fontSize: '0.75rem', fontWeight: 700 }}
          >
            trip
          </Box>
        )}
        <Box sx={{ lineHeight: 1.3 }}>{row.service ?? 'service not entered'}</Box>
        <Box sx={{ color: 'text.secondary', fontSize: '0.8125rem' }}>
          {row.area.name}
          {row.criticality !== 'normal' && `, ${row.criticality} criticality`}
        </Box>
      </Box>
      <Box sx={{ gridArea: 'ridge', lineHeight: 0 }}>
        <TravelRidge ridge={row.ridge} label={row.tag} width={ridgeWidth} />
      </Box>
      <Box sx={{ gridArea: 'glyph', lineHeight: 0, alignSelf: 'center' }}>
        <CharacteristicGlyph glyph={row.glyph} label={row.tag} />
      </Box>
      <Box sx={{ gridArea: 'findings', minWidth: 0, display: 'grid', gap: 0.25 }}>
        {row.findings.map((finding) => (
          <FindingPhrase key={finding.number} {...finding} />
        ))}
        {row.reason !== null && (
          <Box sx={{ color: 'text.secondary' }}>
            <Box component="span" sx={{ fontWeight: 700, color: 'text.primary' }}>
              Cannot judge
            </Box>
            {`: ${row.reason}`}
          </Box>
        )}
        {row.findings.length === 0 && row.reason === null && (
          <Box sx={{ color: 'text.secondary' }}>{row.window ? 'No finding' : 'Not assessed yet'}</Box>
        )}
      </Box>
      <Box sx={{ gridArea: 'attention', justifySelf: { md: 'end' } }}>
        <Attention value={row.attention} />
      </Box>
    </Box>
  );
}
