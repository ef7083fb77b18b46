import { type PresentedAssessment, storedAssessment } from '@tailrace/shared/contracts/assessments';
import { type Area } from '@tailrace/shared/contracts/people';
import { analysisRun, runDetail, stoppable } from '@tailrace/shared/contracts/runs';
import { type TrendFile } from '@tailrace/shared/contracts/trends';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { SampleStore } from '../src/trends/store/sample-store.js';
import { aService, type Client, type Service } from './a-service.js';
import { takeIn } from './take-in.js';

/**
 * Open data through the whole service: upload, take-in, run, stored assessment. What is expected of each is what
 * its makers say of it (shared/reference/README.md).
 */
const dataset = (name: string) =>
  readFileSync(
    fileURLToPath(new URL(`../../shared/reference/open-datasets/${name}.csv`, import.meta.url)),
    'utf8',
  );

/** Valve and the flow behind it. The reservoir valves of the rig report an actuator current: a demand. */
const pairs = [
  ['CV101.POS', 'FI101.PV'],
  ['CV102.POS', 'FI102.PV'],
  ['CV103.POS', 'FI103.PV'],
  ['CV107.POS', 'FI101.PV'],
  ['CV108.POS', 'FI102.PV'],
  ['CV109.POS', 'FI103.PV'],
  ['XMV03', 'XMEAS01'],
  ['XMV04', 'XMEAS04'],
  ['XMV06', 'XMEAS10'],
  ['XMV07', 'XMEAS14'],
  ['XMV09', 'XMEAS19'],
] as const;

/** s UTC, to the year 2200 */
const always = { from: 0, to: 7_258_118_400 };

const unrelated = [
  'Sticking',
  'Lost motion',
  'Hunting',
  'Lost capacity',
  'Gained capacity',
  'Off characteristic',
];

