import { screen, within } from '@testing-library/react';
import { type AnalysisRun, type RunDetail, type RunDraft } from '@tailrace/shared/contracts/runs';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it } from 'vitest';
import { openAt } from '../../test-app';
import { aMe, aSession, plantServer } from '../../test-plant';

const id = '9c0f6c1e-2f0c-4d7e-9a55-0d6f3a1c0009';

function aRun(of: Partial<AnalysisRun> = {}): AnalysisRun {
  return {
    id,
    number: 12,
    state: 'done',
    trigger: 'person',
    requestedBy: 'Ida Brunner',
    createdAt: '2026-12-01T08:00:00.000Z',
    startedAt: '2026-12-01T08:00:01.000Z',
    finishedAt: '2026-12-01T08:00:09.000Z',
    valves: 3,
    judged: 1,
    notJudged: 1,
    failed: 1,
    ...of,
  };
}

const detail: RunDetail = {
  ...aRun({ state: 'done with failures' }),
  outcomes: [
    { tag: 'FV-2101', outcome: 'judged', reason: null, findings: 2, took: 420 },
    { tag: 'FV-2102', outcome: 'not judged', reason: 'No flow is bound.', findings: 0, took: 3 },
    { tag: 'FV-2103', outcome: 'failed', reason: 'The worker stopped.', findings: 0, took: null },
  ],
};

const signedInAs = (role: 'operator' | 'engineer') =>
  plantServer.use(http.post('/api/session/refresh', () => HttpResponse.json(aSession(aMe({ role })))));

describe('analysis runs', () => {
  beforeEach(() => {
    const schedule = { at: '02:00', zone: 'Europe/Zurich', next: '2026-12-02T01:00:00.000Z' };
    plantServer.use(
      http.get('/api/runs', () => HttpResponse.json({ rows: [aRun()], total: 1, schedule })),
      http.get(`/api/runs/${id}`, () => HttpResponse.json(detail)),
    );
  });

  it('tells the schedule in words, in the site’s zone', async () => {
    openAt('/runs');
    expect(
      await screen.findByText(/Every night at 02:00 \(Europe\/Zurich\).*2 Dec 2026, 02:00/),
    ).toBeVisible();
  });

  it('an engineer starts one over named valves and is led to it', async () => {
    let asked: RunDraft | null = null;
    plantServer.use(
      http.post('/api/runs', async ({ request }) => {
        asked = (await request.json()) as RunDraft;
        return HttpResponse.json(aRun({ state: 'waiting' }), { status: 202 });
      }),
    );
    const { user, where } = openAt('/runs');
    await user.click(await screen.findByRole('button', { name: 'Start a run' }));
    await user.type(await screen.findByLabelText('Valves, by tag'), 'FV-2101 FV-2102');
    await user.click(screen.getByRole('button', { name: 'Start' }));
    expect(await screen.findByRole('heading', { name: 'Run 12' })).toBeVisible();
    expect(where()).toBe(`/runs/${id}`);
    expect(asked).toEqual({ tags: ['FV-2101', 'FV-2102'] });
  });

  it('an operator sees the runs but is offered no start', async () => {
    signedInAs('operator');
    openAt('/runs?start=1');
    expect(await screen.findByRole('link', { name: 'Run 12' })).toBeVisible();
    expect(screen.queryByRole('button', { name: /Start/ })).not.toBeInTheDocument();
  });

  it('shows why a valve was not judged, narrowed down by the address', async () => {
    openAt(`/runs/${id}?outcome=not+judged`);
    const table = await screen.findByRole('table', { name: 'Outcome of each valve' });
    expect(within(table).getByText('No flow is bound.')).toBeVisible();
    expect(within(table).queryByText('FV-2101')).not.toBeInTheDocument();
  });

  it('follows a run that goes on until it is done, and can stop it', async () => {
    let stopped = false;
    plantServer.use(
      http.get(`/api/runs/${id}`, () =>
        HttpResponse.json({ ...detail, state: stopped ? 'stopped' : 'running', judged: 0 }),
      ),
      http.post(`/api/runs/${id}/stop`, () => {
        stopped = true;
        return HttpResponse.json({ ...detail, state: 'stopped' });
      }),
    );
    const { user } = openAt(`/runs/${id}`);
    expect(await screen.findByText(/2 of 3 valves finished/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Stop this run' }));
    expect(await screen.findByText('stopped')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Stop this run' })).not.toBeInTheDocument();
  });
});
