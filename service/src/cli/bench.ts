import { parse } from 'csv-parse';
import { createReadStream, createWriteStream, mkdtempSync, rmSync, statSync } from 'node:fs';
import { once } from 'node:events';
import { cpus, tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { guessFile } from '../trends/reading/look.js';
import { readTrend } from '../trends/reading/read-trend.js';
import { blocksOf, blockSize } from '../trends/store/sample-block.js';

/**
 * Measures the way of a wide trend file into encoded blocks beside csv-parse reading the same file to arrays, in
 * turns and in one run, because the machine's speed drifts more than their ratio.
 */

const rows = Number(process.env.BENCH_ROWS ?? 200_000);
const tags = 12;
const turns = 3;

/** Plain numeric text with a few bad and missing values, the same at each call. */
async function writeWide(path: string): Promise<void> {
  const out = createWriteStream(path);
  const names = Array.from({ length: tags }, (_, i) => `FT-${101 + i} [m3/h]`);
  out.write(`timestamp,${names.join(',')}\n`);
  const start = Date.UTC(2026, 0, 1);
  let state = 12_345;
  const next = () => (state = (state * 48_271) % 2_147_483_647);
  for (let i = 0; i < rows; i++) {
    const cells = names.map((_, k) => {
      const draw = next() % 2_000;
      if (draw === 0) return 'Bad';
      return draw === 1 ? '' : (50 + 20 * Math.sin(i / (400 + 37 * k)) + (next() % 1000) / 2000).toFixed(3);
    });
    const line = `${new Date(start + 10_000 * i).toISOString()},${cells.join(',')}\n`;
    if (!out.write(line)) await once(out, 'drain');
  }
  out.end();
  await once(out, 'finish');
}

async function cpuMs(work: () => Promise<void>): Promise<number> {
  const before = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

const median = (values: number[]) => values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

async function run(): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'tailrace-bench-'));
  const path = join(folder, 'wide.csv');
  try {
    await writeWide(path);
    const { plan } = await guessFile(path, 'UTC');
    let samples = 0;
    let bytes = 0;
    const ours = () =>
      cpuMs(async () => {
        samples = 0;
        bytes = 0;
        await readTrend({
          path,
          plan,
          batch: blockSize,
          wanted: () => true,
          onSamples: (_, series) => {
            samples += series.time.length;
            for (const block of blocksOf(series)) bytes += block.bytes.length;
          },
        });
      });
    const theirs = () =>
      cpuMs(async () => {
        let cells = 0;
        await pipeline(createReadStream(path), parse(), async (records) => {
          for await (const record of records as AsyncIterable<string[]>) cells += record.length;
        });
        if (cells !== (rows + 1) * (tags + 1)) throw new Error('csv-parse read another file');
      });
    await ours();
    const ratios: number[] = [];
    const own: number[] = [];
    for (let turn = 0; turn < turns; turn++) {
      const mine = await ours();
      own.push(mine);
      ratios.push(mine / (await theirs()));
    }
    console.log(
      `${cpus()[0]?.model ?? 'unknown processor'}, ${cpus().length} cores, Node ${process.version}`,
    );
    console.log(
      `wide file: ${rows} rows × ${tags} tags, ${(statSync(path).size / 1e6).toFixed(0)} MB, ${samples} samples`,
    );
    console.log(
      `read and encoded: ${median(own).toFixed(0)} ms CPU, ${(samples / median(own) / 1000).toFixed(2)} million samples/s`,
    );
    console.log(
      `against csv-parse to arrays alone: ${median(ratios).toFixed(2)} × its CPU time (lower is better)`,
    );
    console.log(`encoded: ${(bytes / samples).toFixed(2)} bytes a sample`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

await run();
