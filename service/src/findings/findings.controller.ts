import { Controller, Get, Param } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { type FindingPage, findingPage } from '@tailrace/shared/contracts/findings';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { FindingsService } from './findings.service.js';

@ApiTags('findings')
@ApiBearerAuth()
@Controller()
export class FindingsController {
  constructor(private readonly findings: FindingsService) {}

  /** The findings of a valve with their state, open ones first. */
  @Get('valves/:tag/findings')
  @Allow('valves:read')
  @Returns(findingPage)
  ofValve(@Who() actor: Actor, @Param('tag') tag: string): Promise<FindingPage> {
    return this.findings.ofValve(actor, tag);
  }
}
