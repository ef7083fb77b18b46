import { screen, within } from '@testing-library/react';
import { type ValveRow } from '@tailrace/shared/contracts/valves';
import { http, HttpResponse } from 'msw';
import { describe, expect, it } from 'vitest';
import { openAt } from '../../test-app';
import { aProblem, plantServer, water } from '../../test-plant';

function aValveRow(of: Partial<ValveRow> = {}): ValveRow {
  return {
    id: '7a1f6c1e-2f0c-4d7e-9a55-0d6f3a1c0001',
    tag: 'FV-2101',
    area: water,
    service: 'Feed water to drum',
    characteristic: 'equal percentage',
    ratedCoefficient: 40,
    coefficientUnit: 'Kv',
    criticality: 'high',
    trip: false,
    signalRoles: ['flow', 'demand'],
    ...of,
  };
}

/** Answers the register and remembers what it was asked. */
function registerOf(rows: ValveRow[]): URLSearchParams[] {
  const asked: URLSearchParams[] = [];
  plantServer.use(
    http.get('/api/valves', ({ request }) => {
      asked.push(new URL(request.url).searchParams);
      return HttpResponse.json({ rows, total: rows.length });
    }),
  );
  return asked;
}

describe('the register of valves', () => {
  it('shows a valve with its coefficient in its unit and its signals in words', async () => {
    registerOf([aValveRow()]);
    openAt('/valves');
    const tag = await screen.findByRole('link', { name: 'FV-2101' });
    expect(tag).toHaveAttribute('href', '/valves/FV-2101');
    expect(screen.getByText('demand, flow')).toBeInTheDocument();
    expect(screen.getByText(/^40(\.0)?\sKv$/)).toBeInTheDocument();
  });

  it('asks the server for what the address says, and leaves out what makes no sense there', async () => {
    const asked = registerOf([aValveRow()]);
    openAt('/valves?q=feed&sort=criticality&direction=desc&page=3&rows=7');
    await screen.findByRole('link', { name: 'FV-2101' });
    expect(Object.fromEntries(asked[0] ?? [])).toEqual({
      q: 'feed',
      sort: 'criticality',
      direction: 'desc',
      page: '2',
      pageSize: '50',
    });
  });

  it('sorts on the server and keeps the order in the address', async () => {
    const asked = registerOf([aValveRow()]);
    const { user, where } = openAt('/valves');
    const head = await screen.findByRole('columnheader', { name: 'Service' });
    await user.click(within(head).getByText('Service'));
    expect(where()).toBe('/valves?sort=service');
    expect(asked.at(-1)?.get('sort')).toBe('service');
  });

  it('tells an empty register from one where nothing fits', async () => {
    registerOf([]);
    openAt('/valves');
    expect(await screen.findByText('The register is empty')).toBeVisible();
  });

  it('says so when nothing fits the words', async () => {
    registerOf([]);
    openAt('/valves?q=nothing');
    expect(await screen.findByText('Nothing fits what you asked for')).toBeVisible();
  });

  it('tells a person whose role may not see it, in words', async () => {
    plantServer.use(http.get('/api/valves', () => aProblem('not-allowed', 'Ask a site administrator.')));
    openAt('/valves');
    expect(await screen.findByText('Your role does not allow this')).toBeVisible();
  });
});
