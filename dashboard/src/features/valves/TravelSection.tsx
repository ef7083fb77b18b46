import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { DeviationChart } from '../../charts/DeviationChart';
import { GainChart } from '../../charts/GainChart';
import { TravelChart } from '../../charts/TravelChart';
import { Section } from '../../ui/Section';
import { RangeFigures } from './RangeFigures';

/** Where the valve works, and how its gain and its shape lie over that travel. */
export function TravelSection({ tag, result }: { tag: string; result: PresentedAssessment }) {
  const { range, gain, deviation } = result;
  const shape = deviation !== null && deviation.byTravel.length > 0;
  return (
    <>
      {range && (
        <Section title="Where it has worked">
          <Box sx={{ ...twoColumns, gridTemplateColumns: { lg: 'minmax(0, 2.4fr) minmax(17rem, 1fr)' } }}>
            <TravelChart tag={tag} ridge={{ ...range, shares: range.ridge }} />
            <RangeFigures range={range} />
          </Box>
        </Section>
      )}
      {(gain !== null || shape) && (
        <Section title="Gain and shape">
          <Box sx={twoColumns}>
            {gain && <GainChart tag={tag} gain={gain} />}
            {shape && <DeviationChart tag={tag} bins={deviation.byTravel} />}
          </Box>
        </Section>
      )}
    </>
  );
}

const twoColumns = {
  display: 'grid',
  columnGap: 4,
  rowGap: 2,
  gridTemplateColumns: { lg: 'minmax(0, 1fr) minmax(0, 1fr)' },
  '& > *': { minWidth: 0 },
} as const;
