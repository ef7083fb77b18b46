import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { type Actor } from '@tailrace/shared/contracts/policy';
import {
  type AnalysisRun,
  analysisRun,
  type RunDetail,
  runDetail,
  runDraft,
  type RunDraft,
  type RunPage,
  runPage,
  runQuery,
} from '@tailrace/shared/contracts/runs';
import { type z } from 'zod';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { RunsService } from './runs.service.js';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('runs')
export class RunsController {
  constructor(private readonly runs: RunsService) {}

  /** The analysis runs that touched the asker's areas, newest first, and when the next is due. */
  @Get()
  @Allow('runs:read')
  @Returns(runPage)
  page(@Who() actor: Actor, @Query({ schema: runQuery }) query: z.infer<typeof runQuery>): Promise<RunPage> {
    return this.runs.page(actor, query);
  }

  /** Starts a run over the asker's valves, or the ones named. */
  @Post()
  @Allow('runs:start')
  @HttpCode(202)
  @Returns(analysisRun, 202)
  start(@Who() actor: Actor, @Body({ schema: runDraft }) draft: RunDraft): Promise<AnalysisRun> {
    return this.runs.start(actor, draft);
  }

  /** One run with the outcome of each valve and its reason. */
  @Get(':id')
  @Allow('runs:read')
  @Returns(runDetail)
  byId(@Who() actor: Actor, @Param('id') id: string): Promise<RunDetail> {
    return this.runs.byId(actor, id);
  }

  @Post(':id/stop')
  @Allow('runs:start')
  @HttpCode(200)
  @Returns(runDetail)
  stop(@Who() actor: Actor, @Param('id') id: string): Promise<RunDetail> {
    return this.runs.stop(actor, id);
  }
}
