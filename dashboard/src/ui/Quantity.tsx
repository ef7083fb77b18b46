import { Box } from '@mui/material';
import { significant } from '../lib/numbers';

interface QuantityProps {
  value: number | null | undefined;
  /** shown behind the number, after a narrow space that does not break */
  unit?: string;
  /** significant digits */
  digits?: number;
  /** 95 % interval, in the same unit */
  between?: { low: number; high: number };
}

/** A number with its unit and, where there is one, its interval: the one way a figure reaches the screen. */
export function Quantity({ value, unit, digits = 3, between }: QuantityProps) {
  const known = value !== null && value !== undefined && Number.isFinite(value);
  return (
    <Box component="span" sx={{ whiteSpace: 'nowrap', fontVariantNumeric: 'tabular-nums' }}>
      {significant(value, digits)}
      {known && unit ? <Box component="span">{`\u00a0${unit}`}</Box> : null}
      {known && between ? (
        <Box
          component="span"
          sx={{ color: 'text.secondary' }}
          title="95 % interval"
        >{` (${significant(between.low, digits)} to ${significant(between.high, digits)})`}</Box>
      ) : null}
    </Box>
  );
}