describe('open data', () => {
  let service: Service;
  let area: Area;
  let engineer: Client;
  const files = new Map<string, TrendFile>();

  beforeAll(async () => {
    service = await aService();
    area = await service.addArea('OPEN');
    engineer = await service.signIn('engineer', [area]);
    for (const [tag, flow] of pairs)
      await engineer
        .post('/api/valves', {
          tag,
          areaId: area.id,
          dataSheet: {},
          signals: { demand: { tag, unit: '%' }, flow: { tag: flow } },
        })
        .expect(201);
    for (const name of ['rig_gaslift_ssrto_1', 'tep_idv01_ac_ratio', 'tep_idv02_b_composition'])
      files.set(name, await takeIn(engineer, area, dataset(name)));
  });
  afterAll(() => service.close());

  /** Assesses these valves over a window and answers what was stored. */
  async function assessed(
    tags: readonly string[],
    window: { from?: string; to?: string } = {},
  ): Promise<Map<string, PresentedAssessment>> {
    const started = await engineer.post('/api/runs', { tags, ...window }).expect(202);
    const { id } = analysisRun.parse(started.body);
    for (;;) {
      const run = runDetail.parse((await engineer.get(`/api/runs/${id}`).expect(200)).body);
      if (!stoppable.includes(run.state)) {
        expect(run.failed).toBe(0);
        break;
      }
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
    const results = new Map<string, PresentedAssessment>();
    for (const tag of tags) {
      const answer = await engineer.get(`/api/valves/${tag}/assessment`).expect(200);
      results.set(tag, storedAssessment.parse(answer.body).result);
    }
    return results;
  }
  const kinds = (result: PresentedAssessment | undefined) => result?.findings.map(({ kind }) => kind);

  it.each([
    ['rig_gaslift_ssrto_1', 1183, 9],
    ['tep_idv01_ac_ratio', 960, 10],
    ['tep_idv02_b_composition', 960, 10],
  ])('is taken in whole: %s, %i rows', (name, rows, tags) => {
    const file = files.get(name);
    expect(file).toMatchObject({ state: 'taken', report: { rows, badSamples: 0, rejects: [] } });
    expect(file?.report?.tags).toHaveLength(tags);
    for (const tag of file?.report?.tags ?? []) expect(tag.taken).toBe(rows);
  });

  it('keeps each value as it stands in the file', async () => {
    const [head = '', ...rows] = dataset('rig_gaslift_ssrto_1').trim().split('\n');
    const column = head.trim().split(',').indexOf('CV103.POS');
    const stored = await service.app.get(SampleStore).read('CV103.POS', always);
    expect([...stored.value]).toEqual(rows.map((row) => Number(row.split(',')[column])));
    expect(stored.time[0]).toBe(Date.parse('2021-03-03T10:00:00Z') / 1000);
  });

  it('shows the valves of the rig: two concave curves, one that stood, three wide open', async () => {
    const results = await assessed(pairs.map(([tag]) => tag).filter((tag) => tag.startsWith('CV')));
    for (const tag of ['CV101.POS', 'CV103.POS']) {
      const result = results.get(tag);
      expect(result).toMatchObject({ judged: true, basis: 'installed', travelSource: 'demand' });
      for (const kind of unrelated) expect(kinds(result)).not.toContain(kind);
      const points = result?.characteristic?.points ?? [];
      const least = points[0]?.travel ?? NaN;
      expect(slope(points, least, 45)).toBeGreaterThanOrEqual(5 * slope(points, 52, 100));
    }
    expect(results.get('CV102.POS')).toMatchObject({ judged: false, findings: [] });
    for (const tag of ['CV107.POS', 'CV108.POS', 'CV109.POS']) {
      expect(kinds(results.get(tag))).toEqual(['Pinned at limit']);
      expect(results.get(tag)).toMatchObject({ characteristic: null, range: { atOpen: 1 } });
    }
  });

  it('shows the straight lines of the Tennessee Eastman process, by the window asked for', async () => {
    const first = await assessed(['XMV03', 'XMV07', 'XMV09'], {
      from: '2024-03-04T00:00:00Z',
      to: '2024-03-06T00:00:00Z',
    });
    onLine(first.get('XMV03'), 0.01015, 0.001068, 0.02);
    onLine(first.get('XMV09'), 3.25, 77.03, 0.02);
    expect(first.get('XMV07')).toMatchObject({ judged: false, characteristic: null });
    const second = await assessed(['XMV04', 'XMV06', 'XMV09'], {
      from: '2024-03-11T00:00:00Z',
      to: '2024-03-13T00:00:00Z',
    });
    onLine(second.get('XMV06'), 0.008332, 0.005544, 0.02);
    onLine(second.get('XMV09'), 4.46, 19.54, 0.04);
    expect(second.get('XMV04')).toMatchObject({ judged: false, characteristic: null });
    // 8.4 % of the samples after the 160th of 960 lie above 90 % travel.
    expect(second.get('XMV06')?.range?.aboveHigh).toBeCloseTo((0.084 * 800) / 960, 2);
  });

  it('thinned to what changed, in the long form, is the same record as far as it was kept', async () => {
    const before = await service.app.get(SampleStore).read('CV101.POS', always);
    const text = dataset('rig_gaslift_ssrto_1_long');
    const file = await takeIn(engineer, area, text);
    expect(file).toMatchObject({
      state: 'taken',
      plan: { form: 'long' },
      report: { rows: 2587, rejects: [] },
    });
    const after = await service.app.get(SampleStore).read('CV101.POS', always);
    expect(after).toEqual(before);
  });
});

interface Point {
  readonly travel: number;
  readonly value: number;
}

function onLine(result: PresentedAssessment | undefined, k: number, zero: number, within: number): void {
  expect(result?.judged).toBe(true);
  const points = result?.characteristic?.points ?? [];
  expect(points.length).toBeGreaterThanOrEqual(8);
  for (const { travel, value } of points)
    expect(Math.abs(value / (zero + k * travel) - 1)).toBeLessThan(within);
}

/** Slope of the least-squares line through points of a range of travel. */
function slope(points: readonly Point[], from: number, to: number): number {
  const inside = points.filter(({ travel }) => travel >= from && travel <= to);
  const mx = inside.reduce((sum, p) => sum + p.travel, 0) / inside.length;
  const my = inside.reduce((sum, p) => sum + p.value, 0) / inside.length;
  const sxy = inside.reduce((sum, p) => sum + (p.travel - mx) * (p.value - my), 0);
  return sxy / inside.reduce((sum, p) => sum + (p.travel - mx) ** 2, 0);
}
