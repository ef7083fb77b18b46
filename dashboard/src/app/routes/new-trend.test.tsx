import { screen, waitFor } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { expect, test } from 'vitest';
import { openAt } from '../../test-app';
import { plantServer } from '../../test-plant';
import { aLook, aTrendFile, aTrendFileId } from '../../test-trends';

/** A service that takes files, and remembers what it was asked. */
function takingService() {
  const asked = { files: 0, looks: [] as unknown[], takeIns: [] as unknown[] };
  plantServer.use(
    http.post('/api/trends', () => {
      asked.files += 1;
      return HttpResponse.json(aTrendFile(), { status: 201 });
    }),
    http.post(`/api/trends/${aTrendFileId}/look`, async ({ request }) => {
      const { plan } = (await request.json()) as { plan: ReturnType<typeof aLook>['plan'] | null };
      asked.looks.push(plan);
      return HttpResponse.json(aLook(plan ? { plan } : {}));
    }),
    http.post(`/api/trends/${aTrendFileId}/take-in`, async ({ request }) => {
      asked.takeIns.push(await request.json());
      return HttpResponse.json(aTrendFile({ state: 'reading', progress: { share: 0.42, rows: 9_000 } }));
    }),
    http.get(`/api/trends/${aTrendFileId}`, () =>
      HttpResponse.json(aTrendFile({ state: 'reading', progress: { share: 0.42, rows: 9_000 } })),
    ),
  );
  return asked;
}

test('a reload in the middle finds the file again, without sending it anew', async () => {
  const asked = takingService();
  openAt(`/trends/new?file=${aTrendFileId}&step=plan`);
  expect(await screen.findByRole('button', { name: 'Go on to take in' })).toBeInTheDocument();
  expect(asked.files).toBe(0);
});

test('a change of the plan is tried on the first rows, and taken in as changed', async () => {
  const asked = takingService();
  const { user } = openAt(`/trends/new?file=${aTrendFileId}&step=plan`);
  await user.click(await screen.findByLabelText('Uncertain samples count as good'));
  await waitFor(() => expect(asked.looks.at(-1)).toMatchObject({ uncertainIsGood: true }));
  await user.click(screen.getByRole('button', { name: 'Go on to take in' }));
  await user.click(await screen.findByRole('button', { name: 'Take it in' }));
  await waitFor(() => expect(asked.takeIns).toMatchObject([{ plan: { uncertainIsGood: true } }]));
});
