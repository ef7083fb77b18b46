import { area } from '@tailrace/shared/contracts/people';
import { trendFile, type TrendFile, trendLook } from '@tailrace/shared/contracts/trends';
import Database from 'better-sqlite3';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { aProcess, type ServiceProcess } from './a-process.js';

const megabyte = 1024 ** 2;

/** A wide export made as it is sent: one row a second, two tags of a valve among twelve others. */
function* anExport(bytes: number): Generator<string> {
  const others = Array.from({ length: 12 }, (_, i) => (i * 17.31).toFixed(3)).join(',');
  const names = Array.from({ length: 12 }, (_, i) => `Other ${i}`).join(',');
  let second = Date.UTC(2026, 0, 1) / 1000;
  let part = `Time,FV-1.ZT [%],FV-1.FT [m3/h],${names}\n`;
  for (let sent = 0; sent + part.length < bytes; second += 1) {
    const time = new Date(second * 1000).toISOString();
    part += `${time},${30 + (second % 40)},${10 + (second % 7)},${others}\n`;
    if (part.length < 64 * 1024) continue;
    sent += part.length;
    yield part;
    part = '';
  }
  yield part;
}

describe('a large trend file', () => {
  let folder: string;
  let service: ServiceProcess;
  let areaId: string;

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'tailrace-large-'));
    service = await aProcess(folder);
    areaId = area.parse(await service.call('POST', '/api/areas', { code: 'N', name: 'North' })).id;
    await service.call('POST', '/api/valves', {
      tag: 'FV-1',
      areaId,
      dataSheet: {},
      signals: { position: { tag: 'FV-1.ZT', unit: '%' }, flow: { tag: 'FV-1.FT', unit: 'm3/h' } },
    });
  });
  afterEach(async () => {
    await service.end('SIGTERM');
    rmSync(folder, { recursive: true, force: true });
  });

  const begin = async (id: string) => {
    const { plan } = trendLook.parse(await service.call('POST', `/api/trends/${id}/look`, {}));
    await service.call('POST', `/api/trends/${id}/take-in`, { plan });
  };
  const fileWhen = async (id: string, ready: (file: TrendFile) => boolean): Promise<TrendFile> => {
    for (;;) {
      const file = trendFile.parse(await service.call('GET', `/api/trends/${id}`));
      if (ready(file)) return file;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  };
  const rowsIn = (table: string): number => {
    const database = new Database(join(folder, 'tailrace.db'), { readonly: true });
    const { count } = database.prepare(`SELECT COUNT(*) AS count FROM ${table}`).get() as { count: number };
    database.close();
    return count;
  };

  it('of 300 MB is taken in while the memory of the service stays flat', async () => {
    const atRest = service.peakMemory();
    const sent = trendFile.parse(await service.upload(areaId, anExport(300 * megabyte)));
    expect(sent.size).toBeGreaterThan(299 * megabyte);
    // 8 MB more were seen; a file held whole would take 300.
    expect(service.peakMemory() - atRest).toBeLessThan(80);

    await begin(sent.id);
    const file = await fileWhen(sent.id, ({ state }) => state !== 'reading');
    expect(file).toMatchObject({ state: 'taken', refusal: null });
    expect(file.report?.samples).toBe(2 * file.progress.rows);
    // 70 MB more were seen, of the reading thread and its buffers.
    expect(service.peakMemory() - atRest).toBeLessThan(180);
  });

  it('is as it was received after a kill while it was being read, and can be taken in again', async () => {
    const { id } = trendFile.parse(await service.upload(areaId, anExport(60 * megabyte)));
    await begin(id);
    await fileWhen(id, ({ progress }) => progress.rows > 20_000);
    await service.end('SIGKILL');
    expect(rowsIn('staged_blocks')).toBeGreaterThan(0);

    service = await aProcess(folder);
    const after = trendFile.parse(await service.call('GET', `/api/trends/${id}`));
    expect(after).toMatchObject({ state: 'received', report: null });
    expect(after.refusal).toContain('Take it in again');
    expect([rowsIn('staged_blocks'), rowsIn('sample_blocks')]).toEqual([0, 0]);
    await begin(id);
    expect(await fileWhen(id, ({ state }) => state !== 'reading')).toMatchObject({ state: 'taken' });
    expect(rowsIn('sample_blocks')).toBeGreaterThan(0);
  });
});
