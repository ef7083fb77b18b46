import { Box } from '@mui/material';
import { type StoredAssessment } from '@tailrace/shared/contracts/assessments';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { number } from '@tailrace/shared/messages/figures';
import { type ReactNode } from 'react';
import { PageTitle } from '../../ui/PageTitle';
import { TripMark } from '../../ui/TripMark';

interface ValveHeadProps {
  valve: Valve;
  assessment: StoredAssessment | undefined;
  actions?: ReactNode;
}

/** Whose sheet it is, what it serves, and how much attention it deserves. */
export function ValveHead({ valve, assessment, actions }: ValveHeadProps) {
  const { dataSheet, area } = valve;
  const attention = assessment?.result.attention ?? null;
  return (
    <PageTitle
      beside={
        <Box sx={{ display: 'flex', flexWrap: 'wrap', columnGap: 2, alignItems: 'baseline' }}>
          {dataSheet.trip && <TripMark />}
          <span>{dataSheet.service ?? 'service not entered'}</span>
          <Box component="span" sx={{ color: 'text.secondary' }}>
            {`${area.name}, ${dataSheet.criticality} criticality`}
          </Box>
          {attention !== null && (
            <span>
              Attention <b>{number(attention)}</b>
              <Box component="span" sx={{ color: 'text.secondary' }}>
                {' '}
                of 100
              </Box>
            </span>
          )}
        </Box>
      }
      actions={actions}
    >
      {valve.tag}
    </PageTitle>
  );
}
