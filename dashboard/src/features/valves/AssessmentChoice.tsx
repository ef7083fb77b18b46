import { type AssessmentPage } from '@tailrace/shared/contracts/assessments';
import { siteTime } from '../../lib/dates';
import { useMe } from '../../lib/session-query';
import { Choice } from '../../ui/Choice';

interface AssessmentChoiceProps {
  assessments: AssessmentPage['rows'];
  chosen: string | undefined;
  /** undefined: the newest */
  onChoose: (id: string | undefined) => void;
}

/** Which of the stored assessments is shown; they are frozen and never change. */
export function AssessmentChoice({ assessments, chosen, onChoose }: AssessmentChoiceProps) {
  const { zone } = useMe().site;
  const newest = assessments[0]?.id;
  return (
    <Choice
      label="Assessment"
      value={chosen ?? newest}
      options={assessments.map(({ id, assessedAt, runNumber }) => ({
        value: id,
        word: `${siteTime(assessedAt, zone)}, run ${runNumber}`,
      }))}
      onChoose={(id) => onChoose(id === newest ? undefined : id)}
      width={230}
    />
  );
}
