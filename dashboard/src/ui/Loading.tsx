import { Box, Skeleton, Typography } from '@mui/material';

/** Something is on its way: quiet lines in place of what will stand there. */
export function Loading({ what, lines = 4 }: { what: string; lines?: number }) {
  return (
    <Box role="status" aria-live="polite" sx={{ py: 1 }}>
      <Typography variant="body2" sx={{ color: 'text.secondary', mb: 1 }}>
        {`Fetching ${what} …`}
      </Typography>
      {Array.from({ length: lines }, (_, i) => (
        <Skeleton
          key={i}
          height={14}
          width={`${[82, 64, 73, 55, 69][i % 5]}%`}
          sx={{ mb: 1.5, bgcolor: 'var(--tr-band)' }}
        />
      ))}
    </Box>
  );
}
