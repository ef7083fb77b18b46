import { TextField } from '@mui/material';
import { useEffect, useRef, useState } from 'react';

interface WordFilterProps {
  label: string;
  value: string | undefined;
  onChange: (words: string | undefined) => void;
}

/** ms without typing before the list is asked */
const rest = 300;

/** Text to look for in a list; asks once the typing rests. */
export function WordFilter({ label, value = '', onChange }: WordFilterProps) {
  const [typed, setTyped] = useState(value);
  const [known, setKnown] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  // the address changed by another way than typing here
  if (value !== known) {
    setKnown(value);
    if (value !== typed.trim()) setTyped(value);
  }

  // what was typed last must not reach the address of another page
  useEffect(() => () => clearTimeout(timer.current), []);

  const type = (text: string) => {
    setTyped(text);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => onChange(text.trim() || undefined), rest);
  };

  return (
    <TextField
      label={label}
      type="search"
      value={typed}
      onChange={(event) => type(event.target.value)}
      sx={{ width: 190 }}
      slotProps={{ inputLabel: { shrink: true }, htmlInput: { maxLength: 100 } }}
    />
  );
}
