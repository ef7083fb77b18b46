import { Controller, Get } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { type Area, area, type Me, me } from '@tailrace/shared/contracts/people';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { z } from 'zod';
import { SignedIn, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { PeopleService } from './people.service.js';

@ApiTags('people')
@ApiBearerAuth()
@Controller()
export class PeopleController {
  constructor(private readonly people: PeopleService) {}

  /** Who is signed in, with their role, areas and site. */
  @Get('me')
  @SignedIn()
  @Returns(me)
  me(@Who() actor: Actor): Promise<Me> {
    return this.people.me(actor);
  }

  /** The areas of who asks. */
  @Get('areas')
  @SignedIn()
  @Returns(z.array(area))
  areas(@Who() actor: Actor): Promise<Area[]> {
    return this.people.areasOf(actor);
  }
}
