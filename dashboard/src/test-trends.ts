import { trendFile, trendLook, type TrendFile, type TrendLook } from '@tailrace/shared/contracts/trends';
import { water } from './test-plant';

/** An invented trend file and the look at its first rows, held to the contracts. */

export const aTrendFileId = '3c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c3001';
const valveId = '1c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c1001';

const plan: TrendLook['plan'] = {
  form: 'wide',
  delimiter: ';',
  decimalMark: ',',
  headerLine: 1,
  time: { column: 'Time', format: 'day first', zone: 'Europe/Zurich' },
  long: null,
  uncertainIsGood: false,
};

export function aTrendFile(of: Partial<TrendFile> = {}): TrendFile {
  return trendFile.parse({
    id: aTrendFileId,
    number: 5,
    name: 'week-48.csv',
    size: 1_240_000,
    sha256: 'ab'.repeat(32),
    area: water,
    receivedBy: 'Ida Brunner',
    receivedAt: '2026-11-30T08:00:00.000Z',
    state: 'received',
    progress: { share: 0, rows: 0 },
    plan: null,
    report: null,
    refusal: null,
    ...of,
  });
}

export function aLook(of: Partial<TrendLook> = {}): TrendLook {
  return trendLook.parse({
    plan,
    header: ['Time', 'FV-2101.ZT [%]', 'XX-1'],
    rows: [
      ['30.11.2026 08:00', '47,2', '1'],
      ['31.11.2026 08:01', '47,3', '1'],
    ],
    times: [
      { instant: '2026-11-30T07:00:00.000Z', problem: null },
      { instant: null, problem: 'There is no 31 November.' },
    ],
    tags: [
      {
        historianTag: 'FV-2101.ZT',
        unit: '%',
        examples: ['47,2', '47,3'],
        bound: [],
        proposal: { valveId, valveTag: 'FV-2101', role: 'position' },
      },
      { historianTag: 'XX-1', unit: null, examples: ['1'], bound: [], proposal: null },
    ],
    doubts: ['Day and month cannot be told apart in the first rows.'],
    ...of,
  });
}
