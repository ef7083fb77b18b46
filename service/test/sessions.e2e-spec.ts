import { JwtService } from '@nestjs/jwt';
import { me, type Session, session } from '@tailrace/shared/contracts/people';
import { problem } from '@tailrace/shared/contracts/problems';
import { type Response } from 'supertest';
import { DataSource } from 'typeorm';
import { AuditService } from '../src/audit/audit.service.js';
import { AuditEntryEntity } from '../src/audit/audit-entry.entity.js';
import { PersonEntity } from '../src/people/person.entity.js';
import { RefreshSessionEntity } from '../src/people/refresh-session.entity.js';
import { aService, password, type Service } from './a-service.js';

const days = 86_400_000;

describe('sessions', () => {
  let service: Service;
  let email: string;

  beforeEach(async () => {
    service = await aService();
    email = (await service.signIn('engineer', null)).email;
  });
  afterEach(() => service.close());

  const enter = (given: object = {}) => service.send('POST', '/api/session', { email, password, ...given });
  const refresh = (cookie: string) => service.send('POST', '/api/session/refresh').set('Cookie', cookie);
  const opened = (answer: Response): { cookie: string; line: string; session: Session } => {
    const line = String(answer.get('Set-Cookie')?.[0]);
    return { line, cookie: line.split(';')[0] ?? '', session: session.parse(answer.body) };
  };
  const asks = (token: string) => service.send('GET', '/api/me').set('Authorization', `Bearer ${token}`);

  it('open with e-mail and password and say who is signed in', async () => {
    const { session } = opened(await enter({ email: email.toUpperCase() }).expect(200));
    expect(session).toMatchObject({ expiresIn: 600, me: { email, role: 'engineer' } });
    expect(me.parse((await asks(session.accessToken).expect(200)).body)).toEqual(session.me);
  });

  it('keep the refresh token out of reach of scripts and of other sites', async () => {
    const answer = await enter().expect(200);
    const { line, cookie } = opened(answer);
    expect(line).toMatch(/; Path=\/api\/session;/);
    expect(line).toMatch(/; HttpOnly; SameSite=Strict$/);
    expect(answer.text).not.toContain(cookie.split('=')[1]);
  });

  it('never keep a token or a password as it is', async () => {
    const { cookie } = opened(await enter().expect(200));
    const database = service.app.get(DataSource);
    const rows = JSON.stringify([
      await database.query('SELECT * FROM refresh_sessions'),
      await database.query('SELECT * FROM people'),
      await database.query('SELECT * FROM audit_entries'),
    ]);
    expect(rows).not.toContain(cookie.split('=')[1]);
    expect(rows).not.toContain(password);
    expect(rows).toContain('$argon2id$');
  });

  it('refuse a wrong password and an unknown address in the same words', async () => {
    const wrong = problem.parse((await enter({ password: 'not the one' }).expect(401)).body);
    const unknown = problem.parse((await enter({ email: 'nobody@plant.example' }).expect(401)).body);
    expect({ ...wrong, instance: '' }).toEqual({ ...unknown, instance: '' });
    expect(wrong.type).toBe('/problems/sign-in-failed');
  });

  it('say which field of a sign-in is missing', async () => {
    const refused = await service.send('POST', '/api/session', { email: 'no address' }).expect(400);
    const pointers = problem.parse(refused.body).errors?.map(({ pointer }) => pointer);
    expect(pointers).toEqual(['/email', '/password']);
  });

  it('go on with a new refresh token at each use', async () => {
    const first = opened(await enter().expect(200));
    const second = opened(await refresh(first.cookie).expect(200));
    expect(second.cookie).not.toBe(first.cookie);
    await asks(second.session.accessToken).expect(200);
    await refresh(second.cookie).expect(200);
  });

  it('end for everybody who holds one of its tokens when a spent one comes back', async () => {
    const first = opened(await enter().expect(200));
    const second = opened(await refresh(first.cookie).expect(200));
    const reused = await refresh(first.cookie).expect(401);
    expect(problem.parse(reused.body).type).toBe('/problems/session-ended');
    await refresh(second.cookie).expect(401);
    await asks(second.session.accessToken).expect(401);
    const [noted] = await service.app
      .get(DataSource)
      .getRepository(AuditEntryEntity)
      .findBy({ action: 'session ended: a spent token came back' });
    expect(noted?.subjectId).toBe(first.session.me.id);
  });

  it('leave the person’s other sessions alone when one ends', async () => {
    const here = opened(await enter().expect(200));
    const there = opened(await enter().expect(200));
    await service.send('DELETE', '/api/session').set('Cookie', here.cookie).expect(204);
    await asks(here.session.accessToken).expect(401);
    await asks(there.session.accessToken).expect(200);
  });

  it('end at sign-out: neither token opens anything afterwards', async () => {
    const { cookie, session } = opened(await enter().expect(200));
    const left = await service.send('DELETE', '/api/session').set('Cookie', cookie).expect(204);
    expect(left.get('Set-Cookie')?.[0]).toMatch(/^tailrace_refresh=;/);
    await refresh(cookie).expect(401);
    await asks(session.accessToken).expect(401);
  });

  it('end when nobody comes back for two weeks', async () => {
    const { cookie } = opened(await enter().expect(200));
    service.later(13 * days);
    const { cookie: next } = opened(await refresh(cookie).expect(200));
    service.later(15 * days);
    await refresh(next).expect(401);
  });

  it('cannot be refreshed without the cookie, or with an invented one', async () => {
    await service.send('POST', '/api/session/refresh').expect(401);
    await refresh('tailrace_refresh=invented').expect(401);
  });

  it('end at once for a person who is put out', async () => {
    const { cookie, session } = opened(await enter().expect(200));
    await service.app.get(DataSource).getRepository(PersonEntity).update({ email }, { active: false });
    await asks(session.accessToken).expect(401);
    await refresh(cookie).expect(401);
    await enter().expect(401);
  });

  it('carry a change of role from the next request on', async () => {
    const { session } = opened(await enter().expect(200));
    const adds = () =>
      service
        .send('POST', '/api/areas', { code: 'X', name: 'X' })
        .set('Authorization', `Bearer ${session.accessToken}`);
    await adds().expect(403);
    await service.app.get(DataSource).getRepository(PersonEntity).update({ email }, { role: 'admin' });
    await adds().expect(201);
  });

  it('refuse an access token that is past its ten minutes, unsigned, or signed by somebody else', async () => {
    const { session } = opened(await enter().expect(200));
    const sessions = service.app.get(DataSource).getRepository(RefreshSessionEntity);
    const { family } = await sessions.findOneByOrFail({ personId: session.me.id });
    const claims = { sub: session.me.id, family };
    const jwt = service.app.get(JwtService, { strict: false });
    await asks(jwt.sign(claims)).expect(200);
    await asks(jwt.sign(claims, { expiresIn: -1 })).expect(401);
    await asks(jwt.sign(claims, { secret: 'another secret, as long as it has to be' })).expect(401);
    const part = (value: object) => Buffer.from(JSON.stringify(value)).toString('base64url');
    await asks(`${part({ alg: 'none', typ: 'JWT' })}.${part(claims)}.`).expect(401);
  });

  it('rest for a quarter of an hour after eight wrong passwords, even for the right one', async () => {
    for (let tries = 0; tries < 8; tries += 1) await enter({ password: 'not the one' }).expect(401);
    const rests = await enter().expect(429);
    expect(problem.parse(rests.body).type).toBe('/problems/too-many-requests');
    service.later(16 * 60_000);
    await enter().expect(200);
  });

  it('slow down an address that tries many people', async () => {
    let answered = 0;
    for (let person = 0; person < 70 && answered !== 429; person += 1)
      answered = (await service.send('POST', '/api/session', {})).status;
    expect(answered).toBe(429);
  });

  it('leave a chain of audit entries that nobody can change unnoticed', async () => {
    await enter().expect(200);
    const { manager } = service.app.get(DataSource);
    const audit = service.app.get(AuditService);
    expect(await audit.firstBroken(manager)).toBeNull();
    const overwrite = () => manager.query("UPDATE audit_entries SET actorName = 'nobody' WHERE number = 2");
    await expect(overwrite()).rejects.toThrow('audit entries are never changed');
    await expect(manager.query('DELETE FROM audit_entries')).rejects.toThrow('never changed');
    await manager.query('DROP TRIGGER audit_entries_no_update');
    await overwrite();
    expect(await audit.firstBroken(manager)).toBe(2);
  });
});
