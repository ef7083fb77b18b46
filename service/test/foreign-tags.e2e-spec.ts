import { type Area } from '@tailrace/shared/contracts/people';
import { aService, type Client, type Service } from './a-service.js';
import { aTrend } from './a-trend.js';
import { aValve } from './a-valve.js';
import { send } from './take-in.js';

describe('a historian tag of another area', () => {
  let service: Service;
  let near: Area;
  let far: Area;
  let engineer: Client;
  const signals = { flow: { tag: 'FV-50.FT', unit: 'm3/h' } };

  beforeAll(async () => {
    service = await aService();
    near = await service.addArea('NEAR');
    far = await service.addArea('FAR');
    engineer = await service.signIn('engineer', [near]);
    await service.admin.post('/api/valves', aValve({ tag: 'FV-50', areaId: far.id })).expect(201);
  });
  afterAll(() => service.close());

  it('cannot be bound to a valve of one’s own, whichever way one tries', async () => {
    await engineer.post('/api/valves', aValve({ tag: 'FV-60', areaId: near.id, signals })).expect(409);
    const added = await engineer.post('/api/valves', aValve({ tag: 'FV-61', areaId: near.id })).expect(201);
    const { id: valveId } = added.body as { id: string };
    await engineer
      .put('/api/valves/FV-61', { ...aValve({ tag: 'FV-61', areaId: near.id, signals }), version: 1 })
      .expect(409);
    const file = await send(engineer, near, aTrend({ tag: 'FV-50', days: 1 }));
    const look = await engineer.post(`/api/trends/${file.id}/look`, {}).expect(200);
    const { plan } = look.body as { plan: object };
    const bind = [{ historianTag: 'FV-50.FT', valveId, role: 'density', unit: null }];
    await engineer.post(`/api/trends/${file.id}/take-in`, { plan, bind }).expect(409);
  });

  it('can be shared by somebody who sees both areas', async () => {
    await service.admin.post('/api/valves', aValve({ tag: 'FV-62', areaId: near.id, signals })).expect(201);
    // From then on it is theirs as well.
    await engineer.post('/api/valves', aValve({ tag: 'FV-63', areaId: near.id, signals })).expect(201);
  });
});
