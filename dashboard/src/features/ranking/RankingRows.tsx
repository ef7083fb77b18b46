import { Box } from '@mui/material';
import { type RankingRow as Row } from '@tailrace/shared/contracts/ranking';
import { type KeyboardEvent } from 'react';
import { TravelRidgeAxis } from '../../charts/TravelRidge';
import { RankingRow } from './RankingRow';
import { ridgeWidth, rowColumns } from './row-columns';

interface RankingRowsProps {
  rows: readonly Row[];
  /** what the list is called */
  label: string;
}

/** The ranked valves under one head. j and k, or the arrows, move from row to row; Enter opens. */
export function RankingRows({ rows, label }: RankingRowsProps) {
  const headStyle = { color: 'text.secondary', fontSize: '0.8125rem', fontWeight: 500, lineHeight: 1.3 };
  return (
    <Box onKeyDown={moveAmongRows}>
      <Box
        aria-hidden
        sx={{
          ...rowColumns,
          ...headStyle,
          display: { xs: 'none', md: 'grid' },
          alignItems: 'end',
          position: 'sticky',
          top: 0,
          zIndex: 1,
          bgcolor: 'var(--tr-paper)',
          borderBottom: '1px solid var(--tr-edge)',
          pt: 0.5,
          '@media print': { position: 'static' },
        }}
      >
        <Box sx={{ gridArea: 'rank', textAlign: 'right' }}>Rank</Box>
        <Box sx={{ gridArea: 'valve' }}>Valve, service, area</Box>
        <Box sx={{ gridArea: 'ridge', lineHeight: 1 }}>
          <Box sx={{ pl: 1 }}>Time spent at each travel, %</Box>
          <TravelRidgeAxis width={ridgeWidth} />
        </Box>
        <Box sx={{ gridArea: 'glyph' }}>Curve</Box>
        <Box sx={{ gridArea: 'findings' }}>What was found, with its severity</Box>
        <Box sx={{ gridArea: 'attention', textAlign: 'right' }}>Attention</Box>
      </Box>
      <Box component="ol" aria-label={label} sx={{ listStyle: 'none', m: 0, p: 0 }}>
        {rows.map((row) => (
          <RankingRow key={row.tag} row={row} />
        ))}
      </Box>
    </Box>
  );
}

const steps: Partial<Record<string, number>> = { j: 1, ArrowDown: 1, k: -1, ArrowUp: -1 };

function moveAmongRows(event: KeyboardEvent<HTMLElement>): void {
  const step = steps[event.key];
  if (step === undefined || event.ctrlKey || event.metaKey || event.altKey) return;
  const links = [...event.currentTarget.querySelectorAll<HTMLElement>('[data-row-link]')];
  const at = links.indexOf(document.activeElement as HTMLElement);
  if (at < 0) return;
  event.preventDefault();
  links[Math.min(links.length - 1, Math.max(0, at + step))]?.focus();
}
