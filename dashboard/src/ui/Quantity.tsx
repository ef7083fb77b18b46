import { Box } from '@mui/material';
import { significant } from '../lib/numbers';

interface QuantityProps {
  value: number | null | undefined;
  /** shown behind the number, after a space that does not break */
  unit?: string;
  /** significant digits */
  digits?: number;
  /** 95 % interval, in the same unit */
  between?: { low: number; high: number };
}

const whole = { whiteSpace: 'nowrap' } as const;

/** A number with its unit and, where there is one, its interval: the one way a figure reaches the screen. */
export function Quantity({ value, unit, digits = 3, between }: QuantityProps) {
  const known = value !== null && value !== undefined && Number.isFinite(value);
  return (
    <>
      <Box component="span" sx={whole}>
        {significant(value, digits)}
        {known && unit ? `\u00a0${unit}` : null}
      </Box>
      {known && between ? (
        <>
          {' '}
          <Box component="span" sx={{ ...whole, color: 'text.secondary' }} title="95 % interval">
            {`(${significant(between.low, digits)} to ${significant(between.high, digits)})`}
          </Box>
        </>
      ) : null}
    </>
  );
}
