import { MenuItem, TextField } from '@mui/material';

interface ChoiceProps {
  label: string;
  /** said instead of a label where a table's head names the column */
  ariaLabel?: string;
  value: string | undefined;
  options: readonly { value: string; word: string }[];
  /** what no choice is called: "all areas"; left out where one must be chosen */
  none?: string;
  onChoose: (value: string | undefined) => void;
  width?: number | string;
}

/** One choice of a few, in a line of filters. */
export function Choice({ label, ariaLabel, value, options, none, onChoose, width = 170 }: ChoiceProps) {
  const known = options.some((option) => option.value === value);
  return (
    <TextField
      select
      label={label}
      value={known ? value : ''}
      onChange={(event) => onChoose(event.target.value || undefined)}
      sx={{ width }}
      slotProps={{
        inputLabel: { shrink: true },
        select: { displayEmpty: true, ...(ariaLabel && { SelectDisplayProps: { 'aria-label': ariaLabel } }) },
      }}
    >
      {none !== undefined && <MenuItem value="">{none}</MenuItem>}
      {options.map((option) => (
        <MenuItem key={option.value} value={option.value}>
          {option.word}
        </MenuItem>
      ))}
    </TextField>
  );
}
