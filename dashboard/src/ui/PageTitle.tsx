import { Box, Typography } from '@mui/material';
import { type ReactNode } from 'react';

interface PageTitleProps {
  children: string;
  /** what stands beside the title */
  beside?: ReactNode;
  /** what one can do here */
  actions?: ReactNode;
}

/** The head of a page; also names the tab. */
export function PageTitle({ children, beside, actions }: PageTitleProps) {
  return (
    <Box
      sx={{ display: 'flex', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 2, rowGap: 0.5, mb: 1.5 }}
    >
      <title>{`${children} · Tailrace`}</title>
      <Typography variant="h1">{children}</Typography>
      {beside}
      {actions && (
        <Box className="screen-only" sx={{ ml: 'auto', display: 'flex', gap: 1, alignItems: 'center' }}>
          {actions}
        </Box>
      )}
    </Box>
  );
}
