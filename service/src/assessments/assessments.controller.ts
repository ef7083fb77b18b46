import { Controller, Get, Param } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import {
  type AssessmentPage,
  assessmentPage,
  storedAssessment,
  type StoredAssessment,
} from '@tailrace/shared/contracts/assessments';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { AssessmentsService } from './assessments.service.js';

@ApiTags('assessments')
@ApiBearerAuth()
@Controller()
export class AssessmentsController {
  constructor(private readonly assessments: AssessmentsService) {}

  /** The newest assessment of a valve. */
  @Get('valves/:tag/assessment')
  @Allow('valves:read')
  @Returns(storedAssessment)
  latest(@Who() actor: Actor, @Param('tag') tag: string): Promise<StoredAssessment> {
    return this.assessments.latest(actor, tag);
  }

  /** The assessments of a valve, newest first. */
  @Get('valves/:tag/assessments')
  @Allow('valves:read')
  @Returns(assessmentPage)
  ofValve(@Who() actor: Actor, @Param('tag') tag: string): Promise<AssessmentPage> {
    return this.assessments.ofValve(actor, tag);
  }

  @Get('assessments/:id')
  @Allow('valves:read')
  @Returns(storedAssessment)
  byId(@Who() actor: Actor, @Param('id') id: string): Promise<StoredAssessment> {
    return this.assessments.byId(actor, id);
  }
}
