import { Box } from '@mui/material';
import { type ReactNode } from 'react';

/** What is known, name by name; what is not known stays out. */
export function Facts({ facts }: { facts: readonly (readonly [name: string, fact: ReactNode])[] }) {
  const known = facts.filter(
    ([, fact]) => fact !== null && fact !== undefined && fact !== false && fact !== '',
  );
  return (
    <Box component="dl" sx={{ m: 0, alignSelf: 'start' }}>
      {known.map(([name, fact]) => (
        <Box
          key={name}
          sx={{
            display: 'flex',
            justifyContent: 'space-between',
            columnGap: 2,
            py: 0.375,
            borderBottom: '1px solid var(--tr-line)',
          }}
        >
          <Box component="dt" sx={{ color: 'text.secondary', flex: '0 1 auto' }}>
            {name}
          </Box>
          <Box component="dd" sx={{ m: 0, textAlign: 'right', flex: '0 1 auto' }}>
            {fact}
          </Box>
        </Box>
      ))}
    </Box>
  );
}
