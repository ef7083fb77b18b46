import { Link } from 'react-router-dom';
import { PageTitle } from '../../ui/PageTitle';
import { StateOfPage } from '../../ui/StateOfPage';

export function Component() {
  return (
    <>
      <PageTitle>No such page</PageTitle>
      <StateOfPage title="Nothing stands at this address" actions={<Link to="/">To the ranking</Link>}>
        Check it for a slip, or find the valve by its tag above.
      </StateOfPage>
    </>
  );
}
