import { Autocomplete, TextField } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { type ValvePage } from '@tailrace/shared/contracts/valves';
import { useState } from 'react';
import { api } from '../../lib/api-client';
import { useSettled } from '../../lib/useSettled';

interface Chosen {
  readonly id: string;
  readonly tag: string;
}

interface ValveChoiceProps {
  label: string;
  value: Chosen | null;
  /** null: the tag is left in the file */
  onChoose: (valve: Chosen | null) => void;
}

/** A valve of the register, found by typing. */
export function ValveChoice({ label, value, onChoose }: ValveChoiceProps) {
  const [typed, setTyped] = useState(value?.tag ?? '');
  const [open, setOpen] = useState(false);
  const q = useSettled(typed === value?.tag ? '' : typed.trim());
  const found = useQuery({
    queryKey: ['valves', 'choice', q],
    queryFn: ({ signal }) => api.get<ValvePage>('/valves', { query: { q, pageSize: 20 }, signal }),
    enabled: open,
  });
  return (
    <Autocomplete<Chosen>
      options={found.data?.rows ?? []}
      value={value}
      inputValue={typed}
      onInputChange={(_, text) => setTyped(text)}
      onChange={(_, valve) => onChoose(valve && { id: valve.id, tag: valve.tag })}
      open={open}
      onOpen={() => setOpen(true)}
      onClose={() => setOpen(false)}
      getOptionLabel={(valve) => valve.tag}
      getOptionKey={(valve) => valve.id}
      isOptionEqualToValue={(a, b) => a.id === b.id}
      filterOptions={(all) => all}
      loading={found.isFetching}
      noOptionsText="No such valve"
      sx={{ width: 170 }}
      renderInput={(params) => (
        <TextField
          {...params}
          placeholder="left in the file"
          slotProps={{
            ...params.slotProps,
            htmlInput: { ...params.slotProps.htmlInput, 'aria-label': label },
          }}
        />
      )}
    />
  );
}
