import { screen, within } from '@testing-library/react';
import { type TakeInDraft, type TrendFile, type TrendLook } from '@tailrace/shared/contracts/trends';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { openAt } from '../../test-app';
import { aMe, aProblem, aSession, plantServer, water } from '../../test-plant';

const id = '5d0f6c1e-2f0c-4d7e-9a55-0d6f3a1c0007';
const valveId = '7a1f6c1e-2f0c-4d7e-9a55-0d6f3a1c0001';

const look: TrendLook = {
  plan: {
    form: 'wide',
    delimiter: ';',
    decimalMark: ',',
    headerLine: 1,
    time: { column: 'Zeit', format: 'day first', zone: 'Europe/Zurich' },
    long: null,
    uncertainIsGood: false,
  },
  header: ['Zeit', 'FV-2101.OP [%]', 'XX.9'],
  rows: [['30.11.2026 14:00', '63,5', '1']],
  times: [{ instant: '2026-11-30T13:00:00.000Z', problem: null }],
  tags: [
    {
      historianTag: 'FV-2101.OP',
      unit: '%',
      examples: ['63,5'],
      bound: [],
      proposal: { valveId, valveTag: 'FV-2101', role: 'demand' },
    },
    { historianTag: 'XX.9', unit: null, examples: ['1'], bound: [], proposal: null },
  ],
  doubts: ['The times name no zone; they are read as local time in Europe/Zurich.'],
};

function aTrendFile(of: Partial<TrendFile> = {}): TrendFile {
  return {
    id,
    number: 5,
    name: 'november.csv',
    size: 1200,
    sha256: 'ab'.repeat(32),
    area: water,
    receivedBy: 'Ida Brunner',
    receivedAt: '2026-12-01T08:00:00.000Z',
    state: 'received',
    progress: { share: 0, rows: 0 },
    plan: null,
    report: null,
    refusal: null,
    ...of,
  };
}

const taken = aTrendFile({
  state: 'taken with rejects',
  plan: look.plan,
  report: {
    rows: 3000,
    samples: 2998,
    badSamples: 3,
    tags: [
      {
        historianTag: 'FV-2101.OP',
        taken: 2998,
        bad: 3,
        from: '2026-11-15T00:00:00.000Z',
        to: '2026-11-21T05:00:00.000Z',
      },
    ],
    leftInFile: ['XX.9'],
    rejects: [{ reason: 'time not understood', count: 2, firstLines: [22, 41], example: 'soon' }],
  },
});

const csv = () => new File(['Zeit;FV-2101.OP [%]\n'], 'november.csv', { type: 'text/csv' });

const oneArea = () => {
  const me = aMe({ allAreas: false, areas: [water] });
  plantServer.use(http.post('/api/session/refresh', () => HttpResponse.json(aSession(me))));
};

describe('bringing a trend file in', () => {
  it('leads from the file over look, plan and signals to what was taken and rejected', async () => {
    oneArea();
    let sent: TakeInDraft | null = null;
    plantServer.use(
      http.post('/api/trends', () => HttpResponse.json(aTrendFile(), { status: 201 })),
      http.post(`/api/trends/${id}/look`, () => HttpResponse.json(look)),
      http.post(`/api/trends/${id}/take-in`, async ({ request }) => {
        sent = (await request.json()) as TakeInDraft;
        return HttpResponse.json(taken, { status: 202 });
      }),
      http.get(`/api/trends/${id}`, () => HttpResponse.json(taken)),
    );
    const { user, where } = openAt('/trends/new');

    await user.upload(await screen.findByLabelText('Trend file'), csv());
    expect(await screen.findByText('30 Nov 2026, 14:00:00')).toBeVisible();
    expect(screen.getByText(look.doubts[0] ?? '')).toBeVisible();
    expect(where()).toContain('step=look');

    await user.click(screen.getByRole('button', { name: 'Go on to plan and signals' }));
    expect(await screen.findByLabelText('Valve of FV-2101.OP')).toHaveValue('FV-2101');
    await user.click(screen.getByRole('button', { name: 'Go on to take in' }));
    expect(await screen.findByText(/1 of 2 tags will be taken/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Take it in' }));

    const rejects = await screen.findByRole('table', { name: 'Rejects by reason' });
    expect(within(rejects).getByText('22, 41')).toBeVisible();
    expect(screen.getByText(/3000 rows read, 2998 samples taken/)).toBeVisible();
    expect(where()).toBe(`/trends/${id}`);
    expect(sent).toEqual({
      plan: look.plan,
      bind: [{ historianTag: 'FV-2101.OP', valveId, role: 'demand', unit: '%', reversed: false }],
    });
  });

  it('tells a refusal in the service’s words and lets another file be chosen', async () => {
    oneArea();
    plantServer.use(http.post('/api/trends', () => aProblem('too-large', 'At most 4 GB go at once.')));
    const { user } = openAt('/trends/new');
    await user.upload(await screen.findByLabelText('Trend file'), csv());
    expect(await screen.findByRole('alert')).toHaveTextContent('At most 4 GB go at once.');
    expect(screen.getByLabelText('Trend file')).toBeEnabled();
  });

  it('leads to the file that is there when the same bytes come again', async () => {
    oneArea();
    plantServer.use(
      http.post('/api/trends', () => HttpResponse.json(taken)),
      http.get(`/api/trends/${id}`, () => HttpResponse.json(taken)),
    );
    const { user } = openAt('/trends/new');
    await user.upload(await screen.findByLabelText('Trend file'), csv());
    expect(await screen.findByText('This file was here already')).toBeVisible();
  });

  it('asks for the area first where a person has several', async () => {
    openAt('/trends/new');
    expect(await screen.findByText('First say which area it is about.')).toBeVisible();
    expect(screen.getByLabelText('Trend file')).toBeDisabled();
  });

  it('is not offered to a manager, neither in the list nor by its address', async () => {
    const me = aMe({ role: 'manager' });
    plantServer.use(
      http.post('/api/session/refresh', () => HttpResponse.json(aSession(me))),
      http.get('/api/trends', () => HttpResponse.json({ rows: [taken], total: 1 })),
    );
    openAt('/trends/new');
    expect(await screen.findByText('Your role does not allow this')).toBeVisible();
    expect(screen.queryByLabelText('Trend file')).not.toBeInTheDocument();
  });

  it('shows how far a file is read until it is done', async () => {
    const reading = aTrendFile({ state: 'reading', progress: { share: 0.42, rows: 1260 } });
    let asked = 0;
    plantServer.use(http.get(`/api/trends/${id}`, () => HttpResponse.json(asked++ === 0 ? reading : taken)));
    openAt(`/trends/${id}`);
    expect(await screen.findByText(/42\s% read, 1260 rows so far/)).toBeVisible();
    expect(await screen.findByText(/3000 rows read/, undefined, { timeout: 5_000 })).toBeVisible();
  });
});
