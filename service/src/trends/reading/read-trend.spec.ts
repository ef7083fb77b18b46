import { type ColumnPlan } from '@tailrace/shared/contracts/trends';
import { type Series } from '@tailrace/shared/core/series';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { guessFile, lookAt } from './look.js';
import { readTrend } from './read-trend.js';
import { Refusal } from './refusal.js';

const folder = mkdtempSync(join(tmpdir(), 'tailrace-reading-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let files = 0;
const aFile = (content: string | Buffer): string => {
  const path = join(folder, `trend-${files++}.csv`);
  writeFileSync(path, content);
  return path;
};

async function read(content: string | Buffer, plan?: Partial<ColumnPlan>, zone = 'UTC', batch = 4) {
  const path = aFile(content);
  const guessed = await guessFile(path, zone);
  const tags = new Map<string, Series[]>();
  const report = await readTrend({
    path,
    plan: { ...guessed.plan, ...plan },
    wanted: () => true,
    onSamples: (tag, series) => void tags.set(tag, [...(tags.get(tag) ?? []), series]),
    batch,
  });
  const values = (tag: string) => (tags.get(tag) ?? []).flatMap((series) => [...series.value]);
  const times = (tag: string) => (tags.get(tag) ?? []).flatMap((series) => [...series.time]);
  const good = (tag: string) => (tags.get(tag) ?? []).flatMap((series) => [...series.good]);
  return { report, values, times, good, guessed };
}

const refusalOf = async (content: string | Buffer, zone?: string, batch?: number) => {
  const error: unknown = await read(content, {}, zone, batch).then(
    () => null,
    (thrown: unknown) => thrown,
  );
  expect(error).toBeInstanceOf(Refusal);
  return error as Refusal;
};

const wide =
  'timestamp,FT-1 [m3/h],ZT-1\n2026-01-01T00:00:00Z,10.5,40\n2026-01-01T00:00:10Z,,41\n2026-01-01T00:00:20Z,11,Bad\n';

describe('reading a trend file', () => {
  it('takes an empty cell of a wide file as no sample, and a word as a bad one', async () => {
    const { values, times, good, report } = await read(wide);
    const start = Date.parse('2026-01-01T00:00:00Z') / 1000;
    expect(values('FT-1')).toEqual([10.5, 11]);
    expect(times('FT-1')).toEqual([start, start + 20]);
    expect(values('ZT-1')).toEqual([40, 41, NaN]);
    expect(good('ZT-1')).toEqual([1, 1, 0]);
    expect(report.samples).toBe(5);
    expect(report.badSamples).toBe(1);
  });

  it('reads the same from a gzip, with a byte-order mark and with carriage returns', async () => {
    const odd = gzipSync(Buffer.from(`\ufeff${wide.replaceAll('\n', '\r\n')}`));
    expect((await read(odd)).values('FT-1')).toEqual([10.5, 11]);
  });

  it('reads semicolons with decimal commas in local time', async () => {
    const { values, times, guessed } = await read(
      'Zeit;FT-1;ZT-1\n01.07.2026 12:00:00;10,5;40\n01.07.2026 12:00:10;10,75;40\n13.07.2026 12:00:00;11;40,5\n',
      {},
      'Europe/Vienna',
    );
    expect(guessed.plan).toMatchObject({ delimiter: ';', decimalMark: ',', time: { format: 'day first' } });
    expect(guessed.doubts.join()).toContain('Europe/Vienna');
    expect(values('FT-1')).toEqual([10.5, 10.75, 11]);
    expect(times('FT-1')[0]).toBe(Date.parse('2026-07-01T10:00:00Z') / 1000);
  });

  it('reads the long form with its quality column', async () => {
    const { values, good, guessed } = await read(
      'timestamp,tag,value,quality\n2026-01-01T00:00:00Z,FT-1,10,Good\n2026-01-01T00:00:00Z,ZT-1,40,Good\n2026-01-01T00:00:10Z,FT-1,12,Bad\n2026-01-01T00:00:20Z,FT-1,,Uncertain\n',
    );
    expect(guessed.plan.form).toBe('long');
    expect(values('FT-1')).toEqual([10, 12, NaN]);
    expect(good('FT-1')).toEqual([1, 0, 0]);
    expect(values('ZT-1')).toEqual([40]);
  });

  it('accepts a file with the newest row first', async () => {
    const { values } = await read(
      'time,A\n2026-01-01T00:00:20Z,3\n2026-01-01T00:00:10Z,2\n2026-01-01T00:00:00Z,1\n',
    );
    expect(values('A')).toEqual([1, 2, 3]);
  });

  it('keeps the good one of two samples at one time', async () => {
    const { values } = await read(
      'time,A\n2026-01-01T00:00:00Z,5\n2026-01-01T00:00:00Z,Bad\n2026-01-01T00:00:10Z,6\n',
    );
    expect(values('A')).toEqual([5, 6]);
  });

  it('reads both passes of the hour that the autumn clock change repeats', async () => {
    const rows = ['02:30:00', '02:59:00', '02:00:00', '02:30:00', '03:00:00'].map(
      (time, i) => `2026-10-25 ${time},${i}`,
    );
    const { times } = await read(`time,A\n${rows.join('\n')}\n`, {}, 'Europe/Vienna');
    const steps = times('A').map((t, i, all) => t - (all[i - 1] ?? t));
    expect(steps).toEqual([0, 1740, 60, 1800, 1800]);
  });

  it('puts all cells of one row at one time in the repeated hour, whichever cells stay empty', async () => {
    const rows = ['02:10:00,1,1', '02:50:00,2,', '02:10:00,3,', '02:50:00,4,4', '03:10:00,5,5'];
    const { times, values } = await read(
      `time,A,B\n${rows.map((row) => `2026-10-25 ${row}`).join('\n')}\n`,
      {},
      'Europe/Vienna',
    );
    expect(values('B')).toEqual([1, 4, 5]);
    const timeOfFour = times('A')[values('A').indexOf(4)];
    expect(timeOfFour).toBe(Date.parse('2026-10-25T01:50:00Z') / 1000);
    expect(times('B')[1]).toBe(timeOfFour);
  });

  it('counts what it rejects by reason, with line numbers', async () => {
    const { report } = await read(
      'time,A\n2026-01-01T00:00:00Z,1\nsoon,2\n2026-01-01T00:00:10Z,1.2.3\n2026-01-01T00:00:20Z,4\n',
    );
    expect(report.rejects).toEqual([
      { reason: 'time not understood', count: 1, firstLines: [3], example: 'soon' },
      { reason: 'value not a number', count: 1, firstLines: [4], example: '1.2.3' },
    ]);
  });

  it('finds the header below title lines', async () => {
    const { values } = await read(`Plant export\nfrom,to\n\n${wide}`);
    expect(values('FT-1')).toEqual([10.5, 11]);
  });

  it('shows the first rows as the plan understands them', async () => {
    const path = aFile(wide);
    const look = await lookAt(path, (await guessFile(path, 'UTC')).plan);
    expect(look.tags).toContainEqual({ historianTag: 'FT-1', unit: 'm3/h', examples: ['10.5', '11'] });
    expect(look.times[0]).toEqual({ instant: '2026-01-01T00:00:00.000Z', problem: null });
  });
});

describe('a trend file that cannot be used', () => {
  it.each<[string, string | Buffer, Refusal['reason']]>([
    ['is empty', '', 'empty'],
    ['holds blank lines alone', '\n\n\n', 'empty'],
    ['has a header only', 'timestamp,FT-1\n', 'headerOnly'],
    ['is prose', 'Dear all,\nplease find the trends attached.\nRegards\n', 'notATable'],
    ['is a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 1, 2, 3, 0, 0]), 'notText'],
    ['is in UTF-16', Buffer.from('\ufefftime,A\n', 'utf16le'), 'wideCharacters'],
    ['names a tag twice', 'time,A,A [%]\n2026-01-01T00:00:00Z,1,2\n', 'sameTagTwice'],
    [
      'goes back in time',
      'time,A\n2026-01-02T00:00:00Z,1\n2026-01-02T00:00:10Z,2\n2026-01-01T00:00:00Z,3\n',
      'timeGoesBack',
    ],
    [
      'goes back in time from the cells of one tag to those of another',
      'time,A,B\n2026-01-02T00:00:00Z,1,\n2026-01-02T00:00:10Z,2,\n2026-01-01T00:00:00Z,,3\n',
      'timeGoesBack',
    ],
    [
      'mixes decimal marks',
      'time;A\n2026-01-01T00:00:00Z;1,5\n2026-01-01T00:00:10Z;1,6\n2026-01-01T00:00:20Z;2.5\n',
      'mixedDecimalMarks',
    ],
    ['has only bad values', 'time,A\n2026-01-01T00:00:00Z,Bad\n2026-01-01T00:00:10Z,No Data\n', 'allBad'],
    [
      'is a gzip that ends in the middle',
      gzipSync(Buffer.from(wide.repeat(500))).subarray(0, 60),
      'gzipBroken',
    ],
    [
      'has a quote that is never closed',
      `time,A\n${'2026-01-01T00:00:00Z,1\n'.repeat(4_000)}2026-01-01T00:00:10Z,"${'9\n'.repeat(700_000)}`,
      'rowTooLong',
    ],
  ])('because it %s is refused with what to do', async (_, content, reason) => {
    const refusal = await refusalOf(content);
    expect(refusal.reason).toBe(reason);
    expect(refusal.message.length).toBeGreaterThan(40);
  });

  it('because a clock change was read in the wrong zone says so', async () => {
    const rows = ['02:30:00', '02:59:00', '02:00:00', '02:30:00', '03:00:00'].map(
      (t, i) => `2026-10-25 ${t},${i}`,
    );
    const refusal = await refusalOf(`time,A\n${rows.join('\n')}\n`, 'Asia/Tokyo');
    expect(refusal.reason).toBe('clockChange');
    expect(refusal.message).toContain('Asia/Tokyo');
  });

  it('because it is a gzip bomb stops long before it is unpacked', async () => {
    const row = '2026-01-01T00:00:00Z,1\n';
    const bomb = gzipSync(Buffer.concat([Buffer.from('time,A\n'), Buffer.alloc(64 * 1024 * 1024, row)]));
    expect((await refusalOf(bomb, 'UTC', 16_384)).reason).toBe('gzipBomb');
  });
});
