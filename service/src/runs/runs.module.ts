import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AssessmentsModule } from '../assessments/assessments.module.js';
import { FindingsModule } from '../findings/findings.module.js';
import { PeopleModule } from '../people/people.module.js';
import { TrendsModule } from '../trends/trends.module.js';
import { ValvesModule } from '../valves/valves.module.js';
import { AnalysisRunEntity } from './analysis-run.entity.js';
import { RunQueue } from './run-queue.js';
import { RunValveEntity } from './run-valve.entity.js';
import { RunsController } from './runs.controller.js';
import { RunsService } from './runs.service.js';
import { ValveAssessor } from './valve-assessor.js';

@Module({
  imports: [
    TypeOrmModule.forFeature([AnalysisRunEntity, RunValveEntity]),
    PeopleModule,
    ValvesModule,
    TrendsModule,
    AssessmentsModule,
    FindingsModule,
  ],
  controllers: [RunsController],
  providers: [RunsService, RunQueue, ValveAssessor],
  exports: [RunsService, RunQueue],
})
export class RunsModule {}
