import { storedAssessment, type StoredAssessment } from '@tailrace/shared/contracts/assessments';
import { valve, type Valve } from '@tailrace/shared/contracts/valves';
import { http, HttpResponse } from 'msw';
import {
  sampleCharacteristic,
  sampleDeviation,
  sampleDrift,
  sampleGain,
  sampleMovement,
  sampleRange,
  sampleSplit,
} from './charts/chart-samples';
import { plantServer, water } from './test-plant';

/** An invented valve with its assessment, held to the contracts so that the tests of its sheet cannot drift from them. */

export function aValve(of: { dataSheet?: object; signals?: object } = {}): Valve {
  return valve.parse({
    id: '1c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c1001',
    tag: 'FV-2101',
    area: water,
    version: 3,
    createdAt: '2026-01-05T08:00:00.000Z',
    updatedAt: '2026-03-05T08:00:00.000Z',
    dataSheet: {
      service: 'Feed water to drum',
      characteristic: 'equal percentage',
      ratedCoefficient: 126,
      coefficientUnit: 'Kv',
      rangeability: 50,
      criticality: 'high',
      designCases: [],
      ...of.dataSheet,
    },
    signals: { position: { tag: 'FV-2101.ZT', unit: '%' }, ...of.signals },
  });
}

const notJudged = { judged: false as const, reason: 'Sampled too slowly (every 60 s).' };

export function anAssessment(of: Partial<StoredAssessment['result']> = {}): StoredAssessment {
  return storedAssessment.parse({
    id: '2c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c2001',
    runNumber: 12,
    assessedAt: '2026-11-30T01:10:00.000Z',
    result: {
      tag: 'FV-2101',
      methodVersion: '1',
      window: {
        from: '2026-10-01T00:00:00.000Z',
        to: '2026-11-30T00:00:00.000Z',
        samplesSeen: 86_400,
        samplesUsed: 80_123,
        runningDays: 58,
        step: 60,
        steadyWindows: 1_204,
        periods: 310,
        leftOut: { 'not steady': 412, bad: 0 },
      },
      travelSource: 'position',
      basis: 'inherent',
      pressureDrop: 'measured',
      judged: true,
      reason: null,
      lag: { seconds: 12, identified: true },
      resolution: { travel: 0.1, flow: null },
      characteristic: sampleCharacteristic,
      deviation: sampleDeviation,
      range: sampleRange,
      gain: sampleGain,
      movement: {
        ...sampleMovement,
        demandToPosition: sampleSplit,
        positionToFlow: notJudged,
        demandToFlow: notJudged,
        jumps: notJudged,
        oscillation: null,
        mismatch: notJudged,
      },
      drift: sampleDrift,
      passing: null,
      service: null,
      findings: [
        {
          kind: 'Lost capacity',
          severity: 0.7,
          confidence: 0.9,
          text: 'Lost capacity: passes 19 % less than the data sheet at the same travel',
          nextStep: 'Check strainer, fouling and the flow meter; then plan an inspection.',
          doubts: ['Flow meter or density in error.'],
          explainedBy: null,
          rule: 'sheet',
          x: 0.21,
          raise: 0.105,
          actNow: 0.35,
          standardError: 0.02,
          evidence: { capacityRatio: 0.81 },
        },
      ],
      notJudged: [{ kind: 'Sticking', reason: 'Sampled too slowly (every 60 s).' }],
      warnings: [],
      attention: 54,
      attentionTerms: [{ kind: 'Lost capacity', weight: 0.85, severity: 0.7, confidence: 0.9 }],
      ...of,
    },
  });
}

const rowOf = ({ id, runNumber, assessedAt, result }: StoredAssessment) => ({
  id,
  runNumber,
  assessedAt,
  judged: result.judged,
  attention: result.attention,
});

/** The plant answers for one valve and its assessments, the newest first. */
export function withValve(known: Valve, assessments: readonly StoredAssessment[]): void {
  const [newest] = assessments;
  const missing = new HttpResponse(null, { status: 404 });
  plantServer.use(
    http.get(`/api/valves/${known.tag}`, () => HttpResponse.json(known)),
    http.get(`/api/valves/${known.tag}/assessments`, () =>
      HttpResponse.json({ rows: assessments.map(rowOf), total: assessments.length }),
    ),
    http.get(`/api/valves/${known.tag}/assessment`, () => (newest ? HttpResponse.json(newest) : missing)),
    http.get(`/api/valves/${known.tag}/findings`, () => HttpResponse.json({ rows: [], total: 0 })),
    http.get('/api/assessments/:id', ({ params }) => {
      const wanted = assessments.find(({ id }) => id === params.id);
      return wanted ? HttpResponse.json(wanted) : missing;
    }),
  );
}
