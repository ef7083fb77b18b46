import { type Area } from '@tailrace/shared/contracts/people';
import { analysisRun, runDetail, type RunDetail, stoppable } from '@tailrace/shared/contracts/runs';
import { type TakeInDraft, trendFile, type TrendFile, trendLook } from '@tailrace/shared/contracts/trends';
import { type Client } from './a-service.js';

/** Asks until the answer is there; gives up after half a minute, so that a fault fails its test and no other. */
async function until<T>(ask: () => Promise<T | null>): Promise<T> {
  const giveUp = Date.now() + 30_000;
  while (Date.now() < giveUp) {
    const answer = await ask();
    if (answer !== null) return answer;
    await moment();
  }
  throw new Error('nothing changed within half a minute');
}

const moment = () => new Promise((resolve) => setTimeout(resolve, 25));

export async function send(client: Client, area: Area, bytes: string | Buffer): Promise<TrendFile> {
  const answer = await client
    .post('/api/trends')
    .field('areaId', area.id)
    .attach('file', Buffer.from(bytes), 'export.csv');
  return trendFile.parse(answer.body);
}

/** The file once it is no longer being read. */
export async function settled(client: Client, id: string): Promise<TrendFile> {
  return until(async () => {
    const file = trendFile.parse((await client.get(`/api/trends/${id}`).expect(200)).body);
    return file.state === 'reading' ? null : file;
  });
}

/** Sends a trend file, takes the guessed plan for right, and waits until it has been read. */
export async function takeIn(
  client: Client,
  area: Area,
  bytes: string | Buffer,
  bind: TakeInDraft['bind'] = [],
): Promise<TrendFile> {
  const { id } = await send(client, area, bytes);
  const look = await client.post(`/api/trends/${id}/look`, {}).expect(200);
  const { plan } = trendLook.parse(look.body);
  await client.post(`/api/trends/${id}/take-in`, { plan, bind }).expect(202);
  return settled(client, id);
}

/** Has valves assessed and waits for the run to end. */
export async function assess(client: Client, tags?: string[]): Promise<RunDetail> {
  const started = await client.post('/api/runs', { tags }).expect(202);
  const { id } = analysisRun.parse(started.body);
  return until(async () => {
    const run = runDetail.parse((await client.get(`/api/runs/${id}`).expect(200)).body);
    return stoppable.includes(run.state) ? null : run;
  });
}
