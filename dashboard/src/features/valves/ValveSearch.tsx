import { Autocomplete, Box, TextField } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { useSettled } from '../../lib/useSettled';
import { valvesQuery } from './api';

/** One field that finds a valve by its tag or its service; "/" leads to it. */
export function ValveSearch() {
  const [typed, setTyped] = useState('');
  const [opened, setOpened] = useState(false);
  const words = useSettled(typed.trim());
  const navigate = useNavigate();
  const input = useRef<HTMLInputElement>(null);
  const { data, isFetching, isError } = useQuery({
    ...valvesQuery({ q: words, pageSize: 8 }),
    enabled: words.length > 0,
  });

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const writing = (event.target as HTMLElement).closest('input, textarea, [contenteditable]');
      if (event.key !== '/' || writing || event.ctrlKey || event.metaKey || event.altKey) return;
      event.preventDefault();
      input.current?.focus();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, []);

  return (
    <Autocomplete
      options={words.length > 0 ? (data?.rows ?? []) : []}
      value={null}
      inputValue={typed}
      onInputChange={(_, text, why) => setTyped(why === 'selectOption' ? '' : text)}
      onChange={(_, valve) => {
        if (!valve) return;
        input.current?.blur();
        void navigate(`/valves/${encodeURIComponent(valve.tag)}`);
      }}
      getOptionLabel={(valve) => valve.tag}
      getOptionKey={(valve) => valve.id}
      isOptionEqualToValue={(a, b) => a.id === b.id}
      filterOptions={(found) => found}
      autoHighlight
      blurOnSelect
      clearOnBlur={false}
      forcePopupIcon={false}
      open={opened && words.length > 0}
      onOpen={() => setOpened(true)}
      onClose={() => setOpened(false)}
      loading={isFetching}
      loadingText="Looking …"
      noOptionsText={
        isError
          ? 'The search did not answer. Try again.'
          : 'No valve of yours has this in its tag or service.'
      }
      renderOption={({ key, ...props }, valve) => (
        <Box component="li" key={key} {...props} sx={{ gap: 1.5, fontSize: '0.9375rem' }}>
          <Box component="span" sx={{ fontWeight: 700, minWidth: '5.5em' }}>
            {valve.tag}
          </Box>
          <Box component="span" sx={{ color: 'text.secondary' }}>
            {valve.service ?? valve.area.name}
          </Box>
        </Box>
      )}
      renderInput={(params) => (
        <TextField
          {...params}
          inputRef={input}
          placeholder="Find a valve by tag or service"
          slotProps={{
            ...params.slotProps,
            htmlInput: { ...params.slotProps.htmlInput, 'aria-label': 'Find a valve', maxLength: 100 },
          }}
        />
      )}
    />
  );
}
