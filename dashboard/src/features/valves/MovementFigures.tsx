import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { duration, number, share, travel } from '@tailrace/shared/messages/figures';
import { oscillationCauseWords } from '@tailrace/shared/messages/screens';
import { Box } from '@mui/material';
import { Facts } from '../../ui/Facts';

type Movement = NonNullable<PresentedAssessment['movement']>;

/** How the valve moves, in figures; what could not be judged says why. */
export function MovementFigures({ movement }: { movement: Movement }) {
  const { jumps, oscillation, mismatch } = movement;
  const band = (split: Movement['demandToPosition']) =>
    'reason' in split ? (
      <Reason>{split.reason}</Reason>
    ) : (
      `${travel(split.deadBand, 2)}, standard error ${travel(split.standardError, 2)}`
    );
  return (
    <Facts
      facts={[
        ['Reversals a day', number(movement.reversalsPerDay)],
        ['Travel a day', travel(movement.travelPerDay)],
        ['Dead band, demand to position', band(movement.demandToPosition)],
        ['Dead band, position to flow', band(movement.positionToFlow)],
        ['Dead band, demand to flow', band(movement.demandToFlow)],
        [
          'Jumps',
          'reason' in jumps ? (
            <Reason>{jumps.reason}</Reason>
          ) : (
            `${number(jumps.count)}, median ${travel(jumps.median, 1)}, ${share(jumps.share)} of moves`
          ),
        ],
        [
          'Oscillation',
          oscillation === null ? (
            'none found'
          ) : 'reason' in oscillation ? (
            <Reason>{oscillation.reason}</Reason>
          ) : (
            `every ${duration(oscillation.period)}, ${travel(oscillation.amplitude, 1)} amplitude, ${share(oscillation.share)} of the time; ${oscillationCauseWords[oscillation.cause]}`
          ),
        ],
        [
          'Position less demand',
          'reason' in mismatch ? (
            <Reason>{mismatch.reason}</Reason>
          ) : (
            `${travel(mismatch.offset, 1)}, spread ${travel(mismatch.spread, 1)}`
          ),
        ],
      ]}
    />
  );
}

function Reason({ children }: { children: string }) {
  return (
    <Box component="span" sx={{ color: 'text.secondary', fontSize: '0.875rem' }}>
      {children}
    </Box>
  );
}
