import { Box, Button } from '@mui/material';
import { Link } from 'react-router-dom';
import { ProblemError } from '../lib/problem-error';
import { ForbiddenState } from './ForbiddenState';
import { StateOfPage } from './StateOfPage';

interface FailedStateProps {
  error: unknown;
  onRetry?: () => void;
}

/** Something could not be fetched or done: a sentence and a way on, never a code. */
export function FailedState({ error, onRetry }: FailedStateProps) {
  if (error instanceof ProblemError && error.kind === 'not-allowed') return <ForbiddenState />;
  const problem = error instanceof ProblemError ? error : null;
  if (problem?.kind === 'not-found')
    return (
      <StateOfPage alert title={problem.title} actions={<Link to="/">To the ranking</Link>}>
        {problem.detail}
      </StateOfPage>
    );
  return (
    <StateOfPage
      alert
      title={problem?.title ?? 'This did not work'}
      actions={
        onRetry && (
          <Button variant="outlined" onClick={onRetry}>
            Try again
          </Button>
        )
      }
    >
      {problem?.detail ?? (error instanceof Error ? error.message : 'Load the page again.')}
      {problem && problem.status >= 500 && problem.instance
        ? ` Number in the log: ${problem.instance}.`
        : null}
      {problem && problem.errors.length > 0 && (
        <Box component="ul" sx={{ m: 0, pl: 2.5 }}>
          {problem.errors.map(({ pointer, detail }) => (
            <li key={`${pointer} ${detail}`}>{detail}</li>
          ))}
        </Box>
      )}
    </StateOfPage>
  );
}
