import { screen, waitFor, within } from '@testing-library/react';
import { shortCaution, tripCaution } from '@tailrace/shared/messages/cautions';
import { http } from 'msw';
import { expect, test } from 'vitest';
import { openAt } from '../../test-app';
import { aProblem, plantServer } from '../../test-plant';
import { anAssessment, aValve, withValve } from '../../test-valve';

const section = (name: string) => screen.findByRole('region', { name });

test('specified and found stand on either side of the characteristic, each figure with its unit and interval', async () => {
  withValve(aValve(), [anAssessment()]);
  openAt('/valves/FV-2101');
  expect(await section('As specified')).toHaveTextContent(/Rated coefficient126\sKv/);
  const found = await section('As found');
  expect(found).toHaveTextContent(/Rated coefficient104\sKv \(97.0 to 112\)/);
  expect(found).toHaveTextContent('Lost capacity: passes 19 % less than the data sheet');
  expect(screen.getByRole('figure', { name: 'Effective characteristic' })).toBeInTheDocument();
});

test('a finding shows its limits, its evidence, the next step and what could make it false', async () => {
  withValve(aValve(), [anAssessment()]);
  openAt('/valves/FV-2101');
  const findings = await section('Findings');
  expect(findings).toHaveTextContent(/Measured 19\s%; raised from 10\s%, act now at 30\s%/);
  expect(findings).toHaveTextContent('Confidence 0.90 of 1');
  expect(findings).toHaveTextContent('Check strainer, fouling and the flow meter');
  expect(within(findings).getByText('Flow meter or density in error.')).toBeInTheDocument();
  expect(findings).toHaveTextContent('Lost capacity 0.85 × 0.70 × 0.90 = 0.54');
});

test('the sheet says how its figures were obtained, and what was left out', async () => {
  withValve(aValve(), [anAssessment()]);
  openAt('/valves/FV-2101');
  const how = await section('How it was obtained');
  expect(how).toHaveTextContent(/80\s123 of 86\s400/);
  expect(how).toHaveTextContent('inherent, pressure drop measured');
  expect(how).toHaveTextContent('windows not steady412');
  expect(how).not.toHaveTextContent('marked bad');
});

test('what cannot be judged is listed with what would let it', async () => {
  withValve(aValve(), [anAssessment()]);
  openAt('/valves/FV-2101');
  expect(await section('Cannot judge')).toHaveTextContent('StickingSampled too slowly (every 60 s).');
});

test('the short caution stands under every sheet, and the trip caution under a trip valve’s', async () => {
  withValve(aValve({ dataSheet: { trip: true } }), [
    anAssessment({ attention: null, attentionTerms: [], findings: [] }),
  ]);
  openAt('/valves/FV-2101');
  const note = await screen.findByRole('note');
  expect(note).toHaveTextContent(tripCaution);
  expect(note).toHaveTextContent(shortCaution);
  expect(screen.queryByText(/of 100/)).not.toBeInTheDocument();
});

test('no finding is not called healthy', async () => {
  withValve(aValve(), [anAssessment({ findings: [], attention: 0, attentionTerms: [] })]);
  openAt('/valves/FV-2101');
  expect(await section('As found')).toHaveTextContent('That is not evidence of health');
});

test('an older assessment is chosen in the address and shows what was found then', async () => {
  const older = {
    ...anAssessment({ findings: [] }),
    id: '2c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c2000',
    runNumber: 11,
    assessedAt: '2026-10-30T01:10:00.000Z',
  };
  withValve(aValve(), [anAssessment(), older]);
  const { user, where } = openAt('/valves/FV-2101');
  await user.click(await screen.findByLabelText('Assessment'));
  await user.click(screen.getByRole('option', { name: /run 11/ }));
  await waitFor(() => expect(where()).toBe(`/valves/FV-2101?assessment=${older.id}`));
  expect(await screen.findByText('version 1, run 11')).toBeInTheDocument();
  expect(screen.queryByRole('region', { name: 'Findings' })).not.toBeInTheDocument();
});

test('a valve without an assessment shows its data sheet and how to get one', async () => {
  withValve(aValve(), []);
  openAt('/valves/FV-2101');
  expect(await screen.findByText('Not assessed yet')).toBeInTheDocument();
  expect(await section('Signals')).toHaveTextContent('FV-2101.ZT');
});

test('an assessment without a characteristic says why in place of the chart', async () => {
  withValve(aValve(), [
    anAssessment({
      characteristic: null,
      deviation: null,
      notJudged: [{ kind: 'characteristic', reason: 'The valve stood still for the whole record.' }],
    }),
  ]);
  openAt('/valves/FV-2101');
  expect(await screen.findByText('No effective characteristic')).toBeInTheDocument();
  expect(screen.getAllByText('The valve stood still for the whole record.').length).toBeGreaterThan(0);
});

test('a valve of another’s area is not found, and says no more', async () => {
  plantServer.use(
    http.get('/api/valves/FV-9*', () =>
      aProblem('not-found', 'It does not exist, or it lies outside your areas.'),
    ),
    http.get('/api/valves/FV-9/:part', () => aProblem('not-found', 'It does not exist.')),
  );
  openAt('/valves/FV-9');
  expect(await screen.findByRole('alert')).toHaveTextContent(
    'It does not exist, or it lies outside your areas.',
  );
});
