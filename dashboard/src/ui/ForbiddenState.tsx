import { problemKinds } from '@tailrace/shared/contracts/problems';
import { problemSentence } from '@tailrace/shared/messages/problems';
import { StateOfPage } from './StateOfPage';

/** The person's role does not allow this. */
export function ForbiddenState() {
  return (
    <StateOfPage alert title={problemKinds['not-allowed'].title}>
      {problemSentence('not-allowed')}
    </StateOfPage>
  );
}
