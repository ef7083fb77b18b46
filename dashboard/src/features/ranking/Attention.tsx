import { Box } from '@mui/material';
import { number } from '@tailrace/shared/messages/figures';

/** How much a valve deserves work now, 0 to 100: the number, and its length. */
export function Attention({ value }: { value: number | null }) {
  if (value === null) return <Box sx={{ color: 'text.secondary', textAlign: 'right' }}>–</Box>;
  return (
    <Box sx={{ width: '4rem', textAlign: 'right' }}>
      <Box
        component="span"
        sx={{ fontSize: '1.25rem', fontWeight: 700, lineHeight: 1.2 }}
        title="Attention, 0 to 100"
      >
        {number(value)}
      </Box>
      <Box aria-hidden sx={{ height: 3, bgcolor: 'var(--tr-band)', printColorAdjust: 'exact' }}>
        <Box
          sx={{
            height: 3,
            ml: 'auto',
            width: `${Math.min(100, Math.max(0, value))}%`,
            bgcolor: 'var(--tr-ink)',
          }}
        />
      </Box>
    </Box>
  );
}
