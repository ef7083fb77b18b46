import { Injectable, type OnModuleDestroy, type OnModuleInit } from '@nestjs/common';
import { type TakeInReport } from '@tailrace/shared/contracts/trends';
import { trendRefusals } from '@tailrace/shared/messages/trend-refusals';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { DataSource } from 'typeorm';
import { AuditService, theService } from '../audit/audit.service.js';
import { FileStore } from '../files/file-store.js';
import { Transactions } from '../platform/database/transactions.js';
import { workerFile } from '../platform/worker-file.js';
import { type ReadMessage, type ReadOutcome } from './read-task.js';
import { SampleStore } from './store/sample-store.js';
import { StagedBlockEntity } from './store/sample-block.entity.js';
import { TrendFileEntity } from './trend-file.entity.js';

/**
 * Takes files in, one after the other: a thread reads, this one stores what it hands over, and the file's samples
 * become visible together with its report. Killed in between, the file is as it was received.
 */
@Injectable()
export class TakeInService implements OnModuleInit, OnModuleDestroy {
  private readonly pool: Piscina;
  private last: Promise<unknown> = Promise.resolve();
  private stopping = false;

  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly samples: SampleStore,
    private readonly files: FileStore,
    private readonly audit: AuditService,
  ) {
    this.pool = new Piscina({
      filename: workerFile('trends/read.worker'),
      maxThreads: 1,
      minThreads: 0,
      idleTimeout: 5_000,
    });
  }

  /** What a killed service left half-read goes back to where it was received. */
  async onModuleInit(): Promise<void> {
    await this.transactions.run(async (manager) => {
      await manager.createQueryBuilder().delete().from(StagedBlockEntity).execute();
      await manager.update(
        TrendFileEntity,
        { state: 'reading' },
        {
          state: 'received',
          share: 0,
          rows: 0,
          refusal:
            'The service stopped while this file was being read. Take it in again; nothing of it was kept.',
        },
      );
    });
  }

  async onModuleDestroy(): Promise<void> {
    this.stopping = true;
    await this.pool.destroy();
  }

  /** Queues a file whose state is `reading`; settles when it is taken or refused. */
  begin(fileId: string, wanted: readonly string[]): Promise<void> {
    const turn = this.last
      .then(() => this.takeIn(fileId, wanted))
      .catch((error: unknown) => this.breakOff(fileId, error));
    this.last = turn;
    return turn;
  }

  private async takeIn(fileId: string, wanted: readonly string[]): Promise<void> {
    const file = await this.database.getRepository(TrendFileEntity).findOneByOrFail({ id: fileId });
    if (!file.plan) throw new Error(`trend file ${file.number} has no plan`);
    const { port1, port2 } = new MessageChannel();
    // What cannot be stored ends the reading too: its thread waits for "go on" and would wait for ever.
    const unstored = new AbortController();
    let storing: Promise<void> = Promise.resolve();
    port1.on('message', (message: ReadMessage) => {
      storing = storing.then(() => this.hear(fileId, message, () => port1.postMessage('go on')));
      storing.catch((error: unknown) => unstored.abort(error));
    });
    const task = { path: this.files.path(fileId), plan: file.plan, wanted, port: port2 };
    let outcome: ReadOutcome;
    try {
      outcome = (await this.pool.run(task, {
        transferList: [port2],
        signal: unstored.signal,
      })) as ReadOutcome;
    } catch (error) {
      throw unstored.signal.aborted ? unstored.signal.reason : error;
    } finally {
      port1.close();
    }
    await storing;
    if (outcome.kind === 'refused') await this.refuse(file, outcome.sentence);
    else if (outcome.report.tags.length === 0) await this.refuse(file, trendRefusals.nothingWanted());
    else await this.finish(file, outcome.report);
  }

  private async hear(fileId: string, message: ReadMessage, goOn: () => void): Promise<void> {
    if (message.kind === 'progress') {
      const { share, rows } = message;
      await this.transactions.run((manager) =>
        manager.update(TrendFileEntity, { id: fileId }, { share, rows }),
      );
      return;
    }
    await this.samples.stage(fileId, message.tag, message.blocks);
    goOn();
  }

  private async finish(file: TrendFileEntity, report: TakeInReport): Promise<void> {
    const state = report.rejects.length > 0 ? 'taken with rejects' : 'taken';
    await this.transactions.run(async (manager) => {
      await this.samples.publish(manager, file.id);
      await manager.update(
        TrendFileEntity,
        { id: file.id },
        { state, report, share: 1, rows: report.rows, refusal: null },
      );
      await this.audit.record(manager, theService, {
        action: state,
        subjectType: 'trend file',
        subjectId: file.id,
        areaId: file.areaId,
        after: { rows: report.rows, samples: report.samples },
      });
    });
  }

  private async refuse(file: TrendFileEntity, sentence: string): Promise<void> {
    await this.transactions.run(async (manager) => {
      await this.samples.discard(manager, file.id);
      await manager.update(
        TrendFileEntity,
        { id: file.id },
        { state: 'refused', refusal: sentence, share: 0, report: null },
      );
      await this.audit.record(manager, theService, {
        action: 'refused',
        subjectType: 'trend file',
        subjectId: file.id,
        areaId: file.areaId,
        after: { refusal: sentence },
      });
    });
  }

  /** A fault of ours: the file goes back to where it was received, with a word; nothing of it is kept. */
  private async breakOff(fileId: string, error: unknown): Promise<void> {
    if (this.stopping) return;
    await this.transactions.run(async (manager) => {
      await this.samples.discard(manager, fileId);
      const said = error instanceof Error ? error.message : String(error);
      await manager.update(
        TrendFileEntity,
        { id: fileId },
        {
          state: 'received',
          share: 0,
          refusal: `Reading broke off: ${said}. Nothing of the file was kept; take it in again.`,
        },
      );
    });
  }
}
