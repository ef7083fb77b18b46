import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { ValvesModule } from '../valves/valves.module.js';
import { AssessmentEntity } from './assessment.entity.js';
import { AssessmentsController } from './assessments.controller.js';
import { AssessmentsService } from './assessments.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([AssessmentEntity]), ValvesModule],
  controllers: [AssessmentsController],
  providers: [AssessmentsService],
  exports: [AssessmentsService, TypeOrmModule],
})
export class AssessmentsModule {}
