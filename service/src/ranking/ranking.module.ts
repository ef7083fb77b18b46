import { Module } from '@nestjs/common';
import { AssessmentsModule } from '../assessments/assessments.module.js';
import { FindingsModule } from '../findings/findings.module.js';
import { RankingController } from './ranking.controller.js';
import { RankingService } from './ranking.service.js';

@Module({
  imports: [AssessmentsModule, FindingsModule],
  controllers: [RankingController],
  providers: [RankingService],
})
export class RankingModule {}
