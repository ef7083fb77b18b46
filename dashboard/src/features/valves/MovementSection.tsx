import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { MovementBars } from '../../charts/MovementBars';
import { SplitChart } from '../../charts/SplitChart';
import { Section } from '../../ui/Section';
import { MovementFigures } from './MovementFigures';

interface MovementSectionProps {
  tag: string;
  movement: NonNullable<PresentedAssessment['movement']>;
  pressureDrop: PresentedAssessment['pressureDrop'];
  /** IANA zone of the site */
  zone: string;
}

const splits = [
  { of: 'demandToPosition', title: 'Demand to position', reference: 'Demand, %', response: 'Position, %' },
  {
    of: 'positionToFlow',
    title: 'Position to flow',
    reference: 'Position, %',
    response: null,
  },
  { of: 'demandToFlow', title: 'Demand to flow', reference: 'Demand, %', response: null },
] as const;

/** How the valve moves: day by day, and what it loses where it turns round. */
export function MovementSection({ tag, movement, pressureDrop, zone }: MovementSectionProps) {
  const flow = pressureDrop === 'measured' ? 'Flow coefficient, ln' : 'Flow, ln';
  return (
    <Section title="How it has moved">
      <Box
        sx={{
          display: 'grid',
          columnGap: 4,
          rowGap: 2,
          gridTemplateColumns: { lg: 'minmax(0, 1fr) minmax(0, 1fr)' },
          '& > *': { minWidth: 0 },
        }}
      >
        <MovementBars tag={tag} movement={movement} zone={zone} />
        <MovementFigures movement={movement} />
        {splits.map(({ of, response, ...words }) => {
          const split = movement[of];
          return 'lines' in split && split.lines.length > 0 ? (
            <SplitChart key={of} tag={tag} {...words} response={response ?? flow} split={split} />
          ) : null;
        })}
      </Box>
    </Section>
  );
}
