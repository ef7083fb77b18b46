import { Button } from '@mui/material';
import { useQuery } from '@tanstack/react-query';
import { screenWords } from '@tailrace/shared/messages/screens';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../ui/EmptyState';
import { Fetched } from '../../ui/Fetched';
import { SafetyCaution } from '../../ui/SafetyCaution';
import { Section } from '../../ui/Section';
import { assessmentQuery, assessmentsQuery, findingsOfValveQuery, valveQuery } from './api';
import { AssessedSheet } from './AssessedSheet';
import { AssessmentChoice } from './AssessmentChoice';
import { SignalsTable } from './SignalsTable';
import { Specified } from './Specified';
import { ValveHead } from './ValveHead';

interface ValveSheetProps {
  tag: string;
  /** a stored assessment; the newest where left out */
  chosen: string | undefined;
  onChoose: (assessment: string | undefined) => void;
}

/** One valve's sheet. */
export function ValveSheet({ tag, chosen, onChoose }: ValveSheetProps) {
  const valve = useQuery(valveQuery(tag));
  const assessments = useQuery(assessmentsQuery(tag));
  const assessed = (assessments.data?.rows.length ?? 0) > 0;
  const assessment = useQuery({ ...assessmentQuery(tag, chosen), enabled: assessed });
  const findings = useQuery({ ...findingsOfValveQuery(tag), enabled: assessed && !chosen });
  return (
    <Fetched query={valve} what={tag} lines={8}>
      {(found) => (
        <>
          <ValveHead
            valve={found}
            assessment={assessment.data}
            actions={
              assessed && (
                <AssessmentChoice
                  assessments={assessments.data?.rows ?? []}
                  chosen={chosen}
                  onChoose={onChoose}
                />
              )
            }
          />
          <Fetched query={assessments} what="its assessments">
            {({ rows }) =>
              rows.length === 0 ? (
                <NeverAssessed valve={found} />
              ) : (
                <Fetched query={assessment} what="the assessment" lines={10}>
                  {(stored) => (
                    <AssessedSheet
                      valve={found}
                      assessment={stored}
                      living={chosen ? [] : (findings.data?.rows ?? [])}
                    />
                  )}
                </Fetched>
              )
            }
          </Fetched>
          <SafetyCaution trip={found.dataSheet.trip} />
        </>
      )}
    </Fetched>
  );
}

/** What is known of a valve before its first assessment. */
function NeverAssessed({ valve }: { valve: Valve }) {
  return (
    <>
      <EmptyState
        title={screenWords.neverAssessed.title}
        actions={
          <Button component={Link} to="/trends/new" variant="outlined">
            Bring in a trend file
          </Button>
        }
      >
        {screenWords.neverAssessed.detail}
      </EmptyState>
      <Section title="As specified">
        <div style={{ maxWidth: 480 }}>
          <Specified valve={valve} />
        </div>
      </Section>
      <Section title="Signals">
        <SignalsTable signals={valve.signals} />
      </Section>
    </>
  );
}
