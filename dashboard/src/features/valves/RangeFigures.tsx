import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { share } from '@tailrace/shared/messages/figures';
import { Facts } from '../../ui/Facts';
import { Quantity } from '../../ui/Quantity';

/** Where the valve works, in figures. */
export function RangeFigures({ range }: { range: NonNullable<PresentedAssessment['range']> }) {
  const band = `${range.band.low} to ${range.band.high}\u00a0%`;
  return (
    <Facts
      facts={[
        ['Verdict on size', range.verdict ?? 'not judged'],
        ['5 % of the time below', <Quantity value={range.p5} unit="% travel" />],
        ['Half the time below', <Quantity value={range.p50} unit="% travel" />],
        ['95 % of the time below', <Quantity value={range.p95} unit="% travel" />],
        [`Below the band of ${band}`, share(range.belowLow)],
        [`Above the band of ${band}`, share(range.aboveHigh)],
        ['At the seat with flow', share(range.atSeat)],
        ['Wide open', share(range.atOpen)],
        ['Pinned at an end in automatic', share(range.pinned)],
        ['Wide open, set point not reached', range.short !== null && share(range.short)],
        [
          'Rangeability used',
          range.rangeabilityUsed !== null && (
            <Quantity value={range.rangeabilityUsed} unit="to 1" digits={2} />
          ),
        ],
      ]}
    />
  );
}
