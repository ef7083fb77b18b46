import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { InjectRepository } from '@nestjs/typeorm';
import { type SignInDraft } from '@tailrace/shared/contracts/people';
import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { DataSource, EntityManager, IsNull, Repository } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { Problem } from '../platform/problem.js';
import { passwordFits } from './passwords.js';
import { PersonEntity } from './person.entity.js';
import { RefreshSessionEntity } from './refresh-session.entity.js';
import { SignInTries } from './sign-in-tries.js';

/** s: short, because it cannot be taken back by itself */
export const accessSeconds = 600;
/** ms */
export const refreshLife = 14 * 86_400_000;

export interface OpenedSession {
  readonly person: PersonEntity;
  readonly accessToken: string;
  readonly refreshToken: string;
}

/** What the access token says; everything else is read fresh on each request. */
export interface AccessClaims {
  readonly sub: string;
  readonly family: string;
}

const hashed = (token: string) => createHash('sha256').update(token).digest('hex');

@Injectable()
export class SessionsService {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    @InjectRepository(PersonEntity) private readonly people: Repository<PersonEntity>,
    private readonly jwt: JwtService,
    private readonly audit: AuditService,
    private readonly tries: SignInTries,
    private readonly clock: Clock,
  ) {}

  async signIn({ email, password }: SignInDraft): Promise<OpenedSession> {
    if (this.tries.exhausted(email)) throw new Problem('too-many-requests');
    const person = await this.people
      .createQueryBuilder('person')
      .addSelect('person.passwordHash')
      .leftJoinAndSelect('person.areas', 'area')
      .where('person.email = :email AND person.active = 1', { email })
      .getOne();
    if (!(await passwordFits(person?.passwordHash ?? null, password)) || !person) {
      this.tries.failed(email);
      throw new Problem('sign-in-failed');
    }
    this.tries.succeeded(email);
    return this.transactions.run(async (manager) => {
      await this.audit.record(manager, person, {
        action: 'signed in',
        subjectType: 'person',
        subjectId: person.id,
      });
      return this.open(manager, person, randomUUID());
    });
  }

  /**
   * Spends a refresh token for the next one. A token that was spent before is in two hands: its whole family
   * ends, and whoever holds it signs in again.
   */
  async refresh(token: string): Promise<OpenedSession> {
    const outcome = await this.transactions.run(async (manager) => {
      const now = this.clock.now();
      const session = await manager.findOneBy(RefreshSessionEntity, { tokenHash: hashed(token) });
      if (!session || session.revokedAt !== null || session.expiresAt <= now) return null;
      const spent = await manager.update(
        RefreshSessionEntity,
        { id: session.id, spentAt: IsNull() },
        { spentAt: now },
      );
      const person = await manager.findOne(PersonEntity, {
        where: { id: session.personId, active: true },
        relations: { areas: true },
      });
      if (spent.affected === 1 && person) return this.open(manager, person, session.family);
      await this.endFamily(manager, session.family);
      await this.audit.record(
        manager,
        { id: session.personId, name: person?.name ?? session.personId },
        {
          action: 'session ended: a spent token came back',
          subjectType: 'person',
          subjectId: session.personId,
        },
      );
      return null;
    });
    if (!outcome) throw new Problem('session-ended');
    return outcome;
  }

  async signOut(token: string): Promise<void> {
    await this.transactions.run(async (manager) => {
      const session = await manager.findOneBy(RefreshSessionEntity, { tokenHash: hashed(token) });
      if (session) await this.endFamily(manager, session.family);
    });
  }

  /** The person behind an access token, read fresh; null where the session was ended or the person is out. */
  async personOf(claims: AccessClaims): Promise<PersonEntity | null> {
    const live = await this.database
      .getRepository(RefreshSessionEntity)
      .existsBy({ family: claims.family, revokedAt: IsNull() });
    if (!live) return null;
    return this.people.findOne({ where: { id: claims.sub, active: true }, relations: { areas: true } });
  }

  private async open(manager: EntityManager, person: PersonEntity, family: string): Promise<OpenedSession> {
    const now = this.clock.now();
    const refreshToken = randomBytes(32).toString('base64url');
    await manager.insert(RefreshSessionEntity, {
      id: randomUUID(),
      family,
      personId: person.id,
      tokenHash: hashed(refreshToken),
      createdAt: now,
      expiresAt: now + refreshLife,
      spentAt: null,
      revokedAt: null,
    });
    const claims: AccessClaims = { sub: person.id, family };
    return { person, accessToken: await this.jwt.signAsync({ ...claims }), refreshToken };
  }

  private async endFamily(manager: EntityManager, family: string): Promise<void> {
    await manager.update(
      RefreshSessionEntity,
      { family, revokedAt: IsNull() },
      { revokedAt: this.clock.now() },
    );
  }
}
