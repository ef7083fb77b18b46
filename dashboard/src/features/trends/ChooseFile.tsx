import { Box, Button, LinearProgress } from '@mui/material';
import { useMutation } from '@tanstack/react-query';
import { type Area } from '@tailrace/shared/contracts/people';
import { type TrendFile } from '@tailrace/shared/contracts/trends';
import { useRef, useState, type DragEvent } from 'react';
import { fileSize, percentage } from '../../lib/numbers';
import { Choice } from '../../ui/Choice';
import { FailedState } from '../../ui/FailedState';
import { sendTrendFile } from './api';

interface ChooseFileProps {
  areas: readonly Area[];
  onSent: (file: TrendFile) => void;
}

/** Step one: the area and the file; then how far it is sent. */
export function ChooseFile({ areas, onSent }: ChooseFileProps) {
  const [areaId, setAreaId] = useState<string>();
  const [over, setOver] = useState(false);
  const [sent, setSent] = useState(0);
  const input = useRef<HTMLInputElement>(null);
  const stop = useRef<AbortController>(null);
  const area = areas.length === 1 ? areas[0]?.id : areaId;

  const sending = useMutation({
    mutationFn: (file: File) => {
      stop.current = new AbortController();
      setSent(0);
      return sendTrendFile(file, area, { onProgress: setSent, signal: stop.current.signal });
    },
    onSuccess: onSent,
  });
  const stopped = sending.error instanceof DOMException && sending.error.name === 'AbortError';
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    const [file] = event.dataTransfer.files;
    if (file && area) sending.mutate(file);
  };

  if (sending.isPending)
    return (
      <Box sx={{ maxWidth: 620 }}>
        <Box sx={{ fontWeight: 500 }}>{sending.variables.name}</Box>
        <LinearProgress
          variant={sent < 1 ? 'determinate' : 'indeterminate'}
          value={sent * 100}
          aria-label="Share of the file sent"
          sx={{ my: 0.75 }}
        />
        <Box sx={{ display: 'flex', justifyContent: 'space-between', alignItems: 'center' }}>
          <span>
            {sent < 1
              ? `${percentage(sent)}\u00a0% of ${fileSize(sending.variables.size)} sent. Stay on this page until it is.`
              : 'Sent; it is being stored.'}
          </span>
          <Button onClick={() => stop.current?.abort()}>Stop</Button>
        </Box>
      </Box>
    );

  return (
    <Box sx={{ display: 'grid', gap: 2, maxWidth: 620 }}>
      {areas.length > 1 && (
        <Choice
          label="Area whose valves it is about"
          none="choose …"
          value={areaId}
          options={areas.map(({ id, name }) => ({ value: id, word: name }))}
          onChoose={setAreaId}
          width="100%"
        />
      )}
      <Box
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        sx={{
          p: 3,
          border: '1px dashed',
          borderColor: over ? 'var(--tr-water)' : 'var(--tr-edge)',
          bgcolor: over ? 'var(--tr-sheet)' : undefined,
          display: 'grid',
          gap: 1,
          justifyItems: 'start',
        }}
      >
        <Button variant="contained" disabled={!area} onClick={() => input.current?.click()}>
          Choose a trend file
        </Button>
        <input
          type="file"
          ref={input}
          hidden
          aria-label="Trend file"
          disabled={!area}
          accept=".csv,.txt,.tsv,.gz,text/csv,application/gzip"
          onChange={(event) => {
            const file = event.target.files?.[0];
            if (file) sending.mutate(file);
          }}
        />
        <Box sx={{ color: 'text.secondary' }}>
          {area
            ? 'or drop it here. CSV as the historian exports it, a column a tag or a row a sample; gzipped is fine.'
            : 'First say which area it is about.'}
        </Box>
      </Box>
      {sending.isError &&
        (stopped ? (
          <Box role="status">Stopped. Nothing was kept.</Box>
        ) : (
          <FailedState error={sending.error} />
        ))}
    </Box>
  );
}
