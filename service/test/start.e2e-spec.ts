import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const main = fileURLToPath(new URL('../dist/main.js', import.meta.url));

/** The built service as its own process. */
function start(env: Record<string, string>): { child: ChildProcess; said: () => string } {
  const child = spawn(process.execPath, [main], {
    env: { PATH: process.env.PATH, LOG_LEVEL: 'silent', PORT: '0', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let text = '';
  child.stdout?.on('data', (chunk: Buffer) => (text += chunk.toString()));
  child.stderr?.on('data', (chunk: Buffer) => (text += chunk.toString()));
  return { child, said: () => text };
}

const ended = (child: ChildProcess) =>
  new Promise<number | null>((resolve) => child.once('close', (code) => resolve(code)));

describe('a start of the service', () => {
  let folder: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'tailrace-start-'));
  });
  afterEach(() => rmSync(folder, { recursive: true, force: true }));

  it('is refused in words when a setting is not right', async () => {
    const { child, said } = start({ DATA_DIR: folder, PORT: 'many', DEMO: 'maybe' });
    expect(await ended(child)).toBe(1);
    expect(said()).toBe(
      'Tailrace cannot start; these settings are not right:\n' +
        '  PORT must be a whole number from 0 to 65535\n' +
        '  DEMO must be on or off\n',
    );
  });

  it('says where it is, and ends in order when told to', async () => {
    const { child, said } = start({
      DATA_DIR: folder,
      ADMIN_EMAIL: 'first@plant.example',
      ADMIN_PASSWORD: 'long enough',
    });
    const closed = ended(child);
    while (!said().includes('http://localhost:') && child.exitCode === null)
      await new Promise((resolve) => setTimeout(resolve, 50));
    const [url] = /http:\/\/localhost:\d+/.exec(said()) ?? [said()];
    expect(said()).toContain('first@plant.example can sign in');
    expect((await fetch(`${url}/api/health`)).status).toBe(200);
    child.kill('SIGTERM');
    await closed;
    // SQLite removes its log when the last connection closes cleanly.
    expect(existsSync(join(folder, 'tailrace.db'))).toBe(true);
    expect(existsSync(join(folder, 'tailrace.db-wal'))).toBe(false);
  });
});
