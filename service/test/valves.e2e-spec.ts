import { type Area } from '@tailrace/shared/contracts/people';
import { problem } from '@tailrace/shared/contracts/problems';
import { type Valve, valve, type ValveDraftInput, valvePage } from '@tailrace/shared/contracts/valves';
import { DataSource } from 'typeorm';
import { AuditEntryEntity } from '../src/audit/audit-entry.entity.js';
import { DataSheetEntity } from '../src/valves/data-sheet.entity.js';
import { type Client, aService, type Service } from './a-service.js';
import { aValve } from './a-valve.js';

describe('the register', () => {
  let service: Service;
  let north: Area;
  let south: Area;
  let engineer: Client;

  beforeEach(async () => {
    service = await aService();
    north = await service.addArea('N');
    south = await service.addArea('S');
    engineer = await service.signIn('engineer', [north]);
  });
  afterEach(() => service.close());

  const add = async (given: Partial<ValveDraftInput> = {}, who = engineer): Promise<Valve> =>
    valve.parse((await who.post('/api/valves', aValve({ areaId: north.id, ...given })).expect(201)).body);
  const tags = async (query: string, who = engineer): Promise<string[]> =>
    valvePage.parse((await who.get(`/api/valves?${query}`).expect(200)).body).rows.map(({ tag }) => tag);
  const edit = ({ tag, dataSheet, signals, area, version }: Valve): ValveDraftInput => ({
    tag,
    dataSheet,
    signals,
    areaId: area.id,
    version,
  });
  const pointers = (body: unknown) => problem.parse(body).errors?.map(({ pointer }) => pointer);

  it('keeps a valve with its data sheet and signals', async () => {
    const draft = aValve({ areaId: north.id, tag: 'FV-101' });
    const added = valve.parse((await engineer.post('/api/valves', draft).expect(201)).body);
    expect(added).toMatchObject({ tag: 'FV-101', area: north, version: 1 });
    expect(added.dataSheet).toMatchObject(draft.dataSheet);
    expect(added.signals.flow).toEqual({ tag: 'FV-101.FT', unit: 'm3/h', reversed: false });
    expect(valve.parse((await engineer.get('/api/valves/FV-101').expect(200)).body)).toEqual(added);
  });

  it('knows a tag in upper and lower case as one', async () => {
    await add({ tag: 'FV-101' });
    await engineer.get('/api/valves/fv-101').expect(200);
    const refused = await engineer
      .post('/api/valves', aValve({ areaId: north.id, tag: 'fv-101' }))
      .expect(409);
    expect(problem.parse(refused.body)).toMatchObject({
      type: '/problems/already-exists',
      detail: expect.stringContaining('Use another tag') as string,
    });
  });

  it('says of each field what is wrong with it', async () => {
    const draft = aValve({ areaId: north.id, tag: 'not a tag' });
    const dataSheet = { ...draft.dataSheet, ratedCoefficient: -1, designBand: { low: 80, high: 20 } };
    const refused = await engineer.post('/api/valves', { ...draft, dataSheet }).expect(400);
    expect(pointers(refused.body)).toEqual([
      '/tag',
      '/dataSheet/ratedCoefficient',
      '/dataSheet/designBand/high',
    ]);
  });

  it('takes a number of any kind JSON can hold without failing', async () => {
    for (const ratedCoefficient of [1e-300, 1e300, Number.MAX_VALUE]) {
      const { dataSheet } = aValve({ areaId: north.id });
      await add({ dataSheet: { ...dataSheet, ratedCoefficient } });
    }
  });

  it('finds valves by tag or service, and takes % and _ as they are', async () => {
    await add({ tag: 'FV_1' });
    await add({ tag: 'FV-2' });
    expect(await tags('q=FV')).toEqual(['FV-2', 'FV_1']);
    expect(await tags('q=V_')).toEqual(['FV_1']);
    expect(await tags('q=column')).toEqual(['FV-2', 'FV_1']);
    expect(await tags('q=%25')).toEqual([]);
    expect(await tags(`q=${encodeURIComponent("' OR 1=1 --")}`)).toEqual([]);
  });

  it('pages and sorts, the total being that of all pages', async () => {
    for (const tag of ['C', 'A', 'B']) await add({ tag });
    expect(await tags('pageSize=2')).toEqual(['A', 'B']);
    expect(await tags('pageSize=2&page=1')).toEqual(['C']);
    expect(await tags('sort=tag&direction=desc')).toEqual(['C', 'B', 'A']);
    const page = valvePage.parse((await engineer.get('/api/valves?pageSize=2').expect(200)).body);
    expect(page.total).toBe(3);
    const refused = await engineer.get('/api/valves?pageSize=0&sort=colour').expect(400);
    expect(pointers(refused.body)).toEqual(expect.arrayContaining(['/pageSize', '/sort']));
  });

  it('sorts by criticality from high to low, not by the alphabet', async () => {
    for (const criticality of ['low', 'high', 'normal'] as const) {
      const draft = aValve({ areaId: north.id, tag: criticality });
      await add({ ...draft, dataSheet: { ...draft.dataSheet, criticality } });
    }
    expect(await tags('sort=criticality')).toEqual(['high', 'normal', 'low']);
    expect(await tags('sort=criticality&direction=desc&pageSize=2')).toEqual(['low', 'normal']);
  });

  it('keeps the former data sheet when a new one comes', async () => {
    const added = await add();
    const dataSheet = { ...added.dataSheet, ratedCoefficient: 40 };
    const answer = await engineer.put(`/api/valves/${added.tag}`, { ...edit(added), dataSheet }).expect(200);
    expect(valve.parse(answer.body)).toMatchObject({ version: 2, dataSheet: { ratedCoefficient: 40 } });
    const sheets = await service.app
      .get(DataSource)
      .getRepository(DataSheetEntity)
      .find({ where: { valveId: added.id }, order: { number: 'ASC' } });
    expect(sheets.map(({ current, sheet }) => [current, sheet.ratedCoefficient])).toEqual([
      [false, 60],
      [true, 40],
    ]);
  });

  it('does not let one editor overwrite what another changed meanwhile', async () => {
    const seen = await add();
    await engineer.put(`/api/valves/${seen.tag}`, edit(seen)).expect(200);
    const late = await engineer.put(`/api/valves/${seen.tag}`, edit(seen)).expect(409);
    expect(problem.parse(late.body).type).toBe('/problems/edited-meanwhile');
    await engineer.put(`/api/valves/${seen.tag}`, { ...edit(seen), version: undefined }).expect(409);
  });

  it('lets only one of two editors through who send at the same moment', async () => {
    const seen = await add();
    const sent = await Promise.all(
      [1, 2, 3].map((ratedCoefficient) =>
        engineer.put(`/api/valves/${seen.tag}`, {
          ...edit(seen),
          dataSheet: { ...seen.dataSheet, ratedCoefficient },
        }),
      ),
    );
    expect(sent.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });

  it('writes each edit down: who, from what, to what', async () => {
    const added = await add();
    const dataSheet = { ...added.dataSheet, ratedCoefficient: 40 };
    await engineer.put(`/api/valves/${added.tag}`, { ...edit(added), dataSheet }).expect(200);
    const entries = await service.app
      .get(DataSource)
      .getRepository(AuditEntryEntity)
      .find({ where: { subjectId: added.id }, order: { number: 'ASC' } });
    expect(entries.map(({ action, actorId }) => [action, actorId])).toEqual([
      ['added', engineer.id],
      ['changed', engineer.id],
    ]);
    expect(entries[1]?.before).toContain('"ratedCoefficient":60');
    expect(entries[1]?.after).toContain('"ratedCoefficient":40');
  });

  it('shows nobody a valve of another area, nor that it exists', async () => {
    const hidden = await add({ areaId: south.id, tag: 'FV-900' }, service.admin);
    const asked = await engineer.get('/api/valves/FV-900').expect(404);
    const invented = await engineer.get('/api/valves/FV-901').expect(404);
    const said = (body: unknown) => ({ ...problem.parse(body), instance: '' });
    expect(said(asked.body)).toEqual(said(invented.body));
    await engineer.put('/api/valves/FV-900', edit(hidden)).expect(404);
    expect(await tags('q=900')).toEqual([]);
    expect(await tags(`area=${south.id}`)).toEqual([]);
  });

  it('lets nobody add or move a valve into an area that is not theirs', async () => {
    const refused = await engineer.post('/api/valves', aValve({ areaId: south.id })).expect(400);
    expect(pointers(refused.body)).toEqual(['/areaId']);
    const own = await add();
    await engineer.put(`/api/valves/${own.tag}`, { ...edit(own), areaId: south.id }).expect(400);
    await engineer.get(`/api/valves/${own.tag}`).expect(200);
  });

  it('keeps no half of a valve whose signals cannot be kept', async () => {
    const draft = aValve({ areaId: north.id });
    const signals = { ...draft.signals, colour: { tag: 'X' } };
    await engineer.post('/api/valves', { ...draft, signals }).expect(400);
    await engineer.get(`/api/valves/${draft.tag}`).expect(404);
  });
});
