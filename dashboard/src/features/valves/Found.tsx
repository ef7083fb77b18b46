import { Box } from '@mui/material';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import { pressureDropWords, screenWords } from '@tailrace/shared/messages/screens';
import { Facts } from '../../ui/Facts';
import { FindingPhrase } from '../../ui/FindingPhrase';
import { Quantity } from '../../ui/Quantity';

/** The right of the sheet: what history shows, findings first, then the figures that stand beside the data sheet's. */
export function Found({ found }: { found: PresentedAssessment }) {
  const { characteristic, deviation, findings } = found;
  return (
    <>
      {findings.length === 0 ? (
        <Box sx={{ color: 'text.secondary', mb: 1.5 }}>
          {found.judged ? screenWords.noFindings : found.reason}
        </Box>
      ) : (
        <Box component="ul" sx={{ listStyle: 'none', m: 0, mb: 1.5, p: 0, display: 'grid', gap: 0.75 }}>
          {findings.map((finding) => (
            <li key={finding.kind}>
              <FindingPhrase {...finding} />
            </li>
          ))}
        </Box>
      )}
      <Facts
        facts={[
          ['Characteristic', characteristic && kindInWords(characteristic.kind)],
          [
            'Rated coefficient',
            characteristic?.ratedCoefficient && (
              <Quantity
                value={characteristic.ratedCoefficient.value}
                unit={characteristic.unit}
                between={characteristic.ratedCoefficient}
              />
            ),
          ],
          [
            'Rangeability',
            characteristic?.rangeability && (
              <Quantity
                value={characteristic.rangeability.value}
                unit="to 1"
                between={characteristic.rangeability}
              />
            ),
          ],
          [
            'Step of coefficient',
            characteristic?.percentStep && (
              <Quantity
                value={characteristic.percentStep.value}
                unit="% per % travel"
                between={characteristic.percentStep}
              />
            ),
          ],
          [
            'Capacity against sheet',
            deviation?.capacityRatio && (
              <Quantity
                value={deviation.capacityRatio.value * 100}
                unit="%"
                between={{
                  low: deviation.capacityRatio.low * 100,
                  high: deviation.capacityRatio.high * 100,
                }}
              />
            ),
          ],
          [
            'Travel shift',
            deviation?.travelShift && (
              <Quantity
                value={deviation.travelShift.value}
                unit="% travel"
                digits={2}
                between={deviation.travelShift}
              />
            ),
          ],
          [
            'Curve covers',
            characteristic && (
              <>
                <Quantity value={characteristic.span.from} digits={2} /> to{' '}
                <Quantity value={characteristic.span.to} unit="% travel" digits={2} />
              </>
            ),
          ],
          ['Basis', `${found.basis}, ${pressureDropWords[found.pressureDrop]}`],
          ['Travel taken from', found.travelSource],
        ]}
      />
      {characteristic?.undecided && (
        <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 1 }}>{characteristic.undecided}</Box>
      )}
      {deviation?.notSeparable && (
        <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 1 }}>{deviation.notSeparable}</Box>
      )}
    </>
  );
}

function kindInWords(kind: NonNullable<PresentedAssessment['characteristic']>['kind']): string {
  return kind === 'undecided' ? 'not decided' : kind;
}
