import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';
import { type Actor, may } from '@tailrace/shared/contracts/policy';
import {
  type AnalysisRun,
  type RunDetail,
  type RunDraft,
  type RunPage,
  stoppable,
  type ValveOutcome,
} from '@tailrace/shared/contracts/runs';
import { randomUUID } from 'node:crypto';
import { DataSource, In } from 'typeorm';
import { AssessmentEntity } from '../assessments/assessment.entity.js';
import { AuditService, theService } from '../audit/audit.service.js';
import { PeopleService } from '../people/people.service.js';
import { visibleTo } from '../people/visible-to.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { Problem } from '../platform/problem.js';
import { SiteEntity } from '../people/site.entity.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { ValvesService } from '../valves/valves.service.js';
import { AnalysisRunEntity } from './analysis-run.entity.js';
import { lastDue, nextDue } from './nightly.js';
import { RunQueue } from './run-queue.js';
import { RunValveEntity } from './run-valve.entity.js';
import { ValveAssessor } from './valve-assessor.js';

interface NewRun {
  readonly trigger: AnalysisRunEntity['trigger'];
  readonly actor: { readonly id: string | null; readonly name: string };
  readonly valves: readonly ValveEntity[];
  readonly draft: RunDraft;
}

@Injectable()
export class RunsService {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly queue: RunQueue,
    private readonly valves: ValvesService,
    private readonly assessor: ValveAssessor,
    private readonly people: PeopleService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** Starts a run over the valves named, or over every valve of the asker's areas. */
  async start(actor: Actor, draft: RunDraft, trigger: 'person' | 'seed' = 'person'): Promise<AnalysisRun> {
    if (draft.from && draft.to && Date.parse(draft.from) >= Date.parse(draft.to))
      throw new Problem('invalid-input', null, [
        { pointer: '/to', detail: 'The window ends after it begins.' },
      ]);
    const all = await this.valves.all(actor);
    const valves = draft.tags ? all.filter(({ tag }) => draft.tags?.includes(tag)) : all;
    const missing = draft.tags?.find((tag) => !valves.some((valve) => valve.tag === tag));
    if (missing !== undefined) throw new Problem('not-found');
    const id = await this.create({ trigger, actor, valves, draft });
    void this.queue.work();
    return this.summary(actor, await this.one(actor, id));
  }

  /** Every minute: starts the night's run when its local time has come and it has not been started yet. */
  @Cron(CronExpression.EVERY_MINUTE)
  async startIfDue(): Promise<void> {
    const [site] = await this.database.getRepository(SiteEntity).find({ take: 1 });
    if (!site) return;
    const due = lastDue({ at: site.nightlyAt, zone: site.zone }, this.clock.now());
    const last = await this.database
      .getRepository(AnalysisRunEntity)
      .findOne({ where: {}, order: { createdAt: 'DESC' } });
    // A service that has never run anything waits for its first night.
    if (!last || last.createdAt >= due) return;
    const valves = await this.withNewSamples(await this.valves.all({ areas: null }));
    await this.create({ trigger: 'schedule', actor: theService, valves, draft: {} });
    void this.queue.work();
  }

  async page(actor: Actor, query: { page: number; pageSize: number }): Promise<RunPage> {
    const [runs, total] = await this.visibleRuns(actor)
      .orderBy('run.number', 'DESC')
      .skip(query.page * query.pageSize)
      .take(query.pageSize)
      .getManyAndCount();
    const { zone, nightlyAt } = await this.people.site();
    const next = new Date(nextDue({ at: nightlyAt, zone }, this.clock.now())).toISOString();
    const rows = await Promise.all(runs.map((run) => this.summary(actor, run)));
    return { rows, total, schedule: { at: nightlyAt, zone, next } };
  }

  async byId(actor: Actor, id: string): Promise<RunDetail> {
    const run = await this.one(actor, id);
    const outcomes = await this.outcomes(actor, id);
    return { ...(await this.summary(actor, run)), outcomes };
  }

  /** Stops a run: valves not yet worked off stay as they were. Only who sees all its valves may. */
  async stop(actor: Actor, id: string): Promise<RunDetail> {
    const run = await this.one(actor, id);
    const all = await this.database.getRepository(RunValveEntity).countBy({ runId: id });
    if ((await this.outcomes(actor, id)).length < all) throw new Problem('not-allowed');
    await this.transactions.run(async (manager) => {
      const stopped = await manager.update(
        AnalysisRunEntity,
        { id: run.id, state: In([...stoppable]) },
        { state: 'stopped', finishedAt: this.clock.now() },
      );
      if (stopped.affected !== 1) throw new Problem('wrong-state');
      await manager.update(RunValveEntity, { runId: id, outcome: 'waiting' }, { outcome: 'stopped' });
      await this.audit.record(manager, actor, { action: 'stopped', subjectType: 'run', subjectId: id });
    });
    return this.byId(actor, id);
  }

