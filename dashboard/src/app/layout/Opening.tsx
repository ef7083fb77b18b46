import { Box } from '@mui/material';
import { Wordmark } from './Wordmark';

/** What shows until the first page is there. */
export function Opening() {
  return (
    <Box role="status" aria-label="Tailrace opens" sx={{ p: 4, opacity: 0.7 }}>
      <Wordmark />
    </Box>
  );
}
