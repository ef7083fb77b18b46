import { session } from '@tailrace/shared/contracts/people';
import { type ChildProcess, spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { request } from 'node:http';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { fileURLToPath } from 'node:url';

const main = fileURLToPath(new URL('../dist/main.js', import.meta.url));
const admin = { email: 'first@plant.example', password: 'long enough' };

/** The built service as a process of its own, with its administrator signed in. */
export interface ServiceProcess {
  call(method: string, path: string, body?: object): Promise<unknown>;
  /** Sends a trend file as it is made, as fast as the service takes it. */
  upload(areaId: string, file: Iterable<string>): Promise<unknown>;
  /** Peak resident memory so far, MB (Linux). */
  peakMemory(): number;
  end(signal: 'SIGTERM' | 'SIGKILL'): Promise<void>;
}

export async function aProcess(dataDir: string): Promise<ServiceProcess> {
  const child = spawn(process.execPath, [main], {
    env: {
      PATH: process.env.PATH,
      LOG_LEVEL: 'silent',
      PORT: '0',
      DATA_DIR: dataDir,
      ADMIN_EMAIL: admin.email,
      ADMIN_PASSWORD: admin.password,
    },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const url = await addressOf(child);
  let token = '';
  const call: ServiceProcess['call'] = async (method, path, body) => {
    const answer = await fetch(`${url}${path}`, {
      method,
      headers: { 'Content-Type': 'application/json', Authorization: `Bearer ${token}` },
      ...(body && { body: JSON.stringify(body) }),
    });
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${text}`);
    return JSON.parse(text) as unknown;
  };
  token = session.parse(await call('POST', '/api/session', admin)).accessToken;
  return {
    call,
    upload: (areaId, file) => upload(`${url}/api/trends`, token, areaId, file),
    peakMemory() {
      const [, kilobytes] = /VmHWM:\s+(\d+) kB/.exec(readFileSync(`/proc/${child.pid}/status`, 'utf8')) ?? [];
      return Number(kilobytes) / 1024;
    },
    async end(signal) {
      const closed = new Promise((resolve) => child.once('close', resolve));
      child.kill(signal);
      await closed;
    },
  };
}

function addressOf(child: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let said = '';
    child.once('close', () => reject(new Error(`the service ended: ${said}`)));
    child.stdout?.on('data', (chunk: Buffer) => {
      said += chunk.toString();
      const [, port] = /http:\/\/localhost:(\d+)/.exec(said) ?? [];
      if (port) resolve(`http://127.0.0.1:${port}`);
    });
  });
}

async function upload(url: string, token: string, areaId: string, file: Iterable<string>): Promise<unknown> {
  const mark = 'end-of-this-part';
  const sending = request(url, {
    method: 'POST',
    headers: {
      Authorization: `Bearer ${token}`,
      'Content-Type': `multipart/form-data; boundary=${mark}`,
    },
  });
  const answered = new Promise<string>((resolve, reject) => {
    sending.once('error', reject);
    sending.once('response', (response) => {
      let text = '';
      response.on('data', (chunk: Buffer) => (text += chunk.toString()));
      response.once('end', () => resolve(text));
    });
  });
  function* form() {
    yield `--${mark}\r\nContent-Disposition: form-data; name="areaId"\r\n\r\n${areaId}\r\n`;
    yield `--${mark}\r\nContent-Disposition: form-data; name="file"; filename="year.csv"\r\n\r\n`;
    yield* file;
    yield `\r\n--${mark}--\r\n`;
  }
  await pipeline(Readable.from(form()), sending);
  return JSON.parse(await answered) as unknown;
}
