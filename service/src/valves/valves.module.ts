import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { PeopleModule } from '../people/people.module.js';
import { DataSheetEntity } from './data-sheet.entity.js';
import { SignalEntity } from './signal.entity.js';
import { SignalsService } from './signals.service.js';
import { ValveEntity } from './valve.entity.js';
import { ValvesController } from './valves.controller.js';
import { ValvesService } from './valves.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([ValveEntity, DataSheetEntity, SignalEntity]), PeopleModule],
  controllers: [ValvesController],
  providers: [ValvesService, SignalsService],
  exports: [ValvesService, SignalsService, TypeOrmModule],
})
export class ValvesModule {}
