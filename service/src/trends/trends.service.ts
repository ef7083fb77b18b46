import { Injectable } from '@nestjs/common';
import { type Actor, may } from '@tailrace/shared/contracts/policy';
import {
  type ColumnPlan,
  type TakeInDraft,
  type TrendFile,
  trendFileMoves,
  type trendFilePage,
  type TrendFileQuery,
  type TrendLook,
} from '@tailrace/shared/contracts/trends';
import { basename } from 'node:path';
import { DataSource, EntityManager, type SelectQueryBuilder } from 'typeorm';
import { type z } from 'zod';
import { AuditService } from '../audit/audit.service.js';
import { FileStore, type Received } from '../files/file-store.js';
import { PeopleService } from '../people/people.service.js';
import { visibleTo } from '../people/visible-to.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { Problem } from '../platform/problem.js';
import { SignalsService } from '../valves/signals.service.js';
import { ValvesService } from '../valves/valves.service.js';
import { presentTrendFile } from './present-trend-file.js';
import { proposeBinding } from './propose-bindings.js';
import { guessFile, lookAt } from './reading/look.js';
import { Refusal } from './reading/refusal.js';
import { TakeInService } from './take-in.service.js';
import { TrendFileEntity } from './trend-file.entity.js';

export interface ReceivedFile extends Received {
  readonly name: string;
  readonly areaId: string;
}

@Injectable()
export class TrendsService {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly files: FileStore,
    private readonly people: PeopleService,
    private readonly valves: ValvesService,
    private readonly signals: SignalsService,
    private readonly takeIns: TakeInService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async page(
    actor: Actor,
    { page, pageSize, state }: TrendFileQuery,
  ): Promise<z.infer<typeof trendFilePage>> {
    const query = this.visible(actor);
    if (state) query.andWhere('file.state = :state', { state });
    const [files, total] = await query
      .orderBy('file.number', 'DESC')
      .skip(page * pageSize)
      .take(pageSize)
      .getManyAndCount();
    return { rows: files.map(presentTrendFile), total };
  }

  async byId(actor: Actor, id: string): Promise<TrendFile> {
    return presentTrendFile(await this.one(actor, id));
  }

  /** The area a file comes in for: the one asked for, or the only one the person has. */
  async areaFor(actor: Actor, asked: string | undefined): Promise<string> {
    const own = await this.people.areasOf(actor);
    const area = asked ? own.find(({ id }) => id === asked) : own.length === 1 ? own[0] : undefined;
    if (area && may(actor, 'trends:take-in', area.id)) return area.id;
    throw new Problem('invalid-input', 'area-not-yours', [
      {
        pointer: '/areaId',
        detail: asked ? 'Choose one of your own areas.' : 'Say which of your areas the file is for.',
      },
    ]);
  }

  /**
   * Keeps a file that has been received whole. The same bytes for the same area are the same file.
   *
   * @returns the file, and whether it was there already
   */
  async keep(actor: Actor, received: ReceivedFile): Promise<{ file: TrendFile; known: boolean }> {
    const { areaId, sha256 } = received;
    const outcome = await this.transactions.run(async (manager) => {
      const known = await manager.findOneBy(TrendFileEntity, { areaId, sha256 });
      if (known) return { id: known.id, known: true };
      const id = received.key;
      await manager.insert(TrendFileEntity, {
        id,
        number: ((await manager.maximum(TrendFileEntity, 'number')) ?? 0) + 1,
        name: basename(received.name || 'trend').slice(0, 200),
        size: received.size,
        sha256,
        areaId,
        receivedBy: actor.id,
        receivedByName: actor.name,
        receivedAt: this.clock.now(),
        state: 'received',
        share: 0,
        rows: 0,
      });
      await this.record(manager, actor, 'received', { id, areaId, name: received.name });
      return { id, known: false };
    });
    if (outcome.known) await this.files.remove(received.key);
    return { file: await this.byId(actor, outcome.id), known: outcome.known };
  }

