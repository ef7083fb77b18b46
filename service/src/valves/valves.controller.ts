import { Body, Controller, Get, Param, Post, Put, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { type Actor } from '@tailrace/shared/contracts/policy';
import {
  type Valve,
  valve,
  valveDraft,
  type ValveDraft,
  type ValvePage,
  valvePage,
  valveQuery,
  type ValveQuery,
} from '@tailrace/shared/contracts/valves';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { ValvesService } from './valves.service.js';

@ApiTags('valves')
@ApiBearerAuth()
@Controller('valves')
export class ValvesController {
  constructor(private readonly valves: ValvesService) {}

  /** The register: the valves of the asker's areas. */
  @Get()
  @Allow('valves:read')
  @Returns(valvePage)
  page(@Who() actor: Actor, @Query({ schema: valveQuery }) query: ValveQuery): Promise<ValvePage> {
    return this.valves.page(actor, query);
  }

  @Get(':tag')
  @Allow('valves:read')
  @Returns(valve)
  byTag(@Who() actor: Actor, @Param('tag') tag: string): Promise<Valve> {
    return this.valves.byTag(actor, tag);
  }

  @Post()
  @Allow('valves:write')
  @Returns(valve, 201)
  create(@Who() actor: Actor, @Body({ schema: valveDraft }) draft: ValveDraft): Promise<Valve> {
    return this.valves.create(actor, draft);
  }

  /** Changes a valve as a whole; `version` is the one the editor saw. */
  @Put(':tag')
  @Allow('valves:write')
  @Returns(valve)
  update(
    @Who() actor: Actor,
    @Param('tag') tag: string,
    @Body({ schema: valveDraft }) draft: ValveDraft,
  ): Promise<Valve> {
    return this.valves.update(actor, tag, draft);
  }
}
