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

/** Where it says it is, once it does; what it said where it ends before that. */
async function address(child: ChildProcess, said: () => string): Promise<string> {
  for (;;) {
    const [url] = /http:\/\/localhost:\d+/.exec(said()) ?? [];
    if (url) return url;
    if (child.exitCode !== null) throw new Error(said());
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

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
    const url = await address(child, said);
    expect(said()).toContain('first@plant.example can sign in');
    expect((await fetch(`${url}/api/health`)).status).toBe(200);
    child.kill('SIGTERM');
    await closed;
    // SQLite removes its log when the last connection closes cleanly.
    expect(existsSync(join(folder, 'tailrace.db'))).toBe(true);
    expect(existsSync(join(folder, 'tailrace.db-wal'))).toBe(false);
  });

  it('logs each request with its id, and nothing that opens a session', async () => {
    const account = { email: 'first@plant.example', password: 'long enough' };
    const { child, said } = start({
      DATA_DIR: folder,
      LOG_LEVEL: 'trace',
      ADMIN_EMAIL: account.email,
      ADMIN_PASSWORD: account.password,
    });
    const closed = ended(child);
    const url = await address(child, said);
    const json = { 'Content-Type': 'application/json' };
    const opened = await fetch(`${url}/api/session`, {
      method: 'POST',
      headers: json,
      body: JSON.stringify(account),
    });
    const { accessToken } = (await opened.json()) as { accessToken: string };
    const cookie = opened.headers.get('set-cookie')?.split(';')[0] ?? '';
    const headers = { Authorization: `Bearer ${accessToken}` };
    const asked = await fetch(`${url}/api/me`, { headers });
    await fetch(`${url}/api/session/refresh`, { method: 'POST', headers: { Cookie: cookie } });
    child.kill('SIGTERM');
    await closed;
    expect(said()).toContain(asked.headers.get('x-request-id'));
    for (const secret of [account.password, accessToken, cookie.split('=')[1]])
      expect(said()).not.toContain(secret);
  });
});
