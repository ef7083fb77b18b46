import { Box, Typography } from '@mui/material';
import { useId, type ReactNode } from 'react';

interface SectionProps {
  title: string;
  /** what stands beside the title, in small */
  note?: ReactNode;
  children: ReactNode;
}

/** A part of a sheet under its own line and name. */
export function Section({ title, note, children }: SectionProps) {
  const id = useId();
  return (
    <Box
      component="section"
      aria-labelledby={id}
      sx={{ mt: 3, pt: 0.75, borderTop: '1px solid var(--tr-ink)' }}
    >
      <Box sx={{ display: 'flex', flexWrap: 'wrap', columnGap: 2, alignItems: 'baseline', mb: 0.75 }}>
        <Typography variant="h2" id={id}>
          {title}
        </Typography>
        {note && <Box sx={{ color: 'text.secondary', fontSize: '0.875rem' }}>{note}</Box>}
      </Box>
      {children}
    </Box>
  );
}
