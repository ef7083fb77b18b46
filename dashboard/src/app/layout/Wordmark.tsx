import { Box } from '@mui/material';

/** Our own mark: water leaving by a channel, once its work is done. */
export function Wordmark() {
  return (
    <Box
      component="span"
      sx={{ display: 'inline-flex', alignItems: 'center', gap: 1, color: 'var(--tr-ink)' }}
    >
      <svg width="26" height="22" viewBox="0 0 26 22" fill="none" aria-hidden stroke="currentColor">
        <path d="M1.5 1v8c0 4.5 2 6.500 6 6.500H25" strokeWidth="2.5" />
        <path d="M11.500 1v7.500H25" strokeWidth="2.5" />
        <path d="M10.500 20.500q2.400-2 4.800 0t4.800 0t4.900 0" stroke="var(--tr-water)" strokeWidth="2" />
      </svg>
      <Box component="span" sx={{ fontWeight: 700, fontSize: '1.25rem', letterSpacing: '0.01em' }}>
        Tailrace
      </Box>
    </Box>
  );
}
