import { area, me, person } from '@tailrace/shared/contracts/people';
import { problem } from '@tailrace/shared/contracts/problems';
import { z } from 'zod';
import { aService, password, type Service } from './a-service.js';

describe('people and areas', () => {
  let service: Service;
  beforeEach(async () => {
    service = await aService();
  });
  afterEach(() => service.close());

  const draft = (given: object) => ({
    name: 'Runa Holm',
    email: 'Runa.Holm@plant.example',
    role: 'operator',
    areaIds: null,
    password,
    ...given,
  });
  const pointers = (body: unknown) => problem.parse(body).errors?.map(({ pointer }) => pointer);

  it('are added by an administrator, who never sees the password again', async () => {
    const north = await service.addArea('N');
    const answer = await service.admin.post('/api/people', draft({ areaIds: [north.id] })).expect(201);
    expect(person.strict().parse(answer.body)).toMatchObject({
      email: 'runa.holm@plant.example',
      role: 'operator',
      areaIds: [north.id],
    });
  });

  it('are each added once', async () => {
    await service.addArea('N');
    await service.admin.post('/api/areas', { code: 'N', name: 'Another' }).expect(409);
    await service.admin.post('/api/people', draft({})).expect(201);
    const again = await service.admin.post('/api/people', draft({ email: 'RUNA.HOLM@plant.example' }));
    expect(problem.parse(again.body).type).toBe('/problems/already-exists');
  });

  it('show each person the areas that are theirs', async () => {
    const [north, south] = [await service.addArea('N'), await service.addArea('S')];
    const of = async (areas: (typeof north)[] | null) =>
      z.array(area).parse((await (await service.signIn('operator', areas)).get('/api/areas')).body);
    expect(await of([south])).toEqual([south]);
    expect(await of([])).toEqual([]);
    expect(await of(null)).toEqual([north, south]);
  });

  it('leave a person without areas with empty lists, not with everything', async () => {
    const nobody = await service.signIn('engineer', []);
    expect(me.parse((await nobody.get('/api/me').expect(200)).body)).toMatchObject({
      allAreas: false,
      areas: [],
    });
    for (const list of ['/api/valves', '/api/trends', '/api/runs'])
      expect((await nobody.get(list).expect(200)).body).toMatchObject({ rows: [], total: 0 });
  });

  it('cannot be given areas by somebody who does not have them', async () => {
    const [north, south] = [await service.addArea('N'), await service.addArea('S')];
    const local = await service.signIn('admin', [north]);
    for (const areaIds of [null, [south.id], [north.id, south.id]]) {
      const refused = await local.post('/api/people', draft({ areaIds })).expect(400);
      expect(pointers(refused.body)).toEqual(['/areaIds']);
    }
    await local.post('/api/people', draft({ areaIds: [north.id] })).expect(201);
    await local.post('/api/areas', { code: 'E', name: 'East' }).expect(403);
  });

  it('say which field is not right', async () => {
    const gone = '00000000-0000-4000-8000-000000000000';
    const refused = await service.admin.post('/api/people', draft({ role: 'owner', password: 'short' }));
    expect(pointers(refused.body)).toEqual(['/role', '/password']);
    const nowhere = await service.admin.post('/api/people', draft({ areaIds: [gone] })).expect(400);
    expect(pointers(nowhere.body)).toEqual(['/areaIds']);
    const code = await service.admin.post('/api/areas', { code: 'two words', name: '' }).expect(400);
    expect(pointers(code.body)).toEqual(['/code', '/name']);
  });
});
