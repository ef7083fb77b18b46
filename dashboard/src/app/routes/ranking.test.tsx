import { screen, waitFor, within } from '@testing-library/react';
import { shortCaution, tripCaution } from '@tailrace/shared/messages/cautions';
import { http, HttpResponse } from 'msw';
import { expect, test } from 'vitest';
import { openAt } from '../../test-app';
import { aProblem, aRankingPage, aRankingRow, plantServer, steam } from '../../test-plant';
import { aValve, withValve } from '../../test-valve';

/** A ranking that remembers what it was asked. */
function rankingOf(...rows: ReturnType<typeof aRankingRow>[]) {
  const asked: URLSearchParams[] = [];
  plantServer.use(
    http.get('/api/ranking', ({ request }) => {
      asked.push(new URL(request.url).searchParams);
      return HttpResponse.json({ ...aRankingPage(rows), total: 120 });
    }),
  );
  return asked;
}

test('one sentence says how the plant stands, and each row what is wrong with its figure', async () => {
  rankingOf(aRankingRow());
  openAt('/');
  expect(await screen.findByText(/1 valve in your areas, all judged/)).toHaveTextContent(
    'since 1 Oct 2026; 1 needs attention. Run 12 finished 30 Nov 2026, 03:10.',
  );
  const row = screen.getByRole('row', { name: /FV-2101/ });
  expect(row).toHaveTextContent('Undersized: 31 % of the time above 90 % travel · needs work · no. 7');
  expect(within(row).getByRole('img', { name: /severity 0.9 of 1: needs work/ })).toBeInTheDocument();
  expect(screen.getByRole('note')).toHaveTextContent(shortCaution);
});

test('a filter is asked of the service and stands in the address; the page starts over', async () => {
  const asked = rankingOf(aRankingRow());
  const { user, where } = openAt('/?page=2');
  await user.click(await screen.findByLabelText('Area'));
  await user.click(screen.getByRole('option', { name: steam.name }));
  await waitFor(() => expect(where()).toBe(`/?area=${steam.id}`));
  await waitFor(() => expect(asked.at(-1)?.get('area')).toBe(steam.id));
  expect(asked.map((query) => query.get('page'))).toEqual(['1', '0']);
});

test('typing waits until it rests, then asks once', async () => {
  const asked = rankingOf(aRankingRow());
  const { user, where } = openAt('/');
  await user.type(await screen.findByLabelText('Tag or service'), 'feed');
  await waitFor(() => expect(where()).toBe('/?q=feed'));
  expect(asked.map((query) => query.get('q'))).toEqual([null, 'feed']);
});

test('a view opened by its address shows itself in the filters and asks for the same', async () => {
  const asked = rankingOf(aRankingRow());
  openAt('/?kind=Sticking&list=not+judged&q=drum');
  expect(await screen.findByLabelText('Tag or service')).toHaveValue('drum');
  expect(screen.getByLabelText('Finding')).toHaveTextContent('Sticking');
  expect(screen.getByRole('button', { name: /Cannot judge/ })).toHaveAttribute('aria-pressed', 'true');
  expect(asked[0]?.toString()).toContain('kind=Sticking');
});

test('the next page is asked of the service', async () => {
  const asked = rankingOf(aRankingRow());
  const { user, where } = openAt('/');
  expect(await screen.findByText('1 to 50 of 120 valves')).toBeInTheDocument();
  await user.click(screen.getByRole('button', { name: 'Further' }));
  await waitFor(() => expect(where()).toBe('/?page=2'));
  await waitFor(() => expect(asked.at(-1)?.get('page')).toBe('1'));
});

test('j and k move from row to row, and Enter opens the valve', async () => {
  rankingOf(aRankingRow(), aRankingRow({ tag: 'FV-2102', rank: 2 }));
  withValve(aValve(), []);
  const { user, where } = openAt('/');
  await screen.findByRole('link', { name: 'FV-2101' });
  await user.keyboard('jj');
  expect(screen.getByRole('link', { name: 'FV-2102' })).toHaveFocus();
  await user.keyboard('k');
  expect(screen.getByRole('link', { name: 'FV-2101' })).toHaveFocus();
  await user.keyboard('{Enter}');
  await waitFor(() => expect(where()).toBe('/valves/FV-2101'));
});

test('letters typed into a field do not move among the rows', async () => {
  rankingOf(aRankingRow());
  const { user } = openAt('/');
  const field = await screen.findByLabelText('Tag or service');
  await user.type(field, 'jk');
  expect(field).toHaveFocus();
  expect(field).toHaveValue('jk');
});

test('a trip valve is marked, and a valve that cannot be judged says why', async () => {
  rankingOf(
    aRankingRow({ trip: true, attention: null, rank: null, findings: [] }),
    aRankingRow({
      tag: 'FV-9',
      findings: [],
      reason: 'No flow is recorded for this valve.',
      attention: null,
    }),
  );
  openAt('/');
  expect(await screen.findByRole('row', { name: /FV-2101/ })).toHaveTextContent(/trip/i);
  expect(screen.getByRole('row', { name: /FV-9/ })).toHaveTextContent(
    'Cannot judge: No flow is recorded for this valve.',
  );
});

test('an empty ranking says how valves get there', async () => {
  plantServer.use(http.get('/api/ranking', () => HttpResponse.json(aRankingPage([]))));
  openAt('/');
  expect(await screen.findByText('Nothing is ranked yet')).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Bring in a trend file' })).toHaveAttribute('href', '/trends/new');
});

test('filters that fit nothing are not mistaken for an empty plant', async () => {
  plantServer.use(http.get('/api/ranking', () => HttpResponse.json(aRankingPage([]))));
  openAt('/?q=nowhere');
  expect(await screen.findByText('Nothing fits what you asked for')).toBeInTheDocument();
});

test('a fault of the service is a sentence with a way on, which works', async () => {
  let broken = true;
  plantServer.use(
    http.get('/api/ranking', () =>
      broken
        ? aProblem('not-ready', 'Try again in a moment.')
        : HttpResponse.json(aRankingPage([aRankingRow()])),
    ),
  );
  const { user } = openAt('/');
  expect(await screen.findByRole('alert', {}, { timeout: 5000 })).toHaveTextContent('Try again in a moment.');
  broken = false;
  await user.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByRole('link', { name: 'FV-2101' })).toBeInTheDocument();
});

test('a role that may not read the ranking is told so, without a button that would not help', async () => {
  plantServer.use(http.get('/api/ranking', () => aProblem('not-allowed', 'Ask a site administrator.')));
  openAt('/');
  expect(await screen.findByRole('alert')).toHaveTextContent('Your role does not allow this');
  expect(screen.queryByRole('button', { name: 'Try again' })).not.toBeInTheDocument();
});

test('the list of trip valves carries their own caution', async () => {
  rankingOf(aRankingRow({ trip: true, attention: null, rank: null }));
  openAt('/?list=trip');
  expect(await screen.findByRole('note')).toHaveTextContent(tripCaution);
});
