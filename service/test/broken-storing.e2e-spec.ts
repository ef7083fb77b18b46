import { type Area } from '@tailrace/shared/contracts/people';
import { SampleStore } from '../src/trends/store/sample-store.js';
import { aService, type Client, type Service } from './a-service.js';
import { aTrend } from './a-trend.js';
import { aValve } from './a-valve.js';
import { takeIn } from './take-in.js';

describe('a disk that cannot take a file in', () => {
  let service: Service;
  let area: Area;
  let engineer: Client;

  beforeAll(async () => {
    service = await aService();
    area = await service.addArea('DSK');
    engineer = await service.signIn('engineer', [area]);
    await engineer.post('/api/valves', aValve({ tag: 'FV-9', areaId: area.id })).expect(201);
  });
  afterAll(() => service.close());

  it('leaves the file as it was received, with a word, and lets it be taken in later', async () => {
    const store = service.app.get(SampleStore);
    const stage = store.stage.bind(store);
    store.stage = () => Promise.reject(new Error('database or disk is full'));
    const broken = await takeIn(engineer, area, aTrend({ tag: 'FV-9', days: 1 }));
    expect(broken.state).toBe('received');
    expect(broken.refusal).toContain('database or disk is full');
    expect(await store.extent('FV-9.FT')).toBeNull();

    store.stage = stage;
    const taken = await takeIn(engineer, area, aTrend({ tag: 'FV-9', days: 1 }));
    expect(taken.id).toBe(broken.id);
    expect(taken.state).toBe('taken');
    expect(await store.extent('FV-9.FT')).not.toBeNull();
  });
});
