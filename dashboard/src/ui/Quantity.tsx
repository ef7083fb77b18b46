import { Box } from '@mui/material';
import { asEntered, significant, unitText } from '../lib/numbers';

interface QuantityProps {
  value: number | null | undefined;
  /** shown behind the number, after a space that does not break */
  unit?: string;
  /** significant digits, or just as it was entered */
  digits?: number | 'as entered';
  /** 95 % interval, in the same unit */
  between?: { low: number; high: number };
}

const whole = { whiteSpace: 'nowrap' } as const;

/** A number with its unit and, where there is one, its interval: the one way a figure reaches the screen. */
export function Quantity({ value, unit, digits = 3, between }: QuantityProps) {
  const known = value !== null && value !== undefined && Number.isFinite(value);
  const written = (figure: number | null | undefined) =>
    digits === 'as entered' ? asEntered(figure) : significant(figure, digits);
  return (
    <>
      <Box component="span" sx={whole}>
        {written(value)}
        {known && unit ? `\u00a0${unitText(unit)}` : null}
      </Box>
      {known && between ? (
        <>
          {' '}
          <Box component="span" sx={{ ...whole, color: 'text.secondary' }} title="95 % interval">
            {`(${written(between.low)} to ${written(between.high)})`}
          </Box>
        </>
      ) : null}
    </>
  );
}
