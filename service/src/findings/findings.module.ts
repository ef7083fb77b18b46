import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { ValvesModule } from '../valves/valves.module.js';
import { FindingEntity } from './finding.entity.js';
import { FindingsController } from './findings.controller.js';
import { FindingsService } from './findings.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([FindingEntity]), ValvesModule],
  controllers: [FindingsController],
  providers: [FindingsService],
  exports: [FindingsService, TypeOrmModule],
})
export class FindingsModule {}
