import { Injectable } from '@nestjs/common';
import { type Actor, seesArea } from '@tailrace/shared/contracts/policy';
import {
  type Valve,
  type ValveDraft,
  type ValvePage,
  type ValveQuery,
} from '@tailrace/shared/contracts/valves';
import { criticalities } from '@tailrace/shared/core/data-sheet';
import { randomUUID } from 'node:crypto';
import { DataSource, EntityManager, type SelectQueryBuilder } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { AreaEntity } from '../people/area.entity.js';
import { visibleTo } from '../people/visible-to.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { Problem } from '../platform/problem.js';
import { DataSheetEntity } from './data-sheet.entity.js';
import { refuseForeignTags } from './foreign-tags.js';
import { presentValve, presentValveRow, valveFormOf } from './present-valve.js';
import { SignalEntity } from './signal.entity.js';
import { ValveEntity } from './valve.entity.js';

const sortColumns: Record<ValveQuery['sort'], string> = {
  tag: 'valve.tag',
  area: 'area.code',
  service: 'valve.service',
  criticality: 'criticality_order',
};

const criticalityOrder = `CASE valve.criticality ${criticalities
  .map((criticality, order) => `WHEN '${criticality}' THEN ${order}`)
  .join(' ')} END`;

@Injectable()
export class ValvesService {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async page(actor: Actor, query: ValveQuery): Promise<ValvePage> {
    const found = this.visible(actor);
    if (query.area) found.andWhere('valve.areaId = :area', { area: query.area });
    if (query.q)
      found.andWhere("(valve.tag LIKE :like ESCAPE '\\' OR valve.service LIKE :like ESCAPE '\\')", {
        like: `%${query.q.replace(/[\\%_]/g, '\\$&')}%`,
      });
    if (query.sort === 'criticality') found.addSelect(criticalityOrder, sortColumns.criticality);
    found.orderBy(sortColumns[query.sort], query.direction === 'asc' ? 'ASC' : 'DESC');
    if (query.sort !== 'tag') found.addOrderBy('valve.tag', 'ASC');
    const [valves, total] = await found
      .skip(query.page * query.pageSize)
      .take(query.pageSize)
      .getManyAndCount();
    return { rows: valves.map(presentValveRow), total };
  }

  async byTag(actor: Actor, tag: string): Promise<Valve> {
    return presentValve(await this.one(actor, tag));
  }

  /** The valve with its area, current sheet and signals; `not-found` for one outside the asker's areas too. */
  async one(actor: Pick<Actor, 'areas'>, tag: string, manager = this.database.manager): Promise<ValveEntity> {
    const valve = await this.visible(actor, manager).andWhere('valve.tag = :tag', { tag }).getOne();
    if (!valve) throw new Problem('not-found');
    return valve;
  }

  async byId(actor: Pick<Actor, 'areas'>, id: string, manager = this.database.manager): Promise<ValveEntity> {
    const valve = await this.visible(actor, manager).andWhere('valve.id = :id', { id }).getOne();
    if (!valve) throw new Problem('not-found');
    return valve;
  }

  /** Every valve the actor sees, for work that goes through them all. */
  async all(actor: Pick<Actor, 'areas'>): Promise<ValveEntity[]> {
    return this.visible(actor).orderBy('valve.tag', 'ASC').getMany();
  }

  async create(actor: Actor, draft: ValveDraft): Promise<Valve> {
    return this.transactions.run(async (manager) => {
      await this.ownArea(manager, actor, draft.areaId);
      await this.tagIsFree(manager, draft.tag, null);
      await refuseForeignTags(manager, actor, tagsOf(draft));
      const now = this.clock.now();
      const id = randomUUID();
      await manager.insert(ValveEntity, {
        id,
        ...this.columnsOf(draft),
        version: 1,
        createdAt: now,
        updatedAt: now,
      });
      await this.writeSheet(manager, actor, id, draft);
      await this.writeSignals(manager, id, draft);
      const valve = await this.byId(actor, id, manager);
      await this.recordEdit(manager, actor, valve, 'added', null);
      return presentValve(valve);
    });
  }

