import { http, HttpResponse } from 'msw';
import { expect, test, vi } from 'vitest';
import { aProblem, aSession, plantServer } from '../test-plant';
import { api } from './api-client';
import { ProblemError } from './problem-error';
import { accessToken, keepSession, onSessionEnd, refreshSession } from './session';

/** A service whose access tokens run out: only the newest one is good. */
function countingService() {
  const asked = { refreshes: 0, valves: 0 };
  plantServer.use(
    http.post('/api/session/refresh', () => {
      asked.refreshes += 1;
      return HttpResponse.json({ ...aSession(), accessToken: `token-${asked.refreshes}` });
    }),
    http.get('/api/valves/:tag', ({ request, params }) => {
      asked.valves += 1;
      const good = request.headers.get('Authorization') === `Bearer token-${asked.refreshes}`;
      return good && asked.refreshes > 0
        ? HttpResponse.json({ tag: params.tag })
        : aProblem('not-signed-in', 'Sign in and try again.');
    }),
  );
  return asked;
}

test('requests that meet an ended token together share one refresh, and each is sent again', async () => {
  const asked = countingService();
  keepSession({ ...aSession(), accessToken: 'run-out' });
  const answers = await Promise.all(['FV-1', 'FV-2', 'FV-3'].map((tag) => api.get(`/valves/${tag}`)));
  expect(answers).toEqual([{ tag: 'FV-1' }, { tag: 'FV-2' }, { tag: 'FV-3' }]);
  expect(asked).toEqual({ refreshes: 1, valves: 6 });
});

test('after a reload the first request gets a token for the cookie before it is sent', async () => {
  const asked = countingService();
  await api.get('/valves/FV-1');
  expect(asked).toEqual({ refreshes: 1, valves: 1 });
});

test('a session that ended while it was open is told once, and the request fails in words', async () => {
  const ended = vi.fn();
  onSessionEnd(ended);
  plantServer.use(
    http.post('/api/session/refresh', () => aProblem('session-ended', 'Sign in again.')),
    http.get('/api/valves/:tag', () => aProblem('not-signed-in', 'Sign in and try again.')),
  );
  keepSession(aSession());
  const both = await Promise.allSettled([api.get('/valves/FV-1'), api.get('/valves/FV-2')]);
  expect(both.map((one) => one.status)).toEqual(['rejected', 'rejected']);
  expect(ended).toHaveBeenCalledTimes(1);
  expect(accessToken()).toBeNull();
});

test('somebody who never signed in is not told that a session ended', async () => {
  const ended = vi.fn();
  onSessionEnd(ended);
  plantServer.use(http.post('/api/session/refresh', () => aProblem('session-ended', 'Sign in again.')));
  expect(await refreshSession()).toBeNull();
  expect(ended).not.toHaveBeenCalled();
});

test('a service that cannot be reached does not end the session', async () => {
  plantServer.use(http.post('/api/session/refresh', () => HttpResponse.error()));
  keepSession(aSession());
  await expect(refreshSession()).rejects.toThrow('cannot be reached');
  expect(accessToken()).toBe('a-token');
});

test('a no of the API keeps its kind, its words and its fields', async () => {
  plantServer.use(
    http.post('/api/runs', () =>
      aProblem('invalid-input', 'Look at the fields.', [{ pointer: '/tags/0', detail: 'Give the tag.' }]),
    ),
  );
  const refusal: unknown = await api.post('/runs', {}).catch((error: unknown) => error);
  expect(refusal).toBeInstanceOf(ProblemError);
  expect(refusal).toMatchObject({
    kind: 'invalid-input',
    status: 400,
    errors: [{ pointer: '/tags/0', detail: 'Give the tag.' }],
  });
});

test('an answer that is not the service’s own becomes a sentence all the same', async () => {
  plantServer.use(http.get('/api/runs', () => new HttpResponse('<h1>502 Bad Gateway</h1>', { status: 502 })));
  await expect(api.get('/runs')).rejects.toThrow('The service did not answer as it should');
});
