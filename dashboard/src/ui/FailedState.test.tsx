import { render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { ProblemError } from '../lib/problem-error';
import { FailedState } from './FailedState';

const show = (of: Partial<ConstructorParameters<typeof ProblemError>[0]>) =>
  render(
    <MemoryRouter>
      <FailedState
        error={
          new ProblemError({
            type: '/problems/invalid-input',
            title: 'Something in the request is not right',
            status: 400,
            detail: 'Look at the fields named and send again.',
            instance: 'request-7',
            ...of,
          })
        }
      />
    </MemoryRouter>,
  );

test('every field a problem names is said, so that it can be mended', () => {
  show({ errors: [{ pointer: '/tags/0', detail: 'There is no valve FV-0.' }] });
  expect(screen.getByRole('alert')).toHaveTextContent('There is no valve FV-0.');
});

test('a fault of the service gives its number in the log, a refusal does not', () => {
  show({ type: '/problems/unexpected', status: 500, title: 'Something went wrong here' });
  expect(screen.getByRole('alert')).toHaveTextContent('Number in the log: request-7.');
  show({ title: 'Another' });
  expect(screen.getAllByRole('alert')[1]).not.toHaveTextContent('request-7');
});
