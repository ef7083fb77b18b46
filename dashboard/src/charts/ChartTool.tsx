import { Button } from '@mui/material';

interface ChartToolProps {
  pressed?: boolean;
  onClick: () => void;
  children: string;
}

/** One small word to press above a chart. */
export function ChartTool({ pressed, onClick, children }: ChartToolProps) {
  return (
    <Button
      size="small"
      variant="text"
      aria-pressed={pressed}
      onClick={onClick}
      sx={{
        minWidth: 0,
        px: 1,
        py: 0,
        textTransform: 'none',
        textDecoration: pressed ? 'underline' : 'none',
      }}
    >
      {children}
    </Button>
  );
}
