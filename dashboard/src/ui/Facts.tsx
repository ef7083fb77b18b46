import { Box } from '@mui/material';
import { type ReactNode } from 'react';

/** What is known, name by name; what is not known stays out. */
export function Facts({ facts }: { facts: readonly (readonly [name: string, fact: ReactNode])[] }) {
  const known = facts.filter(
    ([, fact]) => fact !== null && fact !== undefined && fact !== false && fact !== '',
  );
  return (
    <Box
      component="dl"
      sx={{ m: 0, display: 'grid', gridTemplateColumns: 'auto minmax(0, 1fr)', columnGap: 2 }}
    >
      {known.map(([name, fact]) => (
        <Box
          key={name}
          sx={{ display: 'contents', '& > *': { py: 0.375, borderBottom: '1px solid var(--tr-line)' } }}
        >
          <Box component="dt" sx={{ color: 'text.secondary' }}>
            {name}
          </Box>
          <Box component="dd" sx={{ m: 0, textAlign: 'right' }}>
            {fact}
          </Box>
        </Box>
      ))}
    </Box>
  );
}
