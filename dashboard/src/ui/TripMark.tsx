import { Box } from '@mui/material';

/** Marks a safety-instrumented or trip valve: never ranked, never given advice on tuning or trim. */
export function TripMark() {
  return (
    <Box
      component="span"
      title="Safety-instrumented or trip duty"
      sx={{
        ml: 1,
        px: 0.5,
        border: '1px solid var(--tr-ink)',
        fontSize: '0.75rem',
        fontWeight: 700,
        verticalAlign: '0.1em',
        color: 'text.primary',
      }}
    >
      trip
    </Box>
  );
}
