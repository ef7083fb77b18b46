import { Inject, Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource } from 'typeorm';
import { theService } from '../audit/audit.service.js';
import { PeopleService } from '../people/people.service.js';
import { PersonEntity } from '../people/person.entity.js';
import { SiteEntity } from '../people/site.entity.js';
import { CONFIG, type Config } from '../platform/config.js';
import { Transactions } from '../platform/database/transactions.js';

/** kPa(a): the standard atmosphere, until the site says otherwise */
const standardAtmosphere = 101.325;

/** An empty database becomes a site with one administrator, who adds areas and people. */
@Injectable()
export class FirstStart {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
    private readonly people: PeopleService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async prepare(say: (line: string) => void): Promise<void> {
    const { siteName, zone, admin } = this.config.firstStart;
    if (!(await this.database.getRepository(SiteEntity).count()))
      await this.transactions.run((manager) =>
        manager.insert(SiteEntity, {
          id: randomUUID(),
          name: siteName,
          zone,
          coefficientUnit: 'Kv',
          barometricPressure: standardAtmosphere,
          nightlyAt: '02:00',
        }),
      );
    if (await this.database.getRepository(PersonEntity).count()) return;
    if (!admin) {
      say('Nobody can sign in yet: set ADMIN_EMAIL and ADMIN_PASSWORD and start again.');
      return;
    }
    await this.people.add(theService, { ...admin, name: 'Site administrator', role: 'admin', areas: null });
    say(`${admin.email} can sign in and add areas and people.`);
  }
}
