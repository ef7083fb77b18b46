import { DynamicModule, Module } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { AuditModule } from './audit/audit.module.js';
import { PeopleModule } from './people/people.module.js';
import { type Config } from './platform/config.js';
import { PlatformModule } from './platform/platform.module.js';
import { AssessmentsModule } from './assessments/assessments.module.js';
import { FindingsModule } from './findings/findings.module.js';
import { RankingModule } from './ranking/ranking.module.js';
import { OperationsModule } from './operations/operations.module.js';
import { RunsModule } from './runs/runs.module.js';
import { TrendsModule } from './trends/trends.module.js';
import { ValvesModule } from './valves/valves.module.js';

/** The product's table of contents, in the one order modules may import each other. */
@Module({})
export class AppModule {
  static forRoot(config: Config): DynamicModule {
    return {
      module: AppModule,
      imports: [
        PlatformModule.forRoot(config),
        ScheduleModule.forRoot(),
        AuditModule,
        PeopleModule,
        ValvesModule,
        TrendsModule,
        AssessmentsModule,
        FindingsModule,
        RankingModule,
        RunsModule,
        OperationsModule,
      ],
    };
  }
}
