import { type NestExpressApplication } from '@nestjs/platform-express';
import { area, type Area, person, session } from '@tailrace/shared/contracts/people';
import { type Role } from '@tailrace/shared/contracts/policy';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import request, { type Test } from 'supertest';
import { createApp } from '../src/create-app.js';
import { FirstStart } from '../src/operations/first-start.js';
import { Clock } from '../src/platform/clock.js';
import { readConfig } from '../src/platform/config.js';

export const password = 'a long enough password';
const adminEmail = 'first@plant.example';

/** A signed-in person at the API: requests of theirs carry their access token. */
export interface Client {
  readonly id: string;
  readonly email: string;
  readonly token: string;
  get(path: string): Test;
  post(path: string, body?: object): Test;
  put(path: string, body?: object): Test;
  delete(path: string): Test;
  send(method: string, path: string, body?: object): Test;
}

/** The real service on a database file of its own, with a site and one administrator of all areas. */
export interface Service {
  readonly app: NestExpressApplication;
  readonly url: string;
  readonly admin: Client;
  /** Sends a request without a token. */
  send(method: string, path: string, body?: object): Test;
  addArea(code: string): Promise<Area>;
  /** Adds a person of this role and signs them in; areas null: all of them. */
  signIn(role: Role, areas: readonly Area[] | null): Promise<Client>;
  /** Moves the service's clock; access tokens keep the real time. */
  later(ms: number): void;
  close(): Promise<void>;
}

export async function aService(env: Record<string, string> = {}): Promise<Service> {
  const folder = mkdtempSync(join(tmpdir(), 'tailrace-test-'));
  const config = readConfig({
    NODE_ENV: 'test',
    DATA_DIR: folder,
    LOG_LEVEL: 'silent',
    WORKERS: '1',
    ADMIN_EMAIL: adminEmail,
    ADMIN_PASSWORD: password,
    ...env,
  });
  const app = await createApp(config);
  await app.listen(0, '127.0.0.1');
  const url = await app.getUrl();
  let ahead = 0;
  app.get(Clock).now = () => Date.now() + ahead;
  await app.get(FirstStart).prepare(() => undefined);

  const send = (method: string, path: string, body?: object): Test => {
    const sent = new request.Test(url, method, path);
    return body === undefined ? sent : sent.send(body);
  };
  const enter = async (email: string): Promise<Client> => {
    const answer = await send('POST', '/api/session', { email, password }).expect(200);
    const { accessToken, me } = session.parse(answer.body);
    return clientOf(me.id, email, accessToken, send);
  };
  const admin = await enter(adminEmail);
  let people = 0;

  return {
    app,
    url,
    admin,
    send,
    async addArea(code) {
      const answer = await admin.post('/api/areas', { code, name: `Area ${code}` }).expect(201);
      return area.parse(answer.body);
    },
    async signIn(role, areas) {
      people += 1;
      const email = `${role}-${people}@plant.example`;
      const draft = { name: `${role} ${people}`, email, role, password };
      const areaIds = areas && areas.map(({ id }) => id);
      const answer = await admin.post('/api/people', { ...draft, areaIds }).expect(201);
      person.parse(answer.body);
      return enter(email);
    },
    later(ms) {
      ahead += ms;
    },
    async close() {
      await app.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

function clientOf(id: string, email: string, token: string, bare: Service['send']): Client {
  const send: Service['send'] = (method, path, body) =>
    bare(method, path, body).set('Authorization', `Bearer ${token}`);
  return {
    id,
    email,
    token,
    send,
    get: (path) => send('GET', path),
    post: (path, body) => send('POST', path, body),
    put: (path, body) => send('PUT', path, body),
    delete: (path) => send('DELETE', path),
  };
}
