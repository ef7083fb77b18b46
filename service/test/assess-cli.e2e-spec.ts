import { type PresentedAssessment, presentedAssessment } from '@tailrace/shared/contracts/assessments';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';

const command = fileURLToPath(new URL('../dist/cli/assess.js', import.meta.url));
const dataset = (name: string) =>
  fileURLToPath(new URL(`../../shared/reference/open-datasets/${name}.csv`, import.meta.url));
const rig = dataset('rig_gaslift_ssrto_1');

describe('assess on the command line', () => {
  let folder: string;
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'tailrace-cli-'));
  });
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  const file = (name: string, content: string | Buffer | object): string => {
    const path = join(folder, name);
    const plain = typeof content === 'string' || Buffer.isBuffer(content);
    writeFileSync(path, plain ? content : JSON.stringify(content));
    return path;
  };
  const run = (...args: string[]) => spawnSync(process.execPath, [command, ...args], { encoding: 'utf8' });
  const valveOf = (demand: string, flow: string, more: object = {}) =>
    file(`${demand}.json`, {
      tag: demand,
      dataSheet: { characteristic: null, ratedCoefficient: null },
      signals: { demand: { tag: demand, unit: '%' }, flow: { tag: flow } },
      ...more,
    });
  const assessed = (trends: readonly string[], valve: string, ...more: string[]): PresentedAssessment => {
    const { status, stdout, stderr } = run('--trends', ...trends, '--valve', valve, ...more);
    expect({ status, stderr }).toMatchObject({ status: 0 });
    return presentedAssessment.parse(JSON.parse(stdout));
  };
  const refused = (...args: string[]): string => {
    const { status, stdout, stderr } = run(...args);
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' });
    return stderr;
  };

  it('prints one assessment with every promised key, and nothing else', () => {
    const { status, stdout, stderr } = run('--trends', rig, '--valve', valveOf('CV101.POS', 'FI101.PV'));
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
    const printed = JSON.parse(stdout) as Record<string, object>;
    const keys =
      'tag window basis judged reason characteristic deviation range gain movement drift service findings attention';
    expect(Object.keys(printed)).toEqual(expect.arrayContaining(keys.split(' ')));
    expect(Object.keys(printed.characteristic ?? {})).toEqual(
      expect.arrayContaining(['kind', 'ratedCoefficient', 'rangeability', 'percentStep', 'span', 'points']),
    );
    expect(Object.keys(printed.range ?? {})).toEqual(
      expect.arrayContaining(['p5', 'p50', 'p95', 'belowLow', 'aboveHigh', 'atSeat', 'atOpen']),
    );
    expect(printed.window).toMatchObject({ from: '2021-03-03T10:00:00.000Z', samplesSeen: 2 * 1183 });
    expect(printed.travelSource).toBe('demand');
  });

  // The makers of the data: shared/reference/README.md.
  it.each([
    ['rig_gaslift_ssrto_1', 'CV102.POS', 'FI102.PV', 'stood still'],
    ['tep_idv01_ac_ratio', 'XMV07', 'XMEAS14', 'does not follow'],
    ['tep_idv02_b_composition', 'XMV04', 'XMEAS04', 'too little'],
  ])('ends well for a valve that cannot be judged: %s %s', (name, demand, flow, reason) => {
    const result = assessed([dataset(name)], valveOf(demand, flow));
    expect(result).toMatchObject({ judged: false, characteristic: null });
    expect(result.reason).toContain(reason);
  });

  it.each(['107', '108', '109'])('finds CV%s of the rig wide open for the whole record', (n) => {
    const result = assessed([rig], valveOf(`CV${n}.POS`, `FI10${Number(n) - 106}.PV`));
    expect(result.findings.map(({ kind }) => kind)).toEqual(['Pinned at limit']);
    expect(result.range?.atOpen).toBe(1);
  });

  it('reads a gzip, and several files of the same tags, as the one file they came from', () => {
    const whole = readFileSync(rig, 'utf8');
    const [head = '', ...rows] = whole.trim().split('\n');
    const part = (name: string, from: number, to: number) =>
      file(name, [head, ...rows.slice(from, to)].join('\n'));
    const valve = valveOf('CV101.POS', 'FI101.PV');
    const one = assessed([rig], valve);
    expect(assessed([file('rig.csv.gz', gzipSync(whole))], valve)).toEqual(one);
    expect(assessed([part('late.csv', 500, 1183), part('early.csv', 0, 600)], valve)).toEqual(one);
  });

  it('looks at the window asked for, without its end', () => {
    const window = ['--from', '2021-03-03T10:05:00Z', '--to', '2021-03-03T10:15:00+00:00'];
    const result = assessed([rig], valveOf('CV101.POS', 'FI101.PV'), ...window);
    expect(result.window).toMatchObject({
      from: '2021-03-03T10:05:00.000Z',
      to: '2021-03-03T10:15:00.000Z',
      samplesSeen: 2 * 600,
    });
  });

  it('says of a window beside the record that it holds nothing', () => {
    const result = assessed([rig], valveOf('CV101.POS', 'FI101.PV'), '--from', '2030-01-01');
    expect(result.judged).toBe(false);
    expect(result.window.samplesSeen).toBe(0);
  });

  it('lays a partial plan over the guessed one, and matches tags with units behind them', () => {
    const rows = Array.from({ length: 300 }, (_, i) => {
      const minute = new Date(Date.UTC(2026, 2, 1, 0, i)).toISOString().slice(0, 19);
      return `${minute},${30 + 20 * Math.sin(i / 20)}`;
    });
    const trends = file('local.csv', ['time,V-1 [%]', ...rows].join('\n'));
    const valve = file('v1.json', {
      tag: 'V-1',
      dataSheet: {},
      signals: { position: { tag: 'V-1', unit: '%' } },
      columnPlan: { time: { zone: 'Europe/Vienna' } },
    });
    const { window, travelSource } = assessed([trends], valve);
    expect(window.from).toBe('2026-02-28T23:00:00.000Z');
    expect(travelSource).toBe('position');
  });

  it('takes the unit of a column for a signal that names none', () => {
    const rows = Array.from(
      { length: 300 },
      (_, i) => `${1_772_323_200 + 60 * i},${(i % 60) + 20},${i % 60}`,
    );
    const withUnits = (flow: string) =>
      assessed(
        [file('units.csv', [`time,V-2,${flow}`, ...rows].join('\n'))],
        file('v2.json', {
          tag: 'V-2',
          dataSheet: {},
          signals: { position: { tag: 'V-2', unit: '%' }, flow: { tag: 'F-2' } },
        }),
      ).warnings.filter((line) => line.includes('/signals/flow'));
    expect(withUnits('F-2 [m3/h]')).toEqual([]);
    expect(withUnits('F-2 (west)')).toHaveLength(1);
  });

  it('judges by the limits given', () => {
    const valve = valveOf('XMV09', 'XMEAS19');
    const pinned = (...more: string[]) =>
      assessed([dataset('tep_idv01_ac_ratio')], valve, ...more).findings.map(({ kind }) => kind);
    const limits = file('limits.json', {
      findings: { kinds: { 'Pinned at limit': { raise: 0.5, actNow: 0.9 } } },
    });
    expect(pinned()).toContain('Pinned at limit');
    expect(pinned('--limits', limits)).not.toContain('Pinned at limit');
  });

  it('refuses a command line it does not understand', () => {
    const valve = valveOf('CV101.POS', 'FI101.PV');
    const good = ['--trends', rig, '--valve', valve];
    expect(refused('--trend', rig)).toContain('--trend');
    expect(refused('--trends', rig)).toContain('--valve is missing');
    expect(refused('--valve', valve)).toContain('--trends is missing');
    expect(refused(...good, '--valve', valve)).toContain('twice');
    expect(refused(...good, 'stray.csv')).toContain('stray.csv');
    expect(refused(...good, '--from', 'yesterday')).toContain('yesterday');
    expect(refused(...good, '--from', '2021-03-04', '--to', '2021-03-03')).toContain('not before');
  });

  it('names each field of a valve that is not right', () => {
    const valve = file('odd.json', {
      tag: 'V 1',
      dataSheet: { ratedCoefficient: -1, characteristic: 'straight' },
      signals: { positon: { tag: 'a' } },
      columnPlan: { time: { format: 'roman' }, columns: 3 },
    });
    const said = refused('--trends', rig, '--valve', valve);
    for (const pointer of [
      '/tag',
      '/dataSheet/ratedCoefficient',
      '/dataSheet/characteristic',
      '/signals',
      '/columnPlan/time/format',
      '/columnPlan',
    ])
      expect(said).toContain(`  ${pointer}: `);
    expect(refused('--trends', rig, '--valve', file('broken.json', '{"tag":'))).toContain('not valid JSON');
    expect(refused('--trends', rig, '--valve', join(folder, 'gone.json'))).toContain('cannot be read');
  });

  it('says which unit of the valve cannot be used', () => {
    const valve = file('unit.json', {
      tag: 'CV101.POS',
      dataSheet: {},
      signals: { demand: { tag: 'CV101.POS', unit: '%' }, flow: { tag: 'FI101.PV', unit: 'furlong' } },
    });
    expect(refused('--trends', rig, '--valve', valve)).toContain('furlong');
  });

  it('refuses a limit that does not exist', () => {
    const limits = file('odd-limits.json', { findings: { kindz: {} } });
    const valve = valveOf('CV101.POS', 'FI101.PV');
    expect(refused('--trends', rig, '--valve', valve, '--limits', limits)).toContain('findings.kindz');
  });

  it('names the file that cannot be used and why', () => {
    const valve = valveOf('CV101.POS', 'FI101.PV');
    const because = (path: string) => refused('--trends', path, '--valve', valve);
    const [head = '', ...rows] = readFileSync(rig, 'utf8').trim().split('\n');
    expect(because(join(folder, 'gone.csv'))).toContain('gone.csv cannot be read');
    expect(because(folder)).toContain('is not a file');
    expect(because(file('empty.csv', ''))).toContain('empty.csv: The file is empty');
    expect(because(file('head.csv', head))).toContain('no rows below');
    expect(because(file('back.csv', [head, rows[5], rows[6], rows[2]].join('\n')))).toContain('goes back');
    expect(because(file('cut.gz', gzipSync(rows.join('\n')).subarray(0, 500)))).toContain('gzip');
    expect(because(dataset('tep_idv01_ac_ratio'))).toContain('No travel can be read: “CV101.POS”');
  });
});
