import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { ChooseFile } from '../../features/trends/ChooseFile';
import { stepOf } from '../../features/trends/step-of';
import { StepWords } from '../../features/trends/StepWords';
import { TakeInSteps } from '../../features/trends/TakeInSteps';
import { areasQuery } from '../../features/valves/api';
import { queryClient } from '../../lib/query-client';
import { useMay } from '../../lib/session-query';
import { useUrlState } from '../../lib/useUrlState';
import { Fetched } from '../../ui/Fetched';
import { ForbiddenState } from '../../ui/ForbiddenState';
import { PageTitle } from '../../ui/PageTitle';

export function loader() {
  void queryClient.prefetchQuery(areasQuery);
  return null;
}

export function Component() {
  const [{ file, step: wanted }, change] = useUrlState('file', 'step');
  const areas = useQuery(areasQuery);
  const navigate = useNavigate();
  const step = stepOf(file, wanted);
  if (!useMay('trends:take-in')) return <ForbiddenState />;
  return (
    <>
      <PageTitle>Bring in a trend file</PageTitle>
      <StepWords at={step} />
      {file === undefined || step === 'file' ? (
        <Fetched query={areas} what="your areas">
          {(yours) => (
            <ChooseFile
              areas={yours}
              onSent={({ id, state }) =>
                state === 'received'
                  ? change({ file: id, step: 'look' })
                  : void navigate(`/trends/${id}?known=1`)
              }
            />
          )}
        </Fetched>
      ) : (
        <TakeInSteps
          key={file}
          id={file}
          step={step}
          onStep={(next) => change({ step: next })}
          onTaken={() => void navigate(`/trends/${file}`)}
        />
      )}
    </>
  );
}
