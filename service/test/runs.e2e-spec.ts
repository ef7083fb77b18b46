import { type PresentedAssessment, storedAssessment } from '@tailrace/shared/contracts/assessments';
import { findingPage } from '@tailrace/shared/contracts/findings';
import { type Area } from '@tailrace/shared/contracts/people';
import { problem } from '@tailrace/shared/contracts/problems';
import { rankingPage } from '@tailrace/shared/contracts/ranking';
import { type AnalysisRun, runDetail, runPage } from '@tailrace/shared/contracts/runs';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { DataSource } from 'typeorm';
import { AnalysisRunEntity } from '../src/runs/analysis-run.entity.js';
import { RunQueue } from '../src/runs/run-queue.js';
import { RunValveEntity } from '../src/runs/run-valve.entity.js';
import { RunsService } from '../src/runs/runs.service.js';
import { aService, type Client, type Service } from './a-service.js';
import { aTrend, type TrendShape } from './a-trend.js';
import { aValve } from './a-valve.js';
import { assess, takeIn } from './take-in.js';

describe('analysis runs', () => {
  let folder: string;
  let service: Service;
  let north: Area;
  let engineer: Client;

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'tailrace-runs-'));
    service = await aService({ DATA_DIR: folder });
    north = await service.addArea('N');
    engineer = await service.signIn('engineer', [north]);
  });
  afterEach(async () => {
    await service.close();
    rmSync(folder, { recursive: true, force: true });
  });

  const addValve = (tag: string, who = engineer, area = north) =>
    who.post('/api/valves', aValve({ areaId: area.id, tag })).expect(201);
  const record = async (shape: TrendShape) => {
    const file = await takeIn(engineer, north, aTrend(shape));
    expect(file.state).toBe('taken');
  };
  const found = async (tag: string): Promise<PresentedAssessment> =>
    storedAssessment.parse((await engineer.get(`/api/valves/${tag}/assessment`).expect(200)).body).result;
  const runs = async (who = engineer): Promise<AnalysisRun[]> =>
    runPage.parse((await who.get('/api/runs').expect(200)).body).rows;

  it('find the trim that a record was made with', async () => {
    await addValve('FV-1');
    await record({ tag: 'FV-1' });
    expect(await assess(engineer)).toMatchObject({ state: 'done', valves: 1, judged: 1, failed: 0 });
    const { judged, basis, characteristic, findings } = await found('FV-1');
    expect({ judged, basis, kind: characteristic?.kind }).toEqual({
      judged: true,
      basis: 'inherent',
      kind: 'equal percentage',
    });
    // Within 2 %: the made noise is 0.5 % of flow and 0.1 % of travel (4 % of flow a per cent of travel).
    expect(Math.abs((characteristic?.ratedCoefficient?.value ?? 0) / 60 - 1)).toBeLessThan(0.02);
    expect(Math.abs((characteristic?.rangeability?.value ?? 0) / 50 - 1)).toBeLessThan(0.02);
    expect(findings.map(({ kind }) => kind)).toEqual([]);
  });

  it('rank the valve that needs attention before the one that does not, with its finding', async () => {
    for (const tag of ['FV-1', 'FV-2']) await addValve(tag);
    await record({ tag: 'FV-1' });
    await record({ tag: 'FV-2', band: [4, 12], days: 12, step: 120 });
    await assess(engineer);
    const { rows } = rankingPage.parse((await engineer.get('/api/ranking').expect(200)).body);
    expect(rows.map(({ rank, tag }) => [rank, tag])).toEqual([
      [1, 'FV-2'],
      [2, 'FV-1'],
    ]);
    const page = findingPage.parse((await engineer.get('/api/valves/FV-2/findings').expect(200)).body);
    expect(page.rows.map(({ kind, state }) => [kind, state])).toContainEqual(['Oversized', 'new']);
  });

  it('keep every assessment, the newest first', async () => {
    await addValve('FV-1');
    await record({ tag: 'FV-1', days: 1 });
    await assess(engineer);
    await record({ tag: 'FV-1', days: 1, after: 1 });
    await assess(engineer);
    const page = await engineer.get('/api/valves/FV-1/assessments').expect(200);
    const numbers = (page.body as { rows: { runNumber: number }[] }).rows.map(({ runNumber }) => runNumber);
    expect(numbers).toEqual([2, 1]);
    expect((await found('FV-1')).window.to).toBe('2026-05-06T00:00:00.000Z');
  });

  it('say of a valve without samples why it is not judged', async () => {
    await addValve('FV-1');
    const { outcomes } = await assess(engineer, ['FV-1']);
    expect(outcomes).toMatchObject([
      { tag: 'FV-1', outcome: 'not judged', reason: expect.stringContaining('No samples') as string },
    ]);
    await engineer.get('/api/valves/FV-1/assessment').expect(404);
  });

  it('show each person the valves of their own areas only', async () => {
    const south = await service.addArea('S');
    await addValve('FV-1');
    await addValve('FV-9', service.admin, south);
    const run = await assess(service.admin);
    expect(run.outcomes.map(({ tag }) => tag)).toEqual(['FV-1', 'FV-9']);
    const seen = runDetail.parse((await engineer.get(`/api/runs/${run.id}`).expect(200)).body);
    expect(seen.outcomes.map(({ tag }) => tag)).toEqual(['FV-1']);
    expect(seen.valves).toBe(1);
    await engineer.post('/api/runs', { tags: ['FV-9'] }).expect(404);
    await engineer.post(`/api/runs/${run.id}/stop`).expect(403);
  });

  it('refuse a window that ends before it begins', async () => {
    const window = { from: '2026-05-05T00:00:00Z', to: '2026-05-04T00:00:00Z' };
    const refused = await engineer.post('/api/runs', window).expect(400);
    expect(problem.parse(refused.body).errors?.map(({ pointer }) => pointer)).toEqual(['/to']);
  });

  it('once stopped leave the valves that waited as they were', async () => {
    await addValve('FV-1');
    await service.app.get(RunQueue).work();
    const id = await leftBehind(service, 'waiting');
    const stopped = runDetail.parse((await engineer.post(`/api/runs/${id}/stop`).expect(200)).body);
    expect(stopped).toMatchObject({ state: 'stopped', outcomes: [{ outcome: 'stopped' }] });
    await engineer.post(`/api/runs/${id}/stop`).expect(409);
    await service.app.get(RunQueue).work();
    expect((await runs())[0]?.state).toBe('stopped');
  });

  it('that a stop of the service cut off go on when it starts again', async () => {
    await addValve('FV-1');
    const id = await leftBehind(service, 'running');
    await service.close();
    service = await aService({ DATA_DIR: folder });
    await service.app.get(RunQueue).work();
    const gone = runDetail.parse((await service.admin.get(`/api/runs/${id}`).expect(200)).body);
    expect(gone).toMatchObject({ state: 'done', outcomes: [{ tag: 'FV-1', outcome: 'not judged' }] });
  });

  describe('of the night', () => {
    const day = 86_400_000;
    const night = async () => {
      await service.app.get(RunsService).startIfDue();
      await service.app.get(RunQueue).work();
    };

    it('begin once a night, over the valves with new samples', async () => {
      for (const tag of ['FV-1', 'FV-2']) {
        await addValve(tag);
        await record({ tag, days: 1 });
      }
      await assess(engineer);
      await record({ tag: 'FV-2', days: 1, after: 1 });
      service.later(day);
      await night();
      await night();
      const [last, ...former] = await runs();
      expect(last).toMatchObject({ number: 2, trigger: 'schedule', requestedBy: null, valves: 1, judged: 1 });
      expect(former).toHaveLength(1);
      expect((await found('FV-2')).window.to).toBe('2026-05-06T00:00:00.000Z');
    });

    it('wait for the first run by hand', async () => {
      await addValve('FV-1');
      service.later(3 * day);
      await night();
      expect(await runs(service.admin)).toEqual([]);
    });
  });
});

/** A run over the one valve there is, as a service that was stopped leaves it behind. */
async function leftBehind(service: Service, state: 'waiting' | 'running'): Promise<string> {
  const database = service.app.get(DataSource);
  const id = '00000000-0000-4000-8000-000000000001';
  const [{ valveId }] = await database.query<[{ valveId: string }]>('SELECT id AS valveId FROM valves');
  await database.getRepository(AnalysisRunEntity).insert({
    id,
    number: 1,
    state,
    trigger: 'person',
    requestedBy: null,
    requestedByName: null,
    createdAt: 0,
    startedAt: null,
    finishedAt: null,
    windowFrom: null,
    windowTo: null,
  });
  const row = { runId: id, valveId, outcome: 'waiting' as const };
  await database.getRepository(RunValveEntity).insert({ ...row, reason: null, findings: 0, took: null });
  return id;
}
