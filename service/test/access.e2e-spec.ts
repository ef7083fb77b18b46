import { storedAssessment } from '@tailrace/shared/contracts/assessments';
import { type Area } from '@tailrace/shared/contracts/people';
import { role, type Role } from '@tailrace/shared/contracts/policy';
import { valve } from '@tailrace/shared/contracts/valves';
import { type Test } from 'supertest';
import { DataSource } from 'typeorm';
import { AnalysisRunEntity } from '../src/runs/analysis-run.entity.js';
import { RunQueue } from '../src/runs/run-queue.js';
import { RunValveEntity } from '../src/runs/run-valve.entity.js';
import { aService, type Client, type Service } from './a-service.js';
import { aTrend } from './a-trend.js';
import { aValve } from './a-valve.js';
import { assess, takeIn } from './take-in.js';
import { type Ground, type Knock, routeMatrix, type RouteRow } from './route-matrix.js';

interface Layer {
  readonly route?: { readonly path: string; readonly methods: Record<string, boolean> };
}

const present = (value: Client | undefined): Client => {
  if (!value) throw new Error('this person was not signed in');
  return value;
};

/** Every route the running service really has, as `METHOD /path`; the API page's own files left aside. */
function routesOf(service: Service): string[] {
  const { router } = service.app.getHttpAdapter().getInstance() as { router: { stack: Layer[] } };
  return router.stack.flatMap(({ route }) =>
    !route || route.path.startsWith('/api/docs')
      ? []
      : Object.keys(route.methods).map((method) => `${method.toUpperCase()} ${route.path}`),
  );
}

const allowed = (row: RouteRow, asker: Role) =>
  row.who === 'anybody' || row.who === 'signed in' || row.who.includes(asker);

describe('access', () => {
  let service: Service;
  let ground: Ground;
  const insiders = new Map<Role, Client>();
  const strangers = new Map<Role, Client>();

  beforeAll(async () => {
    service = await aService();
    const [here, elsewhere] = [await service.addArea('HERE'), await service.addArea('ELSE')];
    for (const asker of role.options) {
      insiders.set(asker, await service.signIn(asker, [here]));
      strangers.set(asker, await service.signIn(asker, [elsewhere]));
    }
    ground = await lay(service, here);
  });
  afterAll(() => service.close());

  const send = (row: RouteRow, { path, body, file }: Knock, client: Pick<Client, 'send'>): Test => {
    const method = row.route.split(' ')[0] ?? '';
    if (file === undefined) return client.send(method, path, body);
    return client
      .send(method, path)
      .field(body as Record<string, string>)
      .attach('file', Buffer.from(file), 'trend.csv');
  };

  it('is laid down for every route there is, and for no other', () => {
    const known = routeMatrix.map(({ route }) => route);
    expect([...known].sort()).toEqual(routesOf(service).sort());
  });

  describe.each(routeMatrix)('to $route', (row) => {
    it(row.who === 'anybody' ? 'needs no token' : 'is refused without a token', async () => {
      const answer = await send(row, await row.knock(ground), service);
      expect(answer.status).toBe(row.who === 'anybody' ? row.granted : 401);
    });

    it.each(role.options)('for %s of the area', async (asker) => {
      const answer = await send(row, await row.knock(ground), present(insiders.get(asker)));
      expect(answer.status).toBe(allowed(row, asker) ? row.granted : 403);
      if (row.hidden) expect(answer.text).toContain(row.hidden(ground));
    });

    it.each(role.options)('for %s of another area', async (asker) => {
      const answer = await send(row, await row.knock(ground), present(strangers.get(asker)));
      expect(answer.status).toBe(allowed(row, asker) ? row.stranger : 403);
      if (row.hidden) expect(answer.text).not.toContain(row.hidden(ground));
    });
  });
});

/** A valve with a record and an assessment in one area. */
async function lay(service: Service, area: Area): Promise<Ground> {
  const { admin } = service;
  const draft = aValve({ areaId: area.id });
  const added = valve.parse((await admin.post('/api/valves', draft).expect(201)).body);
  await takeIn(admin, area, aTrend({ tag: draft.tag, days: 1 }));
  const run = await assess(admin, [draft.tag]);
  const latest = await admin.get(`/api/valves/${draft.tag}/assessment`).expect(200);
  const database = service.app.get(DataSource);
  let files = 0;
  let runs = 1000;
  return {
    area,
    valve: added,
    runId: run.id,
    assessmentId: storedAssessment.parse(latest.body).id,
    adminEmail: admin.email,
    async freshFile() {
      files += 1;
      const text = `Time,${draft.tag}.ZT\n${new Date(files * 60_000).toISOString()},1\n`;
      const answer = await admin
        .post('/api/trends')
        .field('areaId', area.id)
        .attach('file', Buffer.from(text), 'fresh.csv')
        .expect(201);
      return (answer.body as { id: string }).id;
    },
    /** Written straight into the database: one sent to the API would be worked off before it is stopped. */
    async freshRun() {
      await service.app.get(RunQueue).work();
      runs += 1;
      const id = `00000000-0000-4000-8000-00000000${runs}`;
      await database.getRepository(AnalysisRunEntity).insert({
        id,
        number: runs,
        state: 'waiting',
        trigger: 'person',
        requestedBy: null,
        requestedByName: null,
        createdAt: 0,
        startedAt: null,
        finishedAt: null,
        windowFrom: null,
        windowTo: null,
      });
      const row = { runId: id, valveId: added.id, outcome: 'waiting' as const };
      await database.getRepository(RunValveEntity).insert({ ...row, reason: null, findings: 0, took: null });
      return id;
    },
  };
}
