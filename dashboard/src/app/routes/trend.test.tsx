import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { expect, test } from 'vitest';
import { openAt } from '../../test-app';
import { aMe, aSession, plantServer } from '../../test-plant';
import { aTrendFile, aTrendFileId } from '../../test-trends';

test('a refused file says why and how to mend it, and can be forgotten', async () => {
  let forgotten = false;
  plantServer.use(
    http.get(`/api/trends/${aTrendFileId}`, () =>
      HttpResponse.json(aTrendFile({ state: 'refused', refusal: 'Two columns are named FT-1. Rename one.' })),
    ),
    http.delete(`/api/trends/${aTrendFileId}`, () => {
      forgotten = true;
      return new HttpResponse(null, { status: 204 });
    }),
    http.get('/api/trends', () => HttpResponse.json({ rows: [], total: 0 })),
  );
  const { user, where } = openAt(`/trends/${aTrendFileId}`);
  expect(await screen.findByRole('alert')).toHaveTextContent('Two columns are named FT-1. Rename one.');
  await user.click(screen.getByRole('button', { name: 'Forget this file' }));
  await waitFor(() => expect(where()).toBe('/trends'));
  expect(forgotten).toBe(true);
});

test('who may not take trends in sees the file without anything to press', async () => {
  plantServer.use(
    http.post('/api/session/refresh', () => HttpResponse.json(aSession(aMe({ role: 'manager' })))),
    http.get(`/api/trends/${aTrendFileId}`, () => HttpResponse.json(aTrendFile())),
  );
  openAt(`/trends/${aTrendFileId}`);
  expect(await screen.findByRole('heading', { name: 'week-48.csv' })).toBeInTheDocument();
  expect(screen.queryByRole('link', { name: 'Look and take in' })).not.toBeInTheDocument();
  expect(screen.queryByRole('button', { name: 'Forget this file' })).not.toBeInTheDocument();
});
