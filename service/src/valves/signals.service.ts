import { Injectable } from '@nestjs/common';
import { type Actor, may, seesArea } from '@tailrace/shared/contracts/policy';
import { type SignalRole } from '@tailrace/shared/core/series';
import { randomUUID } from 'node:crypto';
import { EntityManager } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Problem } from '../platform/problem.js';
import { refuseForeignTags } from './foreign-tags.js';
import { SignalEntity } from './signal.entity.js';
import { ValveEntity } from './valve.entity.js';

export interface Binding {
  readonly historianTag: string;
  readonly valveId: string;
  readonly role: SignalRole;
  readonly unit: string | null;
  readonly reversed: boolean;
}

@Injectable()
export class SignalsService {
  constructor(private readonly audit: AuditService) {}

  /**
   * Binds a historian tag to a role of a valve, within the caller's transaction. Who takes trends in may fill an
   * empty role; changing one that is filled takes the right to edit valves.
   */
  async bind(manager: EntityManager, actor: Actor, binding: Binding): Promise<void> {
    const valve = await manager.findOneBy(ValveEntity, { id: binding.valveId });
    if (!valve || !seesArea(actor, valve.areaId)) throw new Problem('not-found');
    const { valveId, role } = binding;
    const before = await manager.findOneBy(SignalEntity, { valveId, role });
    const after = { historianTag: binding.historianTag, unit: binding.unit, reversed: binding.reversed };
    if (before && sameSignal(before, after)) return;
    if (before && !may(actor, 'valves:write', valve.areaId)) throw new Problem('wrong-state', 'signal-bound');
    await refuseForeignTags(manager, actor, [binding.historianTag]);
    if (before) await manager.update(SignalEntity, { id: before.id }, after);
    else await manager.insert(SignalEntity, { id: randomUUID(), valveId, role, ...after });
    await manager.increment(ValveEntity, { id: valveId }, 'version', 1);
    await this.audit.record(manager, actor, {
      action: 'bound a signal',
      subjectType: 'valve',
      subjectId: valveId,
      areaId: valve.areaId,
      before: before && { role, ...signalOf(before) },
      after: { role, ...after },
    });
  }
}

type Bound = Pick<SignalEntity, 'historianTag' | 'unit' | 'reversed'>;

function signalOf({ historianTag, unit, reversed }: Bound): Bound {
  return { historianTag, unit, reversed };
}

function sameSignal(a: Bound, b: Bound): boolean {
  return a.historianTag === b.historianTag && a.unit === b.unit && a.reversed === b.reversed;
}
