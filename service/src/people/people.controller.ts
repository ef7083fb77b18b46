import { Body, Controller, Get, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import {
  type Area,
  area,
  areaDraft,
  type AreaDraft,
  type Me,
  me,
  type Person,
  person,
  personDraft,
  type PersonDraft,
} from '@tailrace/shared/contracts/people';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { z } from 'zod';
import { Allow, SignedIn, Who } from '../platform/access.js';
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

  /** Adds an area to the site. */
  @Post('areas')
  @Allow('people:write')
  @Returns(area, 201)
  addArea(@Who() actor: Actor, @Body({ schema: areaDraft }) draft: AreaDraft): Promise<Area> {
    return this.people.addArea(actor, draft);
  }

  /** Adds a person with a first password, a role and areas. */
  @Post('people')
  @Allow('people:write')
  @Returns(person, 201)
  addPerson(@Who() actor: Actor, @Body({ schema: personDraft }) draft: PersonDraft): Promise<Person> {
    return this.people.addPerson(actor, draft);
  }
}
