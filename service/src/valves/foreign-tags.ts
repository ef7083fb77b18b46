import { type Actor, seesArea } from '@tailrace/shared/contracts/policy';
import { EntityManager, In } from 'typeorm';
import { Problem } from '../platform/problem.js';
import { SignalEntity } from './signal.entity.js';
import { ValveEntity } from './valve.entity.js';

/**
 * Refuses historian tags that only valves outside the actor's areas have: bound to a valve of their own, they
 * would show them history that is not theirs. A transmitter two areas share is bound by somebody who sees both.
 */
export async function refuseForeignTags(
  manager: EntityManager,
  actor: Pick<Actor, 'areas'>,
  tags: readonly string[],
): Promise<void> {
  if (actor.areas === null || tags.length === 0) return;
  const bound = await manager.findBy(SignalEntity, { historianTag: In([...tags]) });
  const holders = await manager.findBy(ValveEntity, { id: In(bound.map(({ valveId }) => valveId)) });
  const own = new Set(holders.filter(({ areaId }) => seesArea(actor, areaId)).map(({ id }) => id));
  for (const tag of tags) {
    const valves = bound.filter(({ historianTag }) => historianTag === tag);
    if (valves.length > 0 && !valves.some(({ valveId }) => own.has(valveId)))
      throw new Problem('wrong-state', 'tag-elsewhere');
  }
}
