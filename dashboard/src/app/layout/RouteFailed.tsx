import { Box, Button } from '@mui/material';
import { isRouteErrorResponse, Link, useRouteError } from 'react-router-dom';
import { FailedState } from '../../ui/FailedState';
import { StateOfPage } from '../../ui/StateOfPage';

/** A screen broke: the rest of Tailrace stays, and there is a way on. */
export function RouteFailed() {
  const error = useRouteError();
  const newerThere = error instanceof TypeError && /import|module/i.test(error.message);
  const reload = () => window.location.reload();
  return (
    <Box sx={{ p: { xs: 2, md: 4 } }}>
      {newerThere ? (
        <StateOfPage
          alert
          title="This screen could not be loaded"
          actions={<Button onClick={reload}>Load the page again</Button>}
        >
          The connection broke off, or Tailrace was renewed meanwhile.
        </StateOfPage>
      ) : isRouteErrorResponse(error) && error.status === 404 ? (
        <StateOfPage title="There is no such page" />
      ) : (
        <FailedState error={error} onRetry={reload} />
      )}
      <Link to="/">To the ranking</Link>
    </Box>
  );
}
