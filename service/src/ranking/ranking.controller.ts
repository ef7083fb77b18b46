import { Controller, Get, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { type Actor } from '@tailrace/shared/contracts/policy';
import {
  type RankingPage,
  rankingPage,
  rankingQuery,
  type RankingQuery,
} from '@tailrace/shared/contracts/ranking';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { RankingService } from './ranking.service.js';

@ApiTags('ranking')
@ApiBearerAuth()
@Controller('ranking')
export class RankingController {
  constructor(private readonly ranking: RankingService) {}

  /** The valves of the asker's areas, the neediest first; trip valves and those not judged in lists of their own. */
  @Get()
  @Allow('ranking:read')
  @Returns(rankingPage)
  page(@Who() actor: Actor, @Query({ schema: rankingQuery }) query: RankingQuery): Promise<RankingPage> {
    return this.ranking.page(actor, query);
  }
}
