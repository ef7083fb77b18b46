import { Injectable } from '@nestjs/common';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { createHash } from 'node:crypto';
import { EntityManager } from 'typeorm';
import { Clock } from '../platform/clock.js';
import { AuditEntryEntity } from './audit-entry.entity.js';

export interface AuditedChange {
  readonly action: string;
  readonly subjectType: string;
  readonly subjectId: string;
  readonly areaId?: string | null;
  readonly before?: unknown;
  readonly after?: unknown;
}

/** Who does what nobody asked for by hand: the nightly job, the seed. */
export const theService: Pick<Actor, 'name'> & { readonly id: null } = { id: null, name: 'Tailrace' };

const text = (value: unknown): string | null =>
  value === undefined || value === null ? null : JSON.stringify(value);

@Injectable()
export class AuditService {
  constructor(private readonly clock: Clock) {}

  /**
   * Records a change within the caller's transaction, so that neither stands without the other. Each entry's
   * hash covers the former one: an entry taken out or altered later breaks the chain.
   */
  async record(
    manager: EntityManager,
    actor: { readonly id: string | null; readonly name: string },
    change: AuditedChange,
  ): Promise<void> {
    const former = await manager.findOne(AuditEntryEntity, { where: {}, order: { number: 'DESC' } });
    const entry = {
      at: this.clock.now(),
      actorId: actor.id,
      actorName: actor.name,
      action: change.action,
      subjectType: change.subjectType,
      subjectId: change.subjectId,
      areaId: change.areaId ?? null,
      before: text(change.before),
      after: text(change.after),
    };
    await manager.insert(AuditEntryEntity, { ...entry, hash: entryHash(entry, former?.hash ?? '') });
  }

  /** Number of the first entry whose hash does not follow from the one before it; null where the chain holds. */
  async firstBroken(manager: EntityManager): Promise<number | null> {
    let former = '';
    for (const { number, hash, ...entry } of await manager.find(AuditEntryEntity, {
      order: { number: 'ASC' },
    })) {
      if (entryHash(entry, former) !== hash) return number;
      former = hash;
    }
    return null;
  }
}

function entryHash(entry: Omit<AuditEntryEntity, 'number' | 'hash'>, former: string): string {
  const fields = [
    entry.at,
    entry.actorId,
    entry.actorName,
    entry.action,
    entry.subjectType,
    entry.subjectId,
    entry.areaId,
    entry.before,
    entry.after,
  ];
  return createHash('sha256').update(former).update(JSON.stringify(fields)).digest('hex');
}
