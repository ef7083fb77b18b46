import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The real service on a port and a data folder of its own, with the demo plant brought in. */
export interface Plant {
  readonly url: string;
  readonly log: () => string;
  stop(): Promise<void>;
}

const main = fileURLToPath(new URL('../../service/dist/main.js', import.meta.url));

async function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        address && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port')),
      );
    });
  });
}

export async function startPlant(env: Record<string, string> = {}): Promise<Plant> {
  const port = await freePort();
  const folder = mkdtempSync(join(tmpdir(), 'tailrace-e2e-'));
  let output = '';
  const child: ChildProcess = spawn(process.execPath, [main], {
    env: { ...process.env, DEMO: 'on', PORT: String(port), DATA_DIR: folder, LOG_LEVEL: 'warn', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  child.stdout?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  child.stderr?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  const url = `http://127.0.0.1:${port}`;
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const until = Date.now() + 150_000;
  for (;;) {
    if (child.exitCode !== null) throw new Error(`The service stopped before it answered:\n${output}`);
    if (Date.now() > until) throw new Error(`The service did not answer in time:\n${output}`);
    const answer = await fetch(`${url}/api/health`).catch(() => null);
    if (answer?.ok) break;
    await new Promise((resolve) => setTimeout(resolve, 300));
  }
  return {
    url,
    log: () => output,
    async stop() {
      child.kill('SIGTERM');
      await ended;
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
