import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { MovementBars } from '../../charts/MovementBars';
import { SplitChart } from '../../charts/SplitChart';
import { Section } from '../../ui/Section';
import { MovementFigures } from './MovementFigures';

interface MovementSectionProps {
  tag: string;
  movement: NonNullable<PresentedAssessment['movement']>;
  /** IANA zone of the site */
  zone: string;
}

const splits = [
  { of: 'demandToPosition', title: 'Demand to position', reference: 'Demand, %', response: 'Position, %' },
  {
    of: 'positionToFlow',
    title: 'Position to flow',
    reference: 'Position, %',
    response: 'Flow as travel, %',
  },
  { of: 'demandToFlow', title: 'Demand to flow', reference: 'Demand, %', response: 'Flow as travel, %' },
] as const;

/** How the valve moves: day by day, and what it loses where it turns round. */
export function MovementSection({ tag, movement, zone }: MovementSectionProps) {
  return (
    <Section title="Movement">
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
        {splits.map(({ of, ...words }) => {
          const split = movement[of];
          return 'lines' in split && split.lines.length > 0 ? (
            <SplitChart key={of} tag={tag} {...words} split={split} />
          ) : null;
        })}
      </Box>
    </Section>
  );
}
