import { type Area } from '@tailrace/shared/contracts/people';
import { problem } from '@tailrace/shared/contracts/problems';
import { trendFile, trendFilePage, trendLook } from '@tailrace/shared/contracts/trends';
import { type Valve, valve } from '@tailrace/shared/contracts/valves';
import { randomUUID } from 'node:crypto';
import { readdirSync } from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { DataSource } from 'typeorm';
import { CONFIG, type Config } from '../src/platform/config.js';
import { type Client, aService, type Service } from './a-service.js';
import { aValve } from './a-valve.js';
import { send, settled, takeIn } from './take-in.js';

const minute = (n: number) => new Date(Date.UTC(2026, 4, 4, 0, n)).toISOString();
const rows = (count: number, cells: (n: number) => string) =>
  Array.from({ length: count }, (_, n) => `${minute(n)},${cells(n)}\n`).join('');

describe('trend files', () => {
  let service: Service;
  let north: Area;
  let operator: Client;
  let engineer: Client;
  let bound: Valve;

  beforeAll(async () => {
    service = await aService({ MAX_UPLOAD_MB: '1' });
    north = await service.addArea('N');
    operator = await service.signIn('operator', [north]);
    engineer = await service.signIn('engineer', [north]);
    const signals = { position: { tag: 'FV-1.ZT', unit: '%' } };
    const added = await engineer.post('/api/valves', aValve({ areaId: north.id, tag: 'FV-1', signals }));
    bound = valve.parse(added.body);
  });
  afterAll(() => service.close());

  /** The files in the store, and how many samples any table holds. */
  const kept = async () => {
    const folder = join(service.app.get<Config>(CONFIG).dataDir, 'trend-files');
    const [{ blocks }] = await service.app
      .get(DataSource)
      .query<[{ blocks: number }]>('SELECT count(*) AS blocks FROM sample_blocks');
    const [{ staged }] = await service.app
      .get(DataSource)
      .query<[{ staged: number }]>('SELECT count(*) AS staged FROM staged_blocks');
    return { files: readdirSync(folder).sort(), blocks, staged };
  };
  const pointers = (body: unknown) => problem.parse(body).errors?.map(({ pointer }) => pointer);

  it('are taken in with a report of what was taken and what was not', async () => {
    const text = `Time,FV-1.ZT,Else\n${rows(60, (n) => `${n},1`)}2026-99-99,1,1\n${minute(61)},1,1,1,1\n`;
    const file = await takeIn(operator, north, text);
    expect(file).toMatchObject({ state: 'taken with rejects', progress: { share: 1 }, refusal: null });
    expect(file.report?.tags).toEqual([
      { historianTag: 'FV-1.ZT', taken: 60, bad: 0, from: minute(0), to: minute(59) },
    ]);
    expect(file.report?.leftInFile).toEqual(['Else']);
    expect(file.report?.rejects.map(({ reason, count, firstLines }) => [reason, count, firstLines])).toEqual([
      ['time not understood', 1, [62]],
      ['wrong number of cells', 1, [63]],
    ]);
  });

  it('are the same file when the same bytes come again', async () => {
    const text = `Time,FV-1.ZT\n${rows(3, () => '5')}`;
    const first = await send(operator, north, text);
    const before = await kept();
    const again = await operator
      .post('/api/trends')
      .attach('file', Buffer.from(text), 'other.csv')
      .expect(200);
    expect(trendFile.parse(again.body).id).toBe(first.id);
    expect(await kept()).toEqual(before);
  });

  it('bring in no sample twice when they overlap', async () => {
    const draft = aValve({ areaId: north.id });
    await engineer.post('/api/valves', draft).expect(201);
    const tag = `${draft.tag}.ZT`;
    await takeIn(operator, north, `Time,${tag}\n${rows(40, (n) => String(n))}`);
    await takeIn(operator, north, `Time,${tag}\n${rows(60, (n) => String(n))}`);
    const database = service.app.get(DataSource);
    const [{ samples }] = await database.query<[{ samples: number }]>(
      `SELECT sum(block.count) AS samples FROM sample_blocks block
       JOIN historian_tags tag ON tag.id = block.tagId WHERE tag.name = ?`,
      [tag],
    );
    expect(samples).toBe(60);
  });

  const unusable: [string, string | Buffer, RegExp][] = [
    ['an empty file', '', /empty/],
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 0]), /not text/],
    ['a header and nothing below it', 'Time,FV-1.ZT\n', /no rows/],
    ['a letter', 'Dear reader,\nthere is nothing here.\nYours\n', /column|time/],
    ['the same tag twice', `Time,FV-1.ZT,FV-1.ZT\n${rows(5, () => '1,2')}`, /FV-1\.ZT.*column 2.*column 3/],
    ['a gzip that is cut', gzipSync(`Time,FV-1.ZT\n${rows(500, () => '1')}`).subarray(0, 200), /gzip/],
  ];
  it.each(unusable)(
    'that are %s are refused in words, and nothing of them is kept',
    async (_, bytes, words) => {
      const before = await kept();
      const file = await send(operator, north, bytes);
      const look = await operator.post(`/api/trends/${file.id}/look`, {}).expect(422);
      expect(problem.parse(look.body)).toMatchObject({
        type: '/problems/unusable-file',
        detail: expect.stringMatching(words) as string,
      });
      await operator.delete(`/api/trends/${file.id}`).expect(204);
      expect(await kept()).toEqual(before);
    },
  );

  const refused: [string, string, RegExp][] = [
    ['mixed decimal marks', `${rows(50, () => '1.5')}${minute(60)},"2,5"\n`, /Line 52.*decimal mark/],
    [
      'a time that goes back',
      `${rows(50, () => '1')}${minute(1 - 60 * 24)},1\n${minute(1)},1\n`,
      /goes back/,
    ],
    ['nothing but bad values', rows(50, () => 'Bad'), /All 50 values/],
  ];
  it.each(refused)(
    'with %s are refused while they are read, and no sample is kept',
    async (_, body, words) => {
      const before = await kept();
      const file = await takeIn(operator, north, `Time,FV-1.ZT\n${body}`);
      expect(file).toMatchObject({ state: 'refused', report: null });
      expect(file.refusal).toMatch(words);
      const after = await kept();
      expect([after.blocks, after.staged]).toEqual([before.blocks, before.staged]);
      await operator.delete(`/api/trends/${file.id}`).expect(204);
    },
  );

  it('that are a gzip bomb are refused long before they are unpacked', async () => {
    const before = await kept();
    const bomb = gzipSync(`Time,FV-1.ZT\n${'2026-05-04T00:00:00Z,1\n'.repeat(3_000_000)}`);
    expect(bomb.length).toBeLessThan(1_000_000);
    const file = await takeIn(operator, north, bomb);
    expect(file).toMatchObject({ state: 'refused', refusal: expect.stringContaining('unpacks') as string });
    expect(file.progress.rows).toBeLessThan(3_000_000);
    expect((await kept()).blocks).toBe(before.blocks);
  });

  it('of which no tag belongs to a valve are refused with what to do', async () => {
    const file = await takeIn(operator, north, `Time,Unknown\n${rows(5, () => '1')}`);
    expect(file).toMatchObject({ state: 'refused', refusal: expect.stringContaining('Bind') as string });
  });

  it('above the limit are refused, and nothing is kept', async () => {
    const before = await kept();
    const answer = await operator
      .post('/api/trends')
      .attach('file', Buffer.alloc(1_200_000, 'x'), 'large.csv')
      .expect(413);
    expect(problem.parse(answer.body).detail).toContain('1 MB');
    expect(await kept()).toEqual(before);
  });

  it('leave nothing behind when the connection breaks off', async () => {
    const before = await kept();
    await breakOff(service.url, operator.token);
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(await kept()).toEqual(before);
    await operator.get('/api/trends').expect(200);
  });

  it('cannot be sent as anything but one file in a form', async () => {
    expect(pointers((await operator.post('/api/trends', { file: 'x' }).expect(400)).body)).toEqual(['/file']);
    const empty = await operator.post('/api/trends').field('areaId', north.id).expect(400);
    expect(pointers(empty.body)).toEqual(['/file']);
  });

  it('name their area where a person has several', async () => {
    const everywhere = await service.signIn('operator', null);
    await service.addArea('S');
    const answer = await everywhere.post('/api/trends').attach('file', Buffer.from('a'), 'a.csv').expect(400);
    expect(pointers(answer.body)).toEqual(['/areaId']);
  });

  it('fill an empty role of a valve, proposed by name and confirmed by an operator', async () => {
    const { id } = await send(operator, north, `Time,FV-1.FT [m3/h]\n${rows(5, () => '1')}`);
    const look = trendLook.parse((await operator.post(`/api/trends/${id}/look`, {}).expect(200)).body);
    expect(look.tags[0]).toMatchObject({
      historianTag: 'FV-1.FT',
      unit: 'm3/h',
      bound: [],
      proposal: { valveId: bound.id, role: 'flow' },
    });
    const bind = [{ historianTag: 'FV-1.FT', valveId: bound.id, role: 'flow', unit: 'm3/h' }];
    await operator.post(`/api/trends/${id}/take-in`, { plan: look.plan, bind }).expect(202);
    expect((await settled(operator, id)).report?.tags[0]).toMatchObject({
      historianTag: 'FV-1.FT',
      taken: 5,
    });
    const now = valve.parse((await operator.get('/api/valves/FV-1')).body);
    expect(now.signals.flow).toMatchObject({ tag: 'FV-1.FT' });
  });

  it('change a signal that is bound only by the hand of an engineer', async () => {
    const { id } = await send(operator, north, `Time,New.ZT\n${rows(5, () => '1')}`);
    const { plan } = trendLook.parse((await operator.post(`/api/trends/${id}/look`, {})).body);
    const bind = [{ historianTag: 'New.ZT', valveId: bound.id, role: 'position', unit: '%' }];
    const no = await operator.post(`/api/trends/${id}/take-in`, { plan, bind }).expect(409);
    expect(problem.parse(no.body).detail).toContain('An engineer can change it');
    expect(trendFile.parse((await operator.get(`/api/trends/${id}`)).body).state).toBe('received');
    await engineer.post(`/api/trends/${id}/take-in`, { plan, bind }).expect(202);
    expect((await settled(engineer, id)).state).toBe('taken');
  });

  it('cannot bind a tag to a valve of another area', async () => {
    const south = await service.addArea('SOUTH');
    const added = await service.admin.post('/api/valves', aValve({ areaId: south.id })).expect(201);
    const { id } = await send(engineer, north, `Time,Spy\n${rows(5, () => '1')}`);
    const { plan } = trendLook.parse((await engineer.post(`/api/trends/${id}/look`, {})).body);
    const bind = [{ historianTag: 'Spy', valveId: valve.parse(added.body).id, role: 'setPoint', unit: null }];
    await engineer.post(`/api/trends/${id}/take-in`, { plan, bind }).expect(404);
    await engineer.get(`/api/trends/${randomUUID()}`).expect(404);
  });

  it('that are taken cannot be removed', async () => {
    const page = trendFilePage.parse((await operator.get('/api/trends?state=taken').expect(200)).body);
    expect(page.rows.length).toBeGreaterThan(0);
    await operator.delete(`/api/trends/${page.rows[0]?.id}`).expect(409);
  });
});

/** Begins an upload that says it is longer than what it sends, and closes the connection. */
function breakOff(url: string, token: string): Promise<void> {
  const { hostname, port } = new URL(url);
  const head = [
    'POST /api/trends HTTP/1.1',
    `Host: ${hostname}`,
    `Authorization: Bearer ${token}`,
    'Content-Type: multipart/form-data; boundary=b',
    'Content-Length: 500000',
    '',
    '--b',
    'Content-Disposition: form-data; name="file"; filename="cut.csv"',
    '',
    'Time,FV-1.ZT',
    '2026-05-04T00:00:00Z,1',
  ];
  return new Promise((resolve, reject) => {
    const socket = connect(Number(port), hostname, () => {
      socket.write(head.join('\r\n'));
      setTimeout(() => socket.destroy(), 100);
    });
    socket.on('close', () => resolve());
    socket.on('error', reject);
  });
}
