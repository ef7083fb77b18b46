import { Injectable } from '@nestjs/common';
import { InjectRepository } from '@nestjs/typeorm';
import {
  type Area,
  type AreaDraft,
  type Me,
  type Person,
  type PersonDraft,
} from '@tailrace/shared/contracts/people';
import { type Actor, type Role, seesArea } from '@tailrace/shared/contracts/policy';
import { randomUUID } from 'node:crypto';
import { In, Repository } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../platform/clock.js';
import { Transactions } from '../platform/database/transactions.js';
import { Problem } from '../platform/problem.js';
import { AreaEntity } from './area.entity.js';
import { hashPassword } from './passwords.js';
import { PersonEntity } from './person.entity.js';
import { SiteEntity } from './site.entity.js';

export interface NewPerson {
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  readonly password: string;
  /** null: all areas */
  readonly areas: readonly AreaEntity[] | null;
}

@Injectable()
export class PeopleService {
  constructor(
    private readonly transactions: Transactions,
    @InjectRepository(PersonEntity) private readonly people: Repository<PersonEntity>,
    @InjectRepository(AreaEntity) private readonly areas: Repository<AreaEntity>,
    @InjectRepository(SiteEntity) private readonly sites: Repository<SiteEntity>,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** The site; a service without one has nothing to show yet. */
  async site(): Promise<SiteEntity> {
    const [site] = await this.sites.find({ take: 1 });
    if (!site) throw new Problem('not-ready');
    return site;
  }

  async me(actor: Actor): Promise<Me> {
    const person = await this.people.findOneByOrFail({ id: actor.id });
    const site = await this.site();
    return {
      id: person.id,
      name: person.name,
      email: person.email,
      role: person.role,
      allAreas: person.allAreas,
      areas: await this.areasOf(actor),
      site: { name: site.name, zone: site.zone, coefficientUnit: site.coefficientUnit },
    };
  }

  /** Adds an area to the site. Its code must be new; only who sees all areas may, for it would be theirs too. */
  async addArea(actor: Actor, draft: AreaDraft): Promise<Area> {
    if (actor.areas !== null) throw new Problem('not-allowed');
    const { id: siteId } = await this.site();
    return this.transactions.run(async (manager) => {
      if (await manager.existsBy(AreaEntity, { siteId, code: draft.code }))
        throw new Problem('already-exists');
      const { id, code, name } = await manager.save(AreaEntity, { id: randomUUID(), siteId, ...draft });
      await this.audit.record(manager, actor, {
        action: 'added',
        subjectType: 'area',
        subjectId: id,
        areaId: id,
        after: { code, name },
      });
      return { id, code, name };
    });
  }

  /** Adds a person with the areas named; null: all of them. Nobody gives more areas than they have. */
  async addPerson(actor: Actor, { areaIds, ...draft }: PersonDraft): Promise<Person> {
    if (actor.areas !== null && (areaIds === null || !areaIds.every((id) => seesArea(actor, id))))
      throw new Problem('invalid-input', 'area-not-yours', [
        { pointer: '/areaIds', detail: 'Choose from your own areas.' },
      ]);
    const areas = areaIds && (await this.areas.findBy({ id: In(areaIds) }));
    if (areas && areas.length < new Set(areaIds).size)
      throw new Problem('invalid-input', null, [
        { pointer: '/areaIds', detail: 'One of these areas does not exist.' },
      ]);
    const { id, name, email, role, allAreas } = await this.add(actor, { ...draft, areas });
    return { id, name, email, role, areaIds: allAreas ? null : (areas ?? []).map((area) => area.id) };
  }

  async areasOf(actor: Pick<Actor, 'areas'>): Promise<Area[]> {
    const areas = await this.areas.find({ order: { code: 'ASC' } });
    return areas
      .filter((area) => actor.areas === null || actor.areas.includes(area.id))
      .map(({ id, code, name }) => ({ id, code, name }));
  }

  /** Adds a person. The e-mail address must be new. */
  async add(
    actor: { readonly id: string | null; readonly name: string },
    draft: NewPerson,
  ): Promise<PersonEntity> {
    const passwordHash = await hashPassword(draft.password);
    return this.transactions.run(async (manager) => {
      if (await manager.existsBy(PersonEntity, { email: draft.email })) throw new Problem('already-exists');
      const person = await manager.save(
        manager.create(PersonEntity, {
          id: randomUUID(),
          email: draft.email,
          name: draft.name,
          role: draft.role,
          allAreas: draft.areas === null,
          areas: [...(draft.areas ?? [])],
          active: true,
          createdAt: this.clock.now(),
          passwordHash,
        }),
      );
      await this.audit.record(manager, actor, {
        action: 'added',
        subjectType: 'person',
        subjectId: person.id,
        after: {
          email: person.email,
          name: person.name,
          role: person.role,
          areas: person.areas.map((a) => a.code),
        },
      });
      return person;
    });
  }
}
