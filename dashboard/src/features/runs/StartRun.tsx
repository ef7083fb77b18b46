import { zodResolver } from '@hookform/resolvers/zod';
import { Box, Button, TextField } from '@mui/material';
import { type AnalysisRun } from '@tailrace/shared/contracts/runs';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useMe } from '../../lib/session-query';
import { FailedState } from '../../ui/FailedState';
import { startRun } from './api';
import { runDraftOf, startForm, type StartForm } from './start-form';

interface StartRunProps {
  onStarted: (run: AnalysisRun) => void;
  onCancel: () => void;
}

/** Asks for a run: which valves, over which days. Empty means all of them, over the usual window. */
export function StartRun({ onStarted, onCancel }: StartRunProps) {
  const { zone } = useMe().site;
  const form = useForm<StartForm>({
    resolver: zodResolver(startForm),
    defaultValues: { tags: '', from: '', to: '' },
  });
  const [refused, setRefused] = useState<unknown>();
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (values) => {
    try {
      onStarted(await startRun(runDraftOf(values, zone)));
    } catch (error) {
      setRefused(error);
    }
  });

  return (
    <Box
      component="form"
      noValidate
      aria-label="Start a run"
      onSubmit={(event) => void submit(event)}
      sx={{ my: 2, p: 2, border: '1px solid var(--tr-edge)', display: 'grid', gap: 2, maxWidth: 720 }}
    >
      <TextField
        label="Valves, by tag"
        placeholder="all valves of your areas"
        multiline
        maxRows={6}
        error={Boolean(errors.tags)}
        helperText={errors.tags?.message ?? 'Parted by commas, spaces or lines. Left empty: all.'}
        slotProps={{ inputLabel: { shrink: true } }}
        {...form.register('tags')}
      />
      <Box sx={{ display: 'flex', flexWrap: 'wrap', gap: 2 }}>
        <TextField
          label="From the start of"
          type="date"
          error={Boolean(errors.from)}
          helperText={errors.from?.message ?? 'Left empty: the usual window'}
          slotProps={{ inputLabel: { shrink: true } }}
          {...form.register('from')}
        />
        <TextField
          label="To the end of"
          type="date"
          error={Boolean(errors.to)}
          helperText={errors.to?.message ?? 'Left empty: the newest full day'}
          slotProps={{ inputLabel: { shrink: true } }}
          {...form.register('to')}
        />
      </Box>
      {refused !== undefined && <FailedState error={refused} />}
      <Box sx={{ display: 'flex', gap: 1 }}>
        <Button type="submit" variant="contained" disabled={isSubmitting}>
          Start
        </Button>
        <Button onClick={onCancel}>Leave it</Button>
      </Box>
    </Box>
  );
}
