import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { duration, number, share } from '@tailrace/shared/messages/figures';
import { Facts } from '../../ui/Facts';
import { Quantity } from '../../ui/Quantity';

type Found = Pick<PresentedAssessment, 'passing' | 'service'>;

interface ServiceFiguresProps extends Found {
  /** unit of a coefficient */
  unit: string;
}

const hours = (value: number) => duration(value * 3_600);

const given = (value: number | null | undefined, write: (value: number) => string): string | null =>
  value === null || value === undefined ? null : write(value);

/** What the service does to the valve: choking, flashing, hours near the seat, and what passes when shut. */
export function ServiceFigures({ passing, service, unit }: ServiceFiguresProps) {
  return (
    <>
      <Facts
        facts={[
          ['Time choked', given(service?.chokedShare, share)],
          ['Time near choking', given(service?.nearChokedShare, share)],
          ['Flashing', given(service?.flashingHours, hours)],
          ['Median cavitation index', given(service?.medianCavitationIndex, (index) => number(index, 1))],
          ['At low travel', given(service?.lowTravelHours, hours)],
          ...(service?.bands ?? [])
            .filter((band) => band.hours > 0)
            .map((band) => [ratioBand(band), hours(band.hours)] as const),
          ...(passing && !('reason' in passing)
            ? ([
                [
                  'Passing when shut',
                  `${number(passing.share * 100, 2)}\u00a0% of rated in ${number(passing.spells)} spells`,
                ],
                ['Coefficient when shut', <Quantity value={passing.coefficient} unit={unit} />],
                ['Smallest that could be seen', `${number(passing.smallestVisible * 100, 2)}\u00a0%`],
              ] as const)
            : []),
        ]}
      />
      {service?.reason && <Note>{service.reason}</Note>}
      {passing && 'reason' in passing && <Note>{`Passing when shut: ${passing.reason}`}</Note>}
    </>
  );
}

function ratioBand({ from, to }: { from: number; to: number }): string {
  return `Drop ratio ${number(from, 2)} to ${number(to, 2)}`;
}

function Note({ children }: { children: string }) {
  return <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 0.75 }}>{children}</Box>;
}
