import { Injectable, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { DataSource, In } from 'typeorm';
import { AssessmentsService } from '../assessments/assessments.service.js';
import { FindingsService } from '../findings/findings.service.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { ValvesService } from '../valves/valves.service.js';
import { AnalysisRunEntity } from './analysis-run.entity.js';
import { RunValveEntity } from './run-valve.entity.js';
import { ValveAssessor } from './valve-assessor.js';

const everything = { areas: null } as const;

/**
 * Works off the runs in the database, one run after the other and as many valves at a time as there are threads.
 * The queue is its rows: after a restart what is waiting goes on, and a valve that is done is not done again.
 */
@Injectable()
export class RunQueue implements OnApplicationBootstrap, OnModuleDestroy {
  private working: Promise<void> | null = null;
  private wanted = false;
  private stopping = false;

  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly valves: ValvesService,
    private readonly assessor: ValveAssessor,
    private readonly assessments: AssessmentsService,
    private readonly findings: FindingsService,
    private readonly clock: Clock,
  ) {}

  onApplicationBootstrap(): void {
    void this.work();
  }

  async onModuleDestroy(): Promise<void> {
    this.stopping = true;
    await this.working;
  }

  /** Works off every run that waits; settles when none is left. */
  work(): Promise<void> {
    this.wanted = true;
    this.working ??= this.workOff().finally(() => (this.working = null));
    return this.working;
  }

  private async workOff(): Promise<void> {
    while (this.wanted && !this.stopping) {
      this.wanted = false;
      for (let run = await this.nextRun(); run !== null && !this.stopping; run = await this.nextRun())
        await this.workOffRun(run);
    }
  }

  private nextRun(): Promise<AnalysisRunEntity | null> {
    return this.database
      .getRepository(AnalysisRunEntity)
      .findOne({ where: { state: In(['waiting', 'running']) }, order: { number: 'ASC' } });
  }

  private async workOffRun(run: AnalysisRunEntity): Promise<void> {
    await this.transactions.run((manager) =>
      manager.update(
        AnalysisRunEntity,
        { id: run.id, state: 'waiting' },
        { state: 'running', startedAt: this.clock.now() },
      ),
    );
    const waiting = await this.database
      .getRepository(RunValveEntity)
      .find({ where: { runId: run.id, outcome: 'waiting' } });
    const line = Array.from({ length: this.assessor.threads }, async () => {
      for (let next = waiting.shift(); next !== undefined && !this.stopping; next = waiting.shift())
        if (await this.goesOn(run.id)) await this.workOffValve(run, next.valveId);
    });
    await Promise.all(line);
    if (!this.stopping) await this.close(run.id);
  }

  private goesOn(runId: string): Promise<boolean> {
    return this.database.getRepository(AnalysisRunEntity).existsBy({ id: runId, state: 'running' });
  }

  private async workOffValve(run: AnalysisRunEntity, valveId: string): Promise<void> {
    try {
      const valve = await this.valves.byId(everything, valveId);
      const { windowFrom, windowTo } = run;
      const asked =
        windowFrom === null || windowTo === null ? null : { from: windowFrom / 1000, to: windowTo / 1000 };
      const outcome = await this.assessor.assess(valve, asked);
      if (outcome.kind === 'assessed') await this.keep(run, valve, outcome);
      else if (outcome.kind === 'units') await this.note(run.id, valveId, 'not judged', outcome.reason);
      else
        await this.note(run.id, valveId, 'not judged', 'No samples of its signals have been taken in yet.');
    } catch (error) {
      if (!this.stopping)
        await this.note(run.id, valveId, 'failed', error instanceof Error ? error.message : String(error));
    }
  }

  private async keep(
    run: AnalysisRunEntity,
    valve: ValveEntity,
    { result, took }: { result: Parameters<AssessmentsService['store']>[1]['result']; took: number },
  ): Promise<void> {
    const at = this.clock.now();
    await this.transactions.run(async (manager) => {
      const claimed = await manager.update(
        RunValveEntity,
        { runId: run.id, valveId: valve.id, outcome: 'waiting' },
        {
          outcome: result.judged ? 'judged' : 'not judged',
          reason: result.reason,
          findings: result.findings.length,
          took,
        },
      );
      // Stopped or done meanwhile: what it found is not kept twice.
      if (claimed.affected !== 1) return;
      const assessmentId = await this.assessments.store(manager, {
        valveId: valve.id,
        runId: run.id,
        runNumber: run.number,
        at,
        result,
      });
      await this.findings.follow(manager, {
        valveId: valve.id,
        areaId: valve.areaId,
        assessmentId,
        at,
        result,
      });
    });
  }

  private async note(
    runId: string,
    valveId: string,
    outcome: RunValveEntity['outcome'],
    reason: string,
  ): Promise<void> {
    await this.transactions.run((manager) =>
      manager.update(RunValveEntity, { runId, valveId, outcome: 'waiting' }, { outcome, reason }),
    );
  }

  private async close(runId: string): Promise<void> {
    await this.transactions.run(async (manager) => {
      const failed = await manager.countBy(RunValveEntity, { runId, outcome: 'failed' });
      await manager.update(
        AnalysisRunEntity,
        { id: runId, state: 'running' },
        { state: failed > 0 ? 'done with failures' : 'done', finishedAt: this.clock.now() },
      );
    });
  }
}
