import { Autocomplete, Box, FormControlLabel, Checkbox, TextField } from '@mui/material';
import { columnPlan, timeFormats, type ColumnPlan } from '@tailrace/shared/contracts/trends';
import { useState } from 'react';
import { Choice } from '../../ui/Choice';
import { decimalWords, delimiterWords, formWords, timeFormatWords } from './plan-in-words';

interface PlanFormProps {
  /** the plan read by until now */
  plan: ColumnPlan;
  header: readonly string[];
  /** called with each change that makes a whole plan */
  onPlan: (plan: ColumnPlan) => void;
}

const zones = ['UTC', ...Intl.supportedValuesOf('timeZone')];
const optionsOf = <K extends string>(words: Record<K, string>) =>
  (Object.keys(words) as K[]).map((value) => ({ value, word: words[value] }));

/** How the file is read. Every change is tried at once on the first rows. */
export function PlanForm({ plan, header, onPlan }: PlanFormProps) {
  const [draft, setDraft] = useState<ColumnPlan>(plan);
  const checked = columnPlan.safeParse(draft);
  const columns = header.map((name) => ({ value: name, word: name }));

  const change = (part: Partial<ColumnPlan>) => {
    const next = { ...draft, ...part };
    setDraft(next);
    const whole = columnPlan.safeParse(next);
    if (whole.success) onPlan(whole.data);
  };
  const long = draft.long ?? { tagColumn: '', valueColumn: '', qualityColumn: null };

  return (
    <>
      <Box sx={{ display: 'flex', flexWrap: 'wrap', gap: 1.5, pt: 1 }}>
        <Choice
          label="Form"
          value={draft.form}
          options={optionsOf(formWords)}
          onChoose={(form) =>
            change({
              form: form as ColumnPlan['form'],
              long:
                form === 'long'
                  ? (draft.long ?? {
                      tagColumn: header[1] ?? '',
                      valueColumn: header[2] ?? '',
                      qualityColumn: header[3] ?? null,
                    })
                  : null,
            })
          }
        />
        <Choice
          label="Columns parted by"
          value={draft.delimiter}
          options={optionsOf(delimiterWords)}
          onChoose={(delimiter) => change({ delimiter: delimiter as ColumnPlan['delimiter'] })}
        />
        <Choice
          label="Decimal mark"
          value={draft.decimalMark}
          options={optionsOf(decimalWords)}
          onChoose={(mark) => change({ decimalMark: mark as ColumnPlan['decimalMark'] })}
        />
        <TextField
          label="Header on line"
          type="number"
          value={draft.headerLine || ''}
          onChange={(event) => change({ headerLine: Number(event.target.value) })}
          sx={{ width: 120 }}
          slotProps={{ htmlInput: { min: 1, max: 100 } }}
        />
        <Choice
          label="Time column"
          value={draft.time.column}
          options={columns}
          onChoose={(column) => change({ time: { ...draft.time, column: column ?? '' } })}
        />
        <Choice
          label="Time written"
          value={draft.time.format}
          options={timeFormats.map((value) => ({ value, word: timeFormatWords[value] }))}
          onChoose={(format) =>
            change({ time: { ...draft.time, format: format as ColumnPlan['time']['format'] } })
          }
          width={250}
        />
        <Autocomplete
          options={zones}
          value={draft.time.zone}
          disableClearable
          onChange={(_, zone) => change({ time: { ...draft.time, zone } })}
          renderInput={(params) => <TextField {...params} label="Zone of stamps without one" />}
          sx={{ width: 230 }}
        />
        {draft.form === 'long' && (
          <>
            <Choice
              label="Tag column"
              value={long.tagColumn}
              options={columns}
              onChoose={(tagColumn) => change({ long: { ...long, tagColumn: tagColumn ?? '' } })}
            />
            <Choice
              label="Value column"
              value={long.valueColumn}
              options={columns}
              onChoose={(valueColumn) => change({ long: { ...long, valueColumn: valueColumn ?? '' } })}
            />
            <Choice
              label="Quality column"
              none="none"
              value={long.qualityColumn ?? undefined}
              options={columns}
              onChoose={(qualityColumn) =>
                change({ long: { ...long, qualityColumn: qualityColumn ?? null } })
              }
            />
          </>
        )}
        <FormControlLabel
          control={
            <Checkbox
              size="small"
              checked={draft.uncertainIsGood}
              onChange={(event) => change({ uncertainIsGood: event.target.checked })}
            />
          }
          label="Uncertain samples count as good"
        />
      </Box>
      {!checked.success && (
        <Box role="alert" sx={{ mt: 1, pl: 1.5, borderLeft: '3px solid var(--tr-rust)' }}>
          {checked.error.issues.map((issue) => issue.message).join(' ')}
        </Box>
      )}
    </>
  );
}