  /** The first rows as a plan understands them (the guessed one where none is given), and what each tag is bound to. */
  async look(actor: Actor, id: string, plan: ColumnPlan | null): Promise<TrendLook> {
    const file = await this.one(actor, id);
    const { zone } = await this.people.site();
    try {
      const path = this.files.path(file.id);
      const guessed = plan ? { plan, doubts: [] } : await guessFile(path, zone);
      const seen = await lookAt(path, guessed.plan, guessed.doubts);
      return { ...seen, tags: await this.boundOrProposed(actor, seen.tags) };
    } catch (error) {
      if (error instanceof Refusal) throw new Problem('unusable-file', { text: error.message });
      throw error;
    }
  }

  /** Binds the tags a person confirmed and has the file read. Settles once it is queued; `done` when it is read. */
  async takeIn(
    actor: Actor,
    id: string,
    draft: TakeInDraft,
  ): Promise<{ file: TrendFile; done: Promise<void> }> {
    const file = await this.one(actor, id);
    await this.transactions.run(async (manager) => {
      for (const binding of draft.bind) await this.signals.bind(manager, actor, binding);
      const next = trendFileMoves[file.state]['take in'];
      const moved = next
        ? await manager.update(
            TrendFileEntity,
            { id, state: file.state },
            { state: next, plan: draft.plan, share: 0, rows: 0, refusal: null, report: null },
          )
        : null;
      if (moved?.affected !== 1) throw new Problem('wrong-state');
      await this.record(manager, actor, 'asked to be taken in', file);
    });
    const wanted = await this.boundTags(actor);
    const done = this.takeIns.begin(id, wanted);
    return { file: await this.byId(actor, id), done };
  }

  /** Forgets a file that holds no samples: one only received, or refused. */
  async remove(actor: Actor, id: string): Promise<void> {
    const file = await this.one(actor, id);
    if (!['received', 'refused'].includes(file.state)) throw new Problem('wrong-state');
    await this.transactions.run(async (manager) => {
      await manager.delete(TrendFileEntity, { id });
      await this.record(manager, actor, 'removed', file);
    });
    await this.files.remove(id);
  }

  private visible(actor: Actor): SelectQueryBuilder<TrendFileEntity> {
    const query = this.database
      .createQueryBuilder(TrendFileEntity, 'file')
      .innerJoinAndSelect('file.area', 'area');
    return visibleTo(actor, query, 'file.areaId');
  }

  private async one(actor: Actor, id: string): Promise<TrendFileEntity> {
    const file = await this.visible(actor).andWhere('file.id = :id', { id }).getOne();
    if (!file) throw new Problem('not-found');
    return file;
  }

  /** Every historian tag bound to a valve the actor sees. */
  private async boundTags(actor: Actor): Promise<string[]> {
    const valves = await this.valves.all(actor);
    return [
      ...new Set(valves.flatMap(({ signals }) => (signals ?? []).map(({ historianTag }) => historianTag))),
    ];
  }

  private async boundOrProposed(
    actor: Actor,
    tags: readonly { historianTag: string; unit: string | null; examples: string[] }[],
  ): Promise<TrendLook['tags']> {
    const valves = await this.valves.all(actor);
    const candidates = valves.map(({ id, tag, signals }) => ({
      id,
      tag,
      roles: new Set((signals ?? []).map(({ role }) => role)),
    }));
    return tags.map(({ historianTag, unit, examples }) => {
      const bound = valves.flatMap(({ tag: valveTag, signals }) =>
        (signals ?? [])
          .filter((signal) => signal.historianTag === historianTag)
          .map((signal) => ({ valveTag, role: signal.role, unit: signal.unit })),
      );
      const near = bound.length > 0 ? null : proposeBinding(historianTag, candidates);
      const proposal = near && { valveId: near.valve.id, valveTag: near.valve.tag, role: near.role };
      return { historianTag, unit, examples, bound, proposal };
    });
  }

  private async record(
    manager: EntityManager,
    actor: Actor,
    action: string,
    file: { readonly id: string; readonly areaId: string; readonly name: string },
  ): Promise<void> {
    await this.audit.record(manager, actor, {
      action,
      subjectType: 'trend file',
      subjectId: file.id,
      areaId: file.areaId,
      after: { name: file.name },
    });
  }
}
