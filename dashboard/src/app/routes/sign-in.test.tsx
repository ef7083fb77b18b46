import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, expect, test } from 'vitest';
import { addressAfterSignIn } from '../require-me';
import { openAt } from '../../test-app';
import { aProblem, aRankingPage, aSession, plantServer } from '../../test-plant';

beforeEach(() =>
  plantServer.use(
    http.post('/api/session/refresh', () => aProblem('session-ended', 'Sign in again.')),
    http.get('/api/ranking', () => HttpResponse.json(aRankingPage([]))),
  ),
);

async function fillIn(user: ReturnType<typeof openAt>['user'], password: string) {
  await user.type(await screen.findByLabelText('E-mail'), 'ida@plant.example');
  await user.type(screen.getByLabelText('Password'), password);
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
}

test('who is not signed in comes to the sign-in, and afterwards back to where they wanted to be', async () => {
  plantServer.use(http.post('/api/session', () => HttpResponse.json(aSession())));
  const { user, where } = openAt('/?kind=Sticking');
  await waitFor(() => expect(where()).toBe('/sign-in?from=%2F%3Fkind%3DSticking'));
  await fillIn(user, 'secret');
  await waitFor(() => expect(where()).toBe('/?kind=Sticking'));
  expect(await screen.findByText('Aare works')).toBeInTheDocument();
});

test('a wrong password is said in words beside the form, and what was typed as e-mail stays', async () => {
  plantServer.use(http.post('/api/session', () => aProblem('sign-in-failed', 'Check both and try again.')));
  const { user, where } = openAt('/sign-in');
  await fillIn(user, 'wrong');
  expect(await screen.findByRole('alert')).toHaveTextContent(
    'E-mail or password is wrong. Check both and try again.',
  );
  expect(screen.getByLabelText('E-mail')).toHaveValue('ida@plant.example');
  expect(where()).toBe('/sign-in');
});

test('what is not an e-mail address is refused before anything is sent', async () => {
  const { user } = openAt('/sign-in');
  await user.type(await screen.findByLabelText('E-mail'), 'ida');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
  expect(await screen.findByText('Give your e-mail address.')).toBeInTheDocument();
  expect(screen.getByText('Give your password.')).toBeInTheDocument();
});

test('a session that ends while a page is open leads to the sign-in and remembers the page', async () => {
  plantServer.use(
    http.post('/api/session/refresh', () => HttpResponse.json(aSession()), { once: true }),
    http.get('/api/trends', () => aProblem('not-signed-in', 'Sign in and try again.')),
  );
  const { where } = openAt('/trends?state=refused');
  await waitFor(() => expect(where()).toBe('/sign-in?from=%2Ftrends%3Fstate%3Drefused'));
});

test('signing out forgets the person', async () => {
  let ended = false;
  plantServer.use(
    http.post('/api/session/refresh', () => HttpResponse.json(aSession()), { once: true }),
    http.delete('/api/session', () => {
      ended = true;
      return new HttpResponse(null, { status: 204 });
    }),
  );
  const { user, where } = openAt('/');
  await user.click(await screen.findByRole('button', { name: 'Ida Brunner' }));
  await user.click(screen.getByRole('menuitem', { name: 'Sign out' }));
  await waitFor(() => expect(where()).toBe('/sign-in'));
  expect(ended).toBe(true);
  expect(await screen.findByLabelText('E-mail')).toBeInTheDocument();
});

test.each([
  ['/valves/FV-1?assessment=2', '/valves/FV-1?assessment=2'],
  ['https://elsewhere.example', '/'],
  ['//elsewhere.example', '/'],
  ['/\\elsewhere.example', '/'],
  ['/sign-in?from=/', '/'],
  [null, '/'],
])('after the sign-in %s leads to %s', (from, to) => {
  expect(addressAfterSignIn(from)).toBe(to);
});
