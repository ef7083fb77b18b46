import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { FilesModule } from '../files/files.module.js';
import { PeopleModule } from '../people/people.module.js';
import { ValvesModule } from '../valves/valves.module.js';
import { HistorianTagEntity } from './store/historian-tag.entity.js';
import { SampleBlockEntity, StagedBlockEntity } from './store/sample-block.entity.js';
import { SampleStore } from './store/sample-store.js';
import { TakeInService } from './take-in.service.js';
import { TrendFileEntity } from './trend-file.entity.js';
import { TrendsController } from './trends.controller.js';
import { TrendsService } from './trends.service.js';

@Module({
  imports: [
    TypeOrmModule.forFeature([TrendFileEntity, HistorianTagEntity, SampleBlockEntity, StagedBlockEntity]),
    FilesModule,
    PeopleModule,
    ValvesModule,
  ],
  controllers: [TrendsController],
  providers: [TrendsService, TakeInService, SampleStore],
  exports: [TrendsService, SampleStore, FilesModule],
})
export class TrendsModule {}
