import { Box, Typography } from '@mui/material';
import { type ReactNode } from 'react';

interface StateOfPageProps {
  title: string;
  children?: ReactNode;
  /** a way on */
  actions?: ReactNode;
  /** said at once to a screen reader */
  alert?: boolean;
}

/** Words in place of content that is not there: what is so, why, and a way on. */
export function StateOfPage({ title, children, actions, alert = false }: StateOfPageProps) {
  return (
    <Box
      role={alert ? 'alert' : undefined}
      sx={{ my: 2, pl: 2, borderLeft: '3px solid', borderColor: alert ? 'var(--tr-rust)' : 'var(--tr-line)' }}
    >
      <Typography variant="h3" component="p">
        {title}
      </Typography>
      {children && (
        <Typography component="div" sx={{ maxWidth: '70ch', color: 'text.secondary' }}>
          {children}
        </Typography>
      )}
      {actions && <Box sx={{ mt: 1, display: 'flex', flexWrap: 'wrap', gap: 1 }}>{actions}</Box>}
    </Box>
  );
}
