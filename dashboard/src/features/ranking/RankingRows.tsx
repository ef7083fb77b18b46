import { Box } from '@mui/material';
import { type RankingRow as Row } from '@tailrace/shared/contracts/ranking';
import { useRef } from 'react';
import { TravelRidgeAxis } from '../../charts/TravelRidge';
import { RankingRow } from './RankingRow';
import { ridgeWidth, rowColumns } from './row-columns';
import { useRowKeys } from './useRowKeys';

interface RankingRowsProps {
  rows: readonly Row[];
  /** what the list is called */
  label: string;
}

const headLook = {
  ...rowColumns,
  color: 'text.secondary',
  fontSize: '0.8125rem',
  lineHeight: 1.3,
  display: { xs: 'none', md: 'grid' },
  alignItems: 'end',
  pt: 0.5,
  pb: 0.25,
  '& th': { p: 0, fontWeight: 500, textAlign: 'left' },
  '@media print': { ...rowColumns['@media print'], display: 'grid' },
} as const;

/**
 * The ranked valves under one head. The rows are laid out as grids so that they stack on a narrow page; the roles are
 * said outright, because a table laid out otherwise is no longer one to every reader of screens.
 */
export function RankingRows({ rows, label }: RankingRowsProps) {
  const table = useRef<HTMLTableElement>(null);
  useRowKeys(table);
  return (
    <Box
      component="table"
      role="table"
      aria-label={label}
      ref={table}
      sx={{ display: 'block', borderSpacing: 0 }}
    >
      <Box
        component="thead"
        role="rowgroup"
        sx={{
          display: 'block',
          position: 'sticky',
          top: 0,
          zIndex: 1,
          bgcolor: 'var(--tr-paper)',
          borderBottom: { md: '1px solid var(--tr-edge)' },
          '@media print': { position: 'static' },
        }}
      >
        <Box component="tr" role="row" sx={headLook}>
          <Box component="th" role="columnheader" sx={{ gridArea: 'rank', '&&': { textAlign: 'right' } }}>
            Rank
          </Box>
          <Box component="th" role="columnheader" sx={{ gridArea: 'valve' }}>
            Valve, service, area
          </Box>
          <Box component="th" role="columnheader" sx={{ gridArea: 'ridge', lineHeight: 1 }}>
            <Box sx={{ pl: 1, pb: 0.25 }}>Time spent at each travel, %</Box>
            <TravelRidgeAxis width={ridgeWidth} />
          </Box>
          <Box component="th" role="columnheader" sx={{ gridArea: 'glyph' }}>
            Curve
          </Box>
          <Box component="th" role="columnheader" sx={{ gridArea: 'findings' }}>
            Findings, the worst first
          </Box>
          <Box
            component="th"
            role="columnheader"
            sx={{ gridArea: 'attention', '&&': { textAlign: 'right' } }}
          >
            Attention
          </Box>
        </Box>
      </Box>
      <Box component="tbody" role="rowgroup" sx={{ display: 'block' }}>
        {rows.map((row) => (
          <RankingRow key={row.tag} row={row} />
        ))}
      </Box>
    </Box>
  );
}
