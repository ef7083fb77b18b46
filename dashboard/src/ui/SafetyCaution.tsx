import { Typography } from '@mui/material';
import { shortCaution, tripCaution } from '@tailrace/shared/messages/cautions';

/** The short caution of methods.md §11, wherever a screen could lead to work on a valve. */
export function SafetyCaution({ trip = false }: { trip?: boolean }) {
  return (
    <Typography
      component="p"
      variant="body2"
      role="note"
      sx={{ mt: 3, pt: 1, borderTop: '1px solid var(--tr-line)', color: 'text.secondary', maxWidth: '100ch' }}
    >
      {trip ? `${tripCaution} ` : ''}
      {shortCaution}
    </Typography>
  );
}
