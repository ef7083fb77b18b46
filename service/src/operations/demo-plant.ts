import { Inject, Injectable } from '@nestjs/common';
import { type Actor, type Role } from '@tailrace/shared/contracts/policy';
import { columnPlan } from '@tailrace/shared/contracts/trends';
import { valveForm } from '@tailrace/shared/contracts/valves';
import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { DataSource } from 'typeorm';
import { z } from 'zod';
import { theService } from '../audit/audit.service.js';
import { FileStore } from '../files/file-store.js';
import { AreaEntity } from '../people/area.entity.js';
import { actorOf } from '../people/actor-of.js';
import { PeopleService } from '../people/people.service.js';
import { PersonEntity } from '../people/person.entity.js';
import { SiteEntity } from '../people/site.entity.js';
import { CONFIG, type Config } from '../platform/config.js';
import { Transactions } from '../platform/database/transactions.js';
import { AnalysisRunEntity } from '../runs/analysis-run.entity.js';
import { RunQueue } from '../runs/run-queue.js';
import { RunsService } from '../runs/runs.service.js';
import { TrendsService } from '../trends/trends.service.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { ValvesService } from '../valves/valves.service.js';

const folder = fileURLToPath(new URL('../../../sample-trends', import.meta.url));

const plantFile = z.object({
  site: z.object({
    name: z.string(),
    zone: z.string(),
    coefficientUnit: z.enum(['Cv', 'Kv']),
    barometricPressure: z.number(),
    nightlyAt: z.string(),
  }),
  areas: z.array(z.object({ code: z.string(), name: z.string() })),
  files: z.array(z.object({ file: z.string(), area: z.string(), plan: columnPlan.optional() })),
});
type Plant = z.infer<typeof plantFile>;
const valvesFile = z.array(valveForm.extend({ area: z.string() }));

/** The demo's people. The address says the role; nobody real is meant. */
const people: readonly { name: string; email: string; role: Role; areas: 'all' | 'first two' }[] = [
  { name: 'Oda Brandvik', email: 'operator@tailrace.example', role: 'operator', areas: 'first two' },
  { name: 'Emre Kolland', email: 'engineer@tailrace.example', role: 'engineer', areas: 'all' },
  { name: 'Mira Tveit', email: 'manager@tailrace.example', role: 'manager', areas: 'all' },
  { name: 'Ansel Rook', email: 'admin@tailrace.example', role: 'admin', areas: 'all' },
];

export interface DemoAccount {
  readonly role: Role;
  readonly email: string;
}

/**
 * Brings the demo plant in the way a plant's people would: its register, its trend files through the reader, and
 * one analysis run. Each step looks at what is there first, so that a start that was cut off goes on.
 */
@Injectable()
export class DemoPlant {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly people: PeopleService,
    private readonly valves: ValvesService,
    private readonly files: FileStore,
    private readonly trends: TrendsService,
    private readonly runs: RunsService,
    private readonly queue: RunQueue,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /**
   * @param say told of each step, in words for the terminal
   * @returns the accounts to sign in with; null where the database holds another site
   */
  async bringIn(say: (line: string) => void): Promise<readonly DemoAccount[] | null> {
    const plant = plantFile.parse(JSON.parse(await readFile(join(folder, 'plant.json'), 'utf8')));
    const [site] = await this.database.getRepository(SiteEntity).find({ take: 1 });
    if (site && site.name !== plant.site.name) return null;
    if (!site) say(`Bringing in the demo plant “${plant.site.name}” (first start only) …`);
    const areas = await this.siteAndAreas(plant, site ?? null);
    const actor = await this.demoPeople(areas);
    await this.register(actor, areas);
    for (const file of plant.files) await this.takeIn(actor, areas, file, say);
    await this.firstRun(actor, say);
    return people.map(({ role, email }) => ({ role, email }));
  }

  private async siteAndAreas(plant: Plant, site: SiteEntity | null): Promise<Map<string, AreaEntity>> {
    return this.transactions.run(async (manager) => {
      const siteId = site?.id ?? randomUUID();
      if (!site) await manager.insert(SiteEntity, { id: siteId, ...plant.site });
      const areas = new Map<string, AreaEntity>();
      for (const { code, name } of plant.areas) {
        const known = await manager.findOneBy(AreaEntity, { siteId, code });
        areas.set(code, known ?? (await manager.save(AreaEntity, { id: randomUUID(), siteId, code, name })));
      }
      return areas;
    });
  }

  private async demoPeople(areas: ReadonlyMap<string, AreaEntity>): Promise<Actor> {
    const known = new Set((await this.database.getRepository(PersonEntity).find()).map(({ email }) => email));
    for (const { name, email, role, areas: which } of people) {
      if (known.has(email)) continue;
      const own = which === 'all' ? null : [...areas.values()].slice(0, 2);
      await this.people.add(theService, {
        name,
        email,
        role,
        areas: own,
        password: this.config.demoPassword,
      });
    }
    const admin = await this.database
      .getRepository(PersonEntity)
      .findOneOrFail({ where: { role: 'admin' }, relations: { areas: true } });
    return actorOf(admin);
  }

  private async register(actor: Actor, areas: ReadonlyMap<string, AreaEntity>): Promise<void> {
    const valves = valvesFile.parse(JSON.parse(await readFile(join(folder, 'valves.json'), 'utf8')));
    const known = new Set((await this.database.getRepository(ValveEntity).find()).map(({ tag }) => tag));
    for (const { area, ...form } of valves)
      if (!known.has(form.tag)) await this.valves.create(actor, { ...form, areaId: areaId(areas, area) });
  }

  private async takeIn(
    actor: Actor,
    areas: ReadonlyMap<string, AreaEntity>,
    { file, area, plan }: Plant['files'][number],
    say: (line: string) => void,
  ): Promise<void> {
    const received = await this.files.receive(createReadStream(join(folder, file)));
    const kept = await this.trends.keep(actor, { ...received, name: file, areaId: areaId(areas, area) });
    if (kept.file.state !== 'received') return;
    const looked = await this.trends.look(actor, kept.file.id, plan ?? null);
    const { done } = await this.trends.takeIn(actor, kept.file.id, { plan: looked.plan, bind: [] });
    await done;
    const after = await this.trends.byId(actor, kept.file.id);
    say(
      `  ${file}: ${after.state}${after.report ? `, ${after.report.samples} samples` : ''}${after.refusal ? ` – ${after.refusal}` : ''}`,
    );
  }

  private async firstRun(actor: Actor, say: (line: string) => void): Promise<void> {
    if ((await this.database.getRepository(AnalysisRunEntity).count()) === 0) {
      say('  assessing the valves …');
      await this.runs.start(actor, {}, 'seed');
    }
    await this.queue.work();
  }
}

function areaId(areas: ReadonlyMap<string, AreaEntity>, code: string): string {
  const area = areas.get(code);
  if (!area) throw new Error(`the demo plant has no area ${code}`);
  return area.id;
}
