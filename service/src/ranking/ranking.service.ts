import { Injectable } from '@nestjs/common';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { type RankingPage, type RankingQuery, type RankingRow } from '@tailrace/shared/contracts/ranking';
import { type Criticality } from '@tailrace/shared/core/data-sheet';
import { DataSource, In, Not } from 'typeorm';
import { AssessmentEntity } from '../assessments/assessment.entity.js';
import { type RankingCard } from '../assessments/ranking-card.js';
import { FindingEntity } from '../findings/finding.entity.js';
import { AreaEntity } from '../people/area.entity.js';
import { visibleTo } from '../people/visible-to.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { byAttention } from './rank.js';

/** The few columns of a valve that decide its list, its place and whether a filter lets it through. */
interface Light {
  readonly id: string;
  readonly tag: string;
  readonly service: string | null;
  readonly areaId: string;
  readonly criticality: Criticality;
  readonly trip: number;
  readonly assessmentId: string | null;
  readonly judged: number | null;
  readonly attention: number | null;
  readonly strongest: number | null;
  readonly windowFrom: number | null;
  readonly assessedAt: number | null;
  readonly runNumber: number | null;
}

type Ranked = Light & { readonly rank: number | null };

const listOf = (valve: Light): RankingQuery['list'] =>
  valve.trip ? 'trip' : valve.judged && valve.attention !== null ? 'ranked' : 'not judged';

/** Reads valves, their newest assessments and their findings together for one screen; loads no entity graphs. */
@Injectable()
export class RankingService {
  constructor(private readonly database: DataSource) {}

  async page(actor: Actor, query: RankingQuery): Promise<RankingPage> {
    const all = ranked(await this.visible(actor));
    const listed = all.filter((valve) => listOf(valve) === query.list && matches(valve, query));
    const chosen = query.kind || query.state ? await this.withFinding(listed, query) : listed;
    const page = chosen.slice(query.page * query.pageSize, (query.page + 1) * query.pageSize);
    return { rows: await this.rows(page), total: chosen.length, summary: summary(all) };
  }

  private async visible(actor: Actor): Promise<Light[]> {
    const query = this.database
      .createQueryBuilder(ValveEntity, 'valve')
      .leftJoin(AssessmentEntity, 'a', 'a.valveId = valve.id AND a.latest = 1')
      .select(['valve.id AS id', 'valve.tag AS tag', 'valve.service AS service', 'valve.areaId AS "areaId"'])
      .addSelect(['valve.criticality AS criticality', 'valve.trip AS trip', 'a.id AS "assessmentId"'])
      .addSelect(['a.judged AS judged', 'a.attention AS attention', 'a.strongest AS strongest'])
      .addSelect([
        'a.windowFrom AS "windowFrom"',
        'a.assessedAt AS "assessedAt"',
        'a.runNumber AS "runNumber"',
      ]);
    return visibleTo(actor, query, 'valve.areaId').getRawMany<Light>();
  }

  private async withFinding(valves: readonly Ranked[], { kind, state }: RankingQuery): Promise<Ranked[]> {
    const found = await this.database.getRepository(FindingEntity).find({
      select: { valveId: true },
      where: { ...(kind ? { kind } : {}), state: state ?? Not('cleared') },
    });
    const ids = new Set(found.map(({ valveId }) => valveId));
    return valves.filter(({ id }) => ids.has(id));
  }

  private async rows(page: readonly Ranked[]): Promise<RankingRow[]> {
    const ids = page.map(({ id }) => id);
    const [areas, assessments, findings] = await Promise.all([
      this.database.getRepository(AreaEntity).find(),
      this.database.getRepository(AssessmentEntity).findBy({ valveId: In(ids), latest: true }),
      this.database.getRepository(FindingEntity).find({
        where: { valveId: In(ids), state: Not(In(['cleared', 'ruled out'])) },
        order: { severity: 'DESC', number: 'ASC' },
      }),
    ]);
    const areaById = new Map(areas.map((area) => [area.id, area]));
    const assessmentOf = new Map(assessments.map((assessment) => [assessment.valveId, assessment]));
    return page.map((valve) => {
      const assessment = assessmentOf.get(valve.id);
      const card = assessment ? (JSON.parse(assessment.card) as RankingCard) : { ridge: null, glyph: null };
      const area = areaById.get(valve.areaId);
      return {
        rank: valve.rank,
        tag: valve.tag,
        service: valve.service,
        area: { id: valve.areaId, code: area?.code ?? '', name: area?.name ?? '' },
        criticality: valve.criticality,
        trip: Boolean(valve.trip),
        attention: valve.attention,
        ...card,
        findings: findings.filter(({ valveId }) => valveId === valve.id).map(presentFinding),
        reason: assessment ? assessment.reason : 'Not assessed yet. Bring in its trends and start a run.',
        window: assessment
          ? {
              from: new Date(assessment.windowFrom).toISOString(),
              to: new Date(assessment.windowTo).toISOString(),
            }
          : null,
      };
    });
  }
}

function ranked(valves: readonly Light[]): Ranked[] {
  const standing = (valve: Light) => ({
    ...valve,
    attention: valve.attention ?? 0,
    strongest: valve.strongest ?? 0,
  });
  let place = 0;
  return [...valves]
    .sort((a, b) => byAttention(standing(a), standing(b)))
    .map((valve) => ({ ...valve, rank: listOf(valve) === 'ranked' ? ++place : null }));
}

function matches(valve: Light, { area, criticality, q }: RankingQuery): boolean {
  const text = `${valve.tag} ${valve.service ?? ''}`.toLowerCase();
  return (
    (!area || valve.areaId === area) &&
    (!criticality || valve.criticality === criticality) &&
    (!q || text.includes(q.toLowerCase()))
  );
}

function presentFinding(finding: FindingEntity): RankingRow['findings'][number] {
  const { kind, number, state, severity, confidence, text, explainedBy } = finding;
  return { kind, number, state, severity, confidence, text, explainedBy };
}

function summary(valves: readonly Ranked[]): RankingPage['summary'] {
  const count = (list: RankingQuery['list']) => valves.filter((valve) => listOf(valve) === list).length;
  const assessed = valves.filter((valve) => valve.assessedAt !== null);
  const newest = assessed.reduce<Ranked | null>(
    (last, valve) => (last === null || (valve.assessedAt ?? 0) > (last.assessedAt ?? 0) ? valve : last),
    null,
  );
  const starts = assessed.map((valve) => valve.windowFrom ?? Infinity);
  return {
    valves: valves.length,
    judged: count('ranked'),
    needAttention: valves.filter((v) => listOf(v) === 'ranked' && Math.round(v.attention ?? 0) >= 1).length,
    trips: count('trip'),
    notJudged: count('not judged'),
    lastRun:
      newest?.runNumber && newest.assessedAt
        ? { number: newest.runNumber, finishedAt: new Date(newest.assessedAt).toISOString() }
        : null,
    since: starts.length > 0 ? new Date(Math.min(...starts)).toISOString() : null,
  };
}
