import { type Area, type Me, type Session } from '@tailrace/shared/contracts/people';
import { type RankingPage, type RankingRow } from '@tailrace/shared/contracts/ranking';
import { type ProblemKind, problemKinds } from '@tailrace/shared/contracts/problems';
import { http, HttpResponse } from 'msw';
import { setupServer } from 'msw/node';

/** A small invented plant that answers as the service does: what the tests of screens stand on. */

export const water: Area = { id: '6c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c0001', code: 'W', name: 'Water house' };
export const steam: Area = { id: '6c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c0002', code: 'S', name: 'Steam house' };

export function aMe(of: Partial<Me> = {}): Me {
  return {
    id: '0d5a5c8e-7a51-4c3c-8b1a-3f5b1c2d0001',
    name: 'Ida Brunner',
    email: 'ida@plant.example',
    role: 'engineer',
    allAreas: true,
    areas: [water, steam],
    site: { name: 'Aare works', zone: 'Europe/Zurich', coefficientUnit: 'Kv' },
    ...of,
  };
}

export const aSession = (me = aMe()): Session => ({ accessToken: 'a-token', expiresIn: 900, me });

export function aRankingRow(of: Partial<RankingRow> = {}): RankingRow {
  return {
    rank: 1,
    tag: 'FV-2101',
    service: 'Feed water to drum',
    area: water,
    criticality: 'high',
    trip: false,
    attention: 83,
    ridge: {
      shares: Array.from({ length: 100 }, (_, i) => (i >= 70 && i < 95 ? 0.04 : 0)),
      band: { low: 20, high: 80 },
      p5: 71,
      p50: 83,
      p95: 94,
    },
    glyph: null,
    findings: [
      {
        kind: 'Undersized',
        number: 7,
        state: 'new',
        severity: 0.9,
        confidence: 0.95,
        text: 'Undersized: 31 % of the time above 90 % travel',
        explainedBy: null,
      },
    ],
    reason: null,
    window: { from: '2026-10-01T00:00:00.000Z', to: '2026-11-30T00:00:00.000Z' },
    ...of,
  };
}

export function aRankingPage(rows: RankingRow[], of: Partial<RankingPage['summary']> = {}): RankingPage {
  return {
    rows,
    total: rows.length,
    summary: {
      valves: rows.length,
      judged: rows.length,
      needAttention: rows.length,
      trips: 0,
      notJudged: 0,
      lastRun: { number: 12, finishedAt: '2026-11-30T02:10:00.000Z' },
      since: '2026-10-01T00:00:00.000Z',
      ...of,
    },
  };
}

/** A no of the API, as problem details. */
export function aProblem(kind: ProblemKind, detail: string, errors?: { pointer: string; detail: string }[]) {
  const { status, title } = problemKinds[kind];
  return HttpResponse.json(
    { type: `/problems/${kind}`, title, status, detail, instance: 'request-1', ...(errors && { errors }) },
    { status, headers: { 'Content-Type': 'application/problem+json' } },
  );
}

/** Answers to what every signed-in page asks. */
export const plantServer = setupServer(
  http.post('/api/session/refresh', () => HttpResponse.json(aSession())),
  http.get('/api/areas', () => HttpResponse.json([water, steam])),
  http.get('/api/valves', () => HttpResponse.json({ rows: [], total: 0 })),
);
