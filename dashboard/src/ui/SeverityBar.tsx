import { Box } from '@mui/material';
import { severityInWords } from '@tailrace/shared/messages/screens';

/** How bad it is: length first, the word for those who cannot see it, colour last. */
export function SeverityBar({ severity, width = 44 }: { severity: number; width?: number }) {
  const share = Math.min(1, Math.max(0, severity));
  const word = severityInWords(severity);
  return (
    <Box
      role="img"
      aria-label={`severity ${share.toFixed(1)} of 1: ${word}`}
      title={`Severity ${share.toFixed(2)} of 1: ${word}`}
      sx={{
        position: 'relative',
        flex: 'none',
        width,
        height: 8,
        borderBottom: '1px solid var(--tr-edge)',
        printColorAdjust: 'exact',
      }}
    >
      <Box
        sx={{
          position: 'absolute',
          insetBlock: 0,
          left: 0,
          width: `${share * 100}%`,
          bgcolor: word === 'needs work' ? 'var(--tr-rust)' : 'var(--tr-ochre)',
        }}
      />
    </Box>
  );
}