  /** Changes a valve as a whole. `version` says what the editor saw; somebody else's edit in between is not overwritten. */
  async update(actor: Actor, tag: string, draft: ValveDraft): Promise<Valve> {
    return this.transactions.run(async (manager) => {
      const before = await this.one(actor, tag, manager);
      await this.ownArea(manager, actor, draft.areaId);
      await this.tagIsFree(manager, draft.tag, before.id);
      const changed = await manager.update(
        ValveEntity,
        { id: before.id, version: draft.version ?? -1 },
        { ...this.columnsOf(draft), version: before.version + 1, updatedAt: this.clock.now() },
      );
      if (changed.affected !== 1) throw new Problem('edited-meanwhile');
      if (JSON.stringify(valveFormOf(before).dataSheet) !== JSON.stringify(draft.dataSheet))
        await this.writeSheet(manager, actor, before.id, draft);
      await refuseForeignTags(manager, actor, tagsOf(draft));
      await manager.delete(SignalEntity, { valveId: before.id });
      await this.writeSignals(manager, before.id, draft);
      const valve = await this.byId(actor, before.id, manager);
      await this.recordEdit(manager, actor, valve, 'changed', before);
      return presentValve(valve);
    });
  }

  private visible(
    actor: Pick<Actor, 'areas'>,
    manager: EntityManager = this.database.manager,
  ): SelectQueryBuilder<ValveEntity> {
    const query = manager
      .createQueryBuilder(ValveEntity, 'valve')
      .innerJoinAndSelect('valve.area', 'area')
      .innerJoinAndMapOne(
        'valve.sheet',
        DataSheetEntity,
        'sheet',
        'sheet.valveId = valve.id AND sheet.current = 1',
      )
      .leftJoinAndMapMany('valve.signals', SignalEntity, 'signal', 'signal.valveId = valve.id');
    return visibleTo(actor, query, 'valve.areaId');
  }

  private columnsOf({ tag, areaId, dataSheet }: ValveDraft) {
    const { service, criticality, trip } = dataSheet;
    return { tag, areaId, service, criticality, trip };
  }

  private async ownArea(manager: EntityManager, actor: Actor, areaId: string): Promise<void> {
    if (!seesArea(actor, areaId) || !(await manager.existsBy(AreaEntity, { id: areaId })))
      throw new Problem('invalid-input', 'area-not-yours', [
        { pointer: '/areaId', detail: 'Choose one of your own areas.' },
      ]);
  }

  private async tagIsFree(manager: EntityManager, tag: string, own: string | null): Promise<void> {
    const holder = await manager.findOneBy(ValveEntity, { tag });
    if (holder && holder.id !== own) throw new Problem('already-exists', 'tag-taken');
  }

  private async writeSheet(
    manager: EntityManager,
    actor: Actor,
    valveId: string,
    draft: ValveDraft,
  ): Promise<void> {
    const number = (await manager.countBy(DataSheetEntity, { valveId })) + 1;
    await manager.update(DataSheetEntity, { valveId, current: true }, { current: false });
    await manager.insert(DataSheetEntity, {
      id: randomUUID(),
      valveId,
      number,
      current: true,
      sheet: draft.dataSheet,
      createdAt: this.clock.now(),
      createdBy: actor.id,
    });
  }

  private async writeSignals(manager: EntityManager, valveId: string, draft: ValveDraft): Promise<void> {
    const rows = Object.entries(draft.signals).map(([role, { tag, unit, reversed }]) => ({
      id: randomUUID(),
      valveId,
      role: role as SignalEntity['role'],
      historianTag: tag,
      unit,
      reversed,
    }));
    if (rows.length > 0) await manager.insert(SignalEntity, rows);
  }

  private async recordEdit(
    manager: EntityManager,
    actor: Actor,
    valve: ValveEntity,
    action: string,
    before: ValveEntity | null,
  ): Promise<void> {
    await this.audit.record(manager, actor, {
      action,
      subjectType: 'valve',
      subjectId: valve.id,
      areaId: valve.areaId,
      before: before && { ...valveFormOf(before), areaId: before.areaId },
      after: { ...valveFormOf(valve), areaId: valve.areaId },
    });
  }
}

function tagsOf({ signals }: ValveDraft): string[] {
  return Object.values(signals).map(({ tag }) => tag);
}
