import { Box } from '@mui/material';
import { type StoredAssessment } from '@tailrace/shared/contracts/assessments';
import { type LivingFinding } from '@tailrace/shared/contracts/findings';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { CharacteristicChart } from '../../charts/CharacteristicChart';
import { DriftChart } from '../../charts/DriftChart';
import { useMe } from '../../lib/session-query';
import { Section } from '../../ui/Section';
import { AttentionTerms } from './AttentionTerms';
import { CannotJudge } from './CannotJudge';
import { FindingEvidence } from './FindingEvidence';
import { Found } from './Found';
import { HowObtained } from './HowObtained';
import { MovementSection } from './MovementSection';
import { ServiceFigures } from './ServiceFigures';
import { SignalsTable } from './SignalsTable';
import { Specified } from './Specified';
import { TravelSection } from './TravelSection';

interface AssessedSheetProps {
  valve: Valve;
  assessment: StoredAssessment;
  /** the valve's findings as they live on; empty for an older assessment */
  living: readonly LivingFinding[];
}

/** A valve with an assessment: left what was specified, right what was found, between them the characteristic. */
export function AssessedSheet({ valve, assessment, living }: AssessedSheetProps) {
  const { result } = assessment;
  const { tag } = valve;
  const { zone } = useMe().site;
  const { characteristic, deviation, movement, drift, passing, service } = result;
  return (
    <>
      <Box
        sx={{
          display: 'grid',
          columnGap: 4,
          gridTemplateColumns: {
            md: '1fr 1fr',
            lg: 'minmax(15rem, 1fr) minmax(0, 2.4fr) minmax(17rem, 1.15fr)',
          },
          gridTemplateAreas: {
            xs: '"found" "chart" "specified"',
            md: '"chart chart" "specified found"',
            lg: '"specified chart found"',
          },
        }}
      >
        <Box sx={{ gridArea: 'specified' }}>
          <Section title="As specified">
            <Specified valve={valve} />
          </Section>
        </Box>
        <Box sx={{ gridArea: 'chart', minWidth: 0, pt: { xs: 2, lg: 3.5 } }}>
          {characteristic ? (
            <CharacteristicChart
              tag={tag}
              characteristic={characteristic}
              range={result.range}
              deviation={deviation}
            />
          ) : (
            <NoCharacteristic result={result} />
          )}
        </Box>
        <Box sx={{ gridArea: 'found' }}>
          <Section title="As found">
            <Found found={result} />
          </Section>
        </Box>
      </Box>

      {result.findings.length > 0 && (
        <Section title="Findings" note="each with its evidence, its limits and what could make it false">
          {result.findings.map((finding) => (
            <FindingEvidence
              key={finding.kind}
              finding={finding}
              living={living.find(({ kind }) => kind === finding.kind)}
            />
          ))}
          {result.attention !== null && (
            <AttentionTerms
              attention={result.attention}
              terms={result.attentionTerms}
              criticality={valve.dataSheet.criticality}
            />
          )}
        </Section>
      )}
      <TravelSection tag={tag} result={result} />
      {movement && (
        <MovementSection tag={tag} movement={movement} pressureDrop={result.pressureDrop} zone={zone} />
      )}
      {drift && (
        <Section title="Drift">
          <DriftChart tag={tag} drift={drift} zone={zone} />
          {'reason' in drift.trend && (
            <Box sx={{ color: 'text.secondary' }}>{`Trend not judged: ${drift.trend.reason}`}</Box>
          )}
        </Section>
      )}
      {(service ?? passing) && (
        <Section title="Service and shut-off">
          <Box sx={{ maxWidth: 620 }}>
            <ServiceFigures
              passing={passing}
              service={service}
              unit={characteristic?.unit ?? valve.dataSheet.coefficientUnit}
            />
          </Box>
        </Section>
      )}
      {result.notJudged.length > 0 && (
        <Section title="Cannot judge" note="and what data would let it">
          <CannotJudge notJudged={result.notJudged} />
        </Section>
      )}
      <Section title="How it was obtained">
        <HowObtained assessment={assessment} />
      </Section>
      <Section title="Signals">
        <SignalsTable signals={valve.signals} />
      </Section>
    </>
  );
}

function NoCharacteristic({ result }: { result: StoredAssessment['result'] }) {
  const reason =
    result.notJudged.find(({ kind }) => kind === 'characteristic')?.reason ??
    result.reason ??
    'This history does not show one.';
  return (
    <Box sx={{ pl: 2, borderLeft: '3px solid var(--tr-line)' }}>
      <Box sx={{ fontWeight: 700 }}>No effective characteristic</Box>
      <Box sx={{ color: 'text.secondary' }}>{reason}</Box>
    </Box>
  );
}
