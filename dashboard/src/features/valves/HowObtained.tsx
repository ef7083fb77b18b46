import { Box } from '@mui/material';
import { type StoredAssessment } from '@tailrace/shared/contracts/assessments';
import { duration, number } from '@tailrace/shared/messages/figures';
import { leftOutInWords, pressureDropWords } from '@tailrace/shared/messages/screens';
import { Facts } from '../../ui/Facts';
import { Instant } from '../../ui/Instant';

/** How the figures were obtained: window, samples used of seen, basis, and what was left out and why. */
export function HowObtained({ assessment }: { assessment: StoredAssessment }) {
  const { result } = assessment;
  const { window, lag, resolution } = result;
  const leftOut = Object.entries(window.leftOut)
    .filter(([, count]) => count > 0)
    .sort(([, a], [, b]) => b - a);
  return (
    <Box sx={{ display: 'grid', columnGap: 6, rowGap: 2, gridTemplateColumns: { md: '1fr 1fr' } }}>
      <Facts
        facts={[
          [
            'Window',
            <>
              <Instant at={window.from} form="day" /> to <Instant at={window.to} form="day" />
            </>,
          ],
          ['Samples used of seen', `${number(window.samplesUsed)} of ${number(window.samplesSeen)}`],
          ['Time in service', `${number(window.runningDays, window.runningDays < 10 ? 1 : 0)} days`],
          [
            'Steady windows',
            `${number(window.steadyWindows)} in ${number(window.periods)} independent periods`,
          ],
          ['Grid', duration(window.step)],
          ['Basis', `${result.basis}, ${pressureDropWords[result.pressureDrop]}`],
          ['Travel taken from', result.travelSource],
          ['Flow lags travel by', lag.identified ? duration(lag.seconds) : 'not identified'],
          [
            'Resolution of travel',
            resolution.travel !== null && `${number(resolution.travel, 2)}\u00a0% travel`,
          ],
          ['Method', `version ${result.methodVersion}, run ${assessment.runNumber}`],
          ['Assessed', <Instant at={assessment.assessedAt} />],
        ]}
      />
      <div>
        <Box sx={{ fontWeight: 500 }}>Left out</Box>
        {leftOut.length === 0 ? (
          <Box sx={{ color: 'text.secondary' }}>Nothing.</Box>
        ) : (
          <Facts facts={leftOut.map(([reason, count]) => [leftOutInWords(reason), number(count)])} />
        )}
        {result.warnings.length > 0 && (
          <>
            <Box sx={{ fontWeight: 500, mt: 1.5 }}>To know</Box>
            <Box component="ul" sx={{ m: 0, pl: 2.25 }}>
              {result.warnings.map((warning) => (
                <li key={warning}>{warning}</li>
              ))}
            </Box>
          </>
        )}
      </div>
    </Box>
  );
}
