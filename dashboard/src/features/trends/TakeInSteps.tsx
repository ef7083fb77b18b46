import { Box, Button } from '@mui/material';
import { useMutation, useQuery } from '@tanstack/react-query';
import { type ColumnPlan, type TrendLook } from '@tailrace/shared/contracts/trends';
import { useState, type ReactNode } from 'react';
import { useSettled } from '../../lib/useSettled';
import { FailedState } from '../../ui/FailedState';
import { Fetched } from '../../ui/Fetched';
import { Section } from '../../ui/Section';
import { lookQuery, takeIn } from './api';
import { Doubts } from './Doubts';
import { FirstRows } from './FirstRows';
import { planInWords } from './plan-in-words';
import { PlanForm } from './PlanForm';
import { bindingsOf, countChoices, troubleWith, type SignalChoices } from './signal-choice';
import { SignalRows } from './SignalRows';
import { type Step } from './step-of';

interface TakeInStepsProps {
  /** the trend file's id */
  id: string;
  step: Exclude<Step, 'file'>;
  onStep: (step: Step) => void;
  onTaken: () => void;
}

/** Steps two to four: look at the first rows, settle plan and signals, take the file in. */
export function TakeInSteps({ id, step, onStep, onTaken }: TakeInStepsProps) {
  const [wanted, setWanted] = useState<ColumnPlan | null>(null);
  const [chosen, setChosen] = useState<SignalChoices>({});
  const guess = useQuery(lookQuery(id, null));
  const look = useQuery(lookQuery(id, useSettled(wanted)));
  const taking = useMutation({
    mutationFn: ({ plan, tags }: TrendLook) => takeIn(id, { plan, bind: bindingsOf(tags, chosen) }),
    onSuccess: onTaken,
  });

  return (
    <Fetched query={guess} what="the first rows" lines={8}>
      {(first) => {
        const seen = look.data ?? first;
        const trouble = troubleWith(seen.tags, chosen);
        if (step === 'look')
          return (
            <>
              <Box sx={{ maxWidth: '100ch' }}>{planInWords(seen.plan)}</Box>
              <Doubts doubts={seen.doubts} />
              <FirstRows look={seen} />
              <Onward>
                <Button variant="contained" onClick={() => onStep('plan')}>
                  Go on to plan and signals
                </Button>
              </Onward>
            </>
          );
        if (step === 'plan')
          return (
            <>
              <Section title="Column plan" note="each change is tried on the first rows at once">
                <PlanForm plan={wanted ?? first.plan} header={seen.header} onPlan={setWanted} />
                {look.isError && <FailedState error={look.error} />}
                <Doubts doubts={seen.doubts} />
                <Box sx={{ mt: 1.5 }}>
                  <FirstRows look={seen} rows={4} />
                </Box>
              </Section>
              <Section title="Signals" note={`${seen.tags.length} tags in the file`}>
                <SignalRows
                  tags={seen.tags}
                  chosen={chosen}
                  onChoose={(tag, choice) => setChosen({ ...chosen, [tag]: choice })}
                />
                {trouble && (
                  <Box role="alert" sx={{ mt: 1, pl: 1.5, borderLeft: '3px solid var(--tr-rust)' }}>
                    {trouble}
                  </Box>
                )}
              </Section>
              <Onward>
                <Button onClick={() => onStep('look')}>Back</Button>
                <Button
                  variant="contained"
                  disabled={trouble !== null || look.isError}
                  onClick={() => onStep('take in')}
                >
                  Go on to take in
                </Button>
              </Onward>
            </>
          );
        return (
          <>
            <Box sx={{ maxWidth: '100ch' }}>{planInWords(seen.plan)}</Box>
            <Box sx={{ my: 1 }}>{choicesInWords(countChoices(seen.tags, chosen))}</Box>
            <Doubts doubts={seen.doubts} />
            {taking.isError && <FailedState error={taking.error} />}
            <Onward>
              <Button onClick={() => onStep('plan')}>Back</Button>
              <Button
                variant="contained"
                disabled={taking.isPending || trouble !== null || look.isError}
                onClick={() => taking.mutate(seen)}
              >
                Take it in
              </Button>
            </Onward>
          </>
        );
      }}
    </Fetched>
  );
}

function Onward({ children }: { children: ReactNode }) {
  return <Box sx={{ display: 'flex', gap: 1, mt: 2 }}>{children}</Box>;
}

function choicesInWords({ bound, newly, left }: ReturnType<typeof countChoices>): string {
  const parts = [
    `${bound + newly} of ${bound + newly + left} tags will be taken`,
    newly > 0 ? `${newly} of them bound now` : null,
    left > 0 ? `${left} stay in the file` : null,
  ];
  return `${parts.filter((part) => part !== null).join(', ')}.`;
}