  private async create({ trigger, actor, valves, draft }: NewRun): Promise<string> {
    const id = randomUUID();
    await this.transactions.run(async (manager) => {
      await manager.insert(AnalysisRunEntity, {
        id,
        number: ((await manager.maximum(AnalysisRunEntity, 'number')) ?? 0) + 1,
        state: 'waiting',
        trigger,
        requestedBy: actor.id,
        requestedByName: actor.id === null ? null : actor.name,
        createdAt: this.clock.now(),
        startedAt: null,
        finishedAt: null,
        windowFrom: draft.from && draft.to ? Date.parse(draft.from) : null,
        windowTo: draft.from && draft.to ? Date.parse(draft.to) : null,
      });
      const rows = valves.map((valve) => ({
        runId: id,
        valveId: valve.id,
        outcome: 'waiting' as const,
        reason: null,
        findings: 0,
        took: null,
      }));
      if (rows.length > 0) await manager.insert(RunValveEntity, rows);
      await this.audit.record(manager, actor, {
        action: 'started',
        subjectType: 'run',
        subjectId: id,
        after: { trigger, valves: valves.length },
      });
    });
    return id;
  }

  /** Valves with samples newer than their last assessment's window, or never assessed. */
  private async withNewSamples(valves: readonly ValveEntity[]): Promise<ValveEntity[]> {
    const assessed = await this.database.getRepository(AssessmentEntity).findBy({ latest: true });
    const until = new Map(assessed.map(({ valveId, windowTo }) => [valveId, windowTo / 1000]));
    const due: ValveEntity[] = [];
    for (const valve of valves) {
      const newest = await this.assessor.newestSample(valve);
      if (newest !== null && newest >= (until.get(valve.id) ?? -Infinity)) due.push(valve);
    }
    return due;
  }

  /** Runs that went through at least one valve the actor sees. */
  private visibleRuns(actor: Pick<Actor, 'areas'>) {
    const own = this.database
      .createQueryBuilder(RunValveEntity, 'rv')
      .innerJoin(ValveEntity, 'valve', 'valve.id = rv.valveId')
      .select('rv.runId')
      .where('rv.runId = run.id');
    const seen = visibleTo(actor, own, 'valve.areaId');
    const query = this.database.createQueryBuilder(AnalysisRunEntity, 'run');
    return actor.areas === null
      ? query
      : query.where(`EXISTS (${seen.getQuery()})`).setParameters(seen.getParameters());
  }

  private async one(actor: Actor, id: string): Promise<AnalysisRunEntity> {
    const run = await this.visibleRuns(actor).andWhere('run.id = :id', { id }).getOne();
    if (!run || !may(actor, 'runs:read')) throw new Problem('not-found');
    return run;
  }

  private async outcomes(actor: Actor, runId: string): Promise<ValveOutcome[]> {
    const query = this.database
      .createQueryBuilder(RunValveEntity, 'rv')
      .innerJoin(ValveEntity, 'valve', 'valve.id = rv.valveId')
      .select(['valve.tag AS tag', 'rv.outcome AS outcome', 'rv.reason AS reason', 'rv.findings AS findings'])
      .addSelect('rv.took', 'took')
      .where('rv.runId = :runId', { runId })
      .orderBy('valve.tag', 'ASC');
    return visibleTo(actor, query, 'valve.areaId').getRawMany<ValveOutcome>();
  }

  private async summary(actor: Actor, run: AnalysisRunEntity): Promise<AnalysisRun> {
    const outcomes = await this.outcomes(actor, run.id);
    const count = (outcome: ValveOutcome['outcome']) => outcomes.filter((o) => o.outcome === outcome).length;
    const instant = (ms: number | null) => (ms === null ? null : new Date(ms).toISOString());
    return {
      id: run.id,
      number: run.number,
      state: run.state,
      trigger: run.trigger,
      requestedBy: run.requestedByName,
      createdAt: new Date(run.createdAt).toISOString(),
      startedAt: instant(run.startedAt),
      finishedAt: instant(run.finishedAt),
      valves: outcomes.length,
      judged: count('judged'),
      notJudged: count('not judged'),
      failed: count('failed'),
    };
  }
}
