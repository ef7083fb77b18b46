import { storedAssessment } from '@tailrace/shared/contracts/assessments';
import { type Area } from '@tailrace/shared/contracts/people';
import { rankingPage } from '@tailrace/shared/contracts/ranking';
import { analysisRun, runDetail } from '@tailrace/shared/contracts/runs';
import { trendFile, trendLook } from '@tailrace/shared/contracts/trends';
import { aService, type Client, type Service } from './a-service.js';
import { aTrend } from './a-trend.js';
import { aValve } from './a-valve.js';

it('x', async () => {
  const service = await aService();
  const north = await service.addArea('N');
  const engineer = await service.signIn('engineer', [north]);
  const draft = aValve({ areaId: north.id });
  await engineer.post('/api/valves', draft).expect(201);
  const text = aTrend({ tag: draft.tag });
  const kept = trendFile.parse(
    (await engineer.post('/api/trends').attach('file', Buffer.from(text), 'day.csv').expect(201)).body,
  );
  console.log(kept);
  const look = trendLook.parse((await engineer.post(`/api/trends/${kept.id}/look`, {}).expect(200)).body);
  console.log(JSON.stringify(look).slice(0, 2000));
  await engineer.post(`/api/trends/${kept.id}/take-in`, { plan: look.plan, bind: [] }).expect(202);
  let f = kept;
  do {
    await new Promise((r) => setTimeout(r, 100));
    f = trendFile.parse((await engineer.get(`/api/trends/${kept.id}`)).body);
  } while (f.state === 'reading');
  console.log(JSON.stringify(f));
  const run = analysisRun.parse((await engineer.post('/api/runs', {}).expect(202)).body);
  let d;
  do {
    await new Promise((r) => setTimeout(r, 100));
    d = runDetail.parse((await engineer.get(`/api/runs/${run.id}`)).body);
  } while (d.state === 'running' || d.state === 'waiting');
  console.log(JSON.stringify(d));
  const a = storedAssessment.parse(
    (await engineer.get(`/api/valves/${draft.tag}/assessment`).expect(200)).body,
  );
  console.log(JSON.stringify(a).slice(0, 3000));
  console.log(JSON.stringify((await engineer.get('/api/ranking')).body).slice(0, 1500));
  console.log(JSON.stringify((await engineer.get(`/api/valves/${draft.tag}/findings`)).body).slice(0, 1500));
  await service.close();
});
