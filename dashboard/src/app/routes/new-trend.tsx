import { useNavigate } from 'react-router-dom';
import { ChooseFile } from '../../features/trends/ChooseFile';
import { stepOf } from '../../features/trends/step-of';
import { StepWords } from '../../features/trends/StepWords';
import { TakeInSteps } from '../../features/trends/TakeInSteps';
import { useMay, useMe } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';
import { ForbiddenState } from '../../ui/ForbiddenState';
import { PageTitle } from '../../ui/PageTitle';

export function Component() {
  const [{ file, step: wanted }, change] = useUrlState('file', 'step');
  const { areas } = useMe();
  const navigate = useNavigate();
  const step = stepOf(file, wanted);
  if (!useMay('trends:take-in')) return <ForbiddenState />;
  return (
    <>
      <PageTitle>Bring in a trend file</PageTitle>
      <StepWords at={step} />
      {file === undefined || step === 'file' ? (
        <ChooseFile
          areas={areas}
          onSent={({ id, state }) =>
            state === 'received' ? change({ file: id, step: 'look' }) : void navigate(`/trends/${id}?known=1`)
          }
        />
      ) : (
        <TakeInSteps
          key={file}
          id={file}
          step={step}
          onStep={(next) => change({ step: next }, { replace: false })}
          onTaken={() => void navigate(`/trends/${file}`)}
        />
      )}
    </>
  );
}
