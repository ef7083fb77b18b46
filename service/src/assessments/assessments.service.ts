import { Injectable } from '@nestjs/common';
import {
  type AssessmentPage,
  type PresentedAssessment,
  type StoredAssessment,
} from '@tailrace/shared/contracts/assessments';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { randomUUID } from 'node:crypto';
import { DataSource, EntityManager, type SelectQueryBuilder } from 'typeorm';
import { visibleTo } from '../people/visible-to.js';
import { Problem } from '../platform/problem.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { ValvesService } from '../valves/valves.service.js';
import { AssessmentEntity } from './assessment.entity.js';
import { rankingCard } from './ranking-card.js';

export interface NewAssessment {
  readonly valveId: string;
  readonly runId: string;
  readonly runNumber: number;
  /** ms UTC */
  readonly at: number;
  readonly result: PresentedAssessment;
}

@Injectable()
export class AssessmentsService {
  constructor(
    private readonly database: DataSource,
    private readonly valves: ValvesService,
  ) {}

  /** Keeps an assessment as it is, within the caller's transaction, and makes it the one the ranking shows. */
  async store(
    manager: EntityManager,
    { valveId, runId, runNumber, at, result }: NewAssessment,
  ): Promise<string> {
    const id = randomUUID();
    const counted = result.findings.filter((finding) => finding.explainedBy === null);
    await manager.update(AssessmentEntity, { valveId, latest: true }, { latest: false });
    await manager.insert(AssessmentEntity, {
      id,
      valveId,
      runId,
      runNumber,
      assessedAt: at,
      windowFrom: Date.parse(result.window.from),
      windowTo: Date.parse(result.window.to),
      methodVersion: result.methodVersion,
      judged: result.judged,
      reason: result.reason,
      attention: result.attention,
      strongest: Math.max(0, ...counted.map((finding) => finding.severity * finding.confidence)),
      latest: true,
      card: JSON.stringify(rankingCard(result)),
      result: JSON.stringify(result),
    });
    return id;
  }

  /** The assessments of one valve, newest first. */
  async ofValve(actor: Actor, tag: string): Promise<AssessmentPage> {
    const valve = await this.valves.one(actor, tag);
    const [rows, total] = await this.database.getRepository(AssessmentEntity).findAndCount({
      where: { valveId: valve.id },
      order: { assessedAt: 'DESC', runNumber: 'DESC' },
      take: 100,
    });
    return {
      rows: rows.map(({ id, runNumber, assessedAt, judged, attention }) => ({
        id,
        runNumber,
        assessedAt: new Date(assessedAt).toISOString(),
        judged,
        attention,
      })),
      total,
    };
  }

  async latest(actor: Actor, tag: string): Promise<StoredAssessment> {
    const valve = await this.valves.one(actor, tag);
    return this.one(this.visible(actor).andWhere('a.valveId = :id AND a.latest = 1', { id: valve.id }));
  }

  async byId(actor: Actor, id: string): Promise<StoredAssessment> {
    return this.one(this.visible(actor).andWhere('a.id = :id', { id }));
  }

  private visible(actor: Actor): SelectQueryBuilder<AssessmentEntity> {
    const query = this.database
      .createQueryBuilder(AssessmentEntity, 'a')
      .addSelect('a.result')
      .innerJoin(ValveEntity, 'valve', 'valve.id = a.valveId');
    return visibleTo(actor, query, 'valve.areaId');
  }

  private async one(query: SelectQueryBuilder<AssessmentEntity>): Promise<StoredAssessment> {
    const found = await query.getOne();
    if (!found) throw new Problem('not-found');
    return {
      id: found.id,
      runNumber: found.runNumber,
      assessedAt: new Date(found.assessedAt).toISOString(),
      result: JSON.parse(found.result) as PresentedAssessment,
    };
  }
}
