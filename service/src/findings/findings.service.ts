import { Injectable } from '@nestjs/common';
import { type PresentedAssessment } from '@tailrace/shared/contracts/assessments';
import {
  type AssessedFinding,
  type FindingPage,
  type LivingFinding,
} from '@tailrace/shared/contracts/findings';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { randomUUID } from 'node:crypto';
import { DataSource, EntityManager } from 'typeorm';
import { AuditService, theService } from '../audit/audit.service.js';
import { ValvesService } from '../valves/valves.service.js';
import { FindingEntity } from './finding.entity.js';
import { followFindings, type Step } from './follow.js';

/** The assessment that findings follow, and where it is kept. */
export interface Followed {
  readonly valveId: string;
  readonly areaId: string;
  readonly assessmentId: string;
  /** ms UTC */
  readonly at: number;
  readonly result: Pick<PresentedAssessment, 'findings' | 'notJudged'>;
}

@Injectable()
export class FindingsService {
  constructor(
    private readonly database: DataSource,
    private readonly valves: ValvesService,
    private readonly audit: AuditService,
  ) {}

  /** Lets the findings of a valve follow its new assessment, within the transaction that stores it. */
  async follow(manager: EntityManager, followed: Followed): Promise<void> {
    const standing = await manager.findBy(FindingEntity, { valveId: followed.valveId });
    const notJudged = new Set<string>(followed.result.notJudged.map(({ kind }) => kind));
    for (const step of followFindings(standing, followed.result.findings, notJudged))
      await this.take(manager, followed, step, standing);
  }

  /** The findings of one valve, the severest open ones first. */
  async ofValve(actor: Actor, tag: string): Promise<FindingPage> {
    const valve = await this.valves.one(actor, tag);
    const rows = await this.database.getRepository(FindingEntity).find({
      where: { valveId: valve.id },
      order: { severity: 'DESC' },
    });
    const open = (finding: FindingEntity) => (finding.state === 'cleared' ? 1 : 0);
    rows.sort((a, b) => open(a) - open(b) || b.severity - a.severity);
    return { rows: rows.map((finding) => presentFinding(finding, valve.tag)), total: rows.length };
  }

  private async take(
    manager: EntityManager,
    followed: Followed,
    step: Step,
    standing: readonly FindingEntity[],
  ): Promise<void> {
    const { valveId } = followed;
    switch (step.what) {
      case 'opens':
        await manager.insert(FindingEntity, {
          id: randomUUID(),
          number: await this.nextNumber(manager),
          valveId,
          kind: step.found.kind,
          state: 'new',
          firstSeen: followed.at,
          ...this.figures(step.found, followed),
        });
        return this.record(manager, followed, step.found.kind, 'opened');
      case 'goes on':
        await manager.update(FindingEntity, { valveId, kind: step.kind }, this.figures(step.found, followed));
        return;
      case 'reopens':
        await manager.update(
          FindingEntity,
          { valveId, kind: step.kind },
          { state: 'new', ...this.figures(step.found, followed) },
        );
        return this.record(manager, followed, step.kind, 'reopened');
      case 'is missed':
        await manager.update(FindingEntity, { valveId, kind: step.kind }, { missed: step.missed });
        return;
      case 'clears': {
        const state = standing.find(({ kind }) => kind === step.kind)?.state;
        await manager.update(FindingEntity, { valveId, kind: step.kind }, { state: 'cleared', missed: 0 });
        return this.record(manager, followed, step.kind, 'cleared itself', state);
      }
    }
  }

  private figures(found: AssessedFinding, { at, assessmentId }: Followed) {
    const { severity, confidence, text, explainedBy } = found;
    return { severity, confidence, text, explainedBy, lastSeen: at, missed: 0, assessmentId };
  }

  private async nextNumber(manager: EntityManager): Promise<number> {
    return ((await manager.maximum(FindingEntity, 'number')) ?? 0) + 1;
  }

  private async record(
    manager: EntityManager,
    { valveId, areaId, assessmentId }: Followed,
    kind: string,
    action: string,
    before?: string,
  ): Promise<void> {
    await this.audit.record(manager, theService, {
      action: `finding ${action}`,
      subjectType: 'valve',
      subjectId: valveId,
      areaId,
      before: before && { kind, state: before },
      after: { kind, assessmentId },
    });
  }
}

function presentFinding(finding: FindingEntity, valveTag: string): LivingFinding {
  const { id, number, kind, state, severity, confidence, text, explainedBy } = finding;
  return {
    id,
    number,
    valveTag,
    kind,
    state,
    severity,
    confidence,
    text,
    explainedBy,
    firstSeen: new Date(finding.firstSeen).toISOString(),
    lastSeen: new Date(finding.lastSeen).toISOString(),
  };
}
