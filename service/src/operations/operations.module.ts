import { Module } from '@nestjs/common';
import { FilesModule } from '../files/files.module.js';
import { PeopleModule } from '../people/people.module.js';
import { RunsModule } from '../runs/runs.module.js';
import { TrendsModule } from '../trends/trends.module.js';
import { ValvesModule } from '../valves/valves.module.js';
import { DemoPlant } from './demo-plant.js';
import { FirstStart } from './first-start.js';

@Module({
  imports: [FilesModule, PeopleModule, ValvesModule, TrendsModule, RunsModule],
  providers: [DemoPlant, FirstStart],
})
export class OperationsModule {}
