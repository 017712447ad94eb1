import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put, Query } from '@nestjs/common';
import {
  type CreatedPerson,
  type CreatePersonRequest,
  createPersonSchema,
  type CrewMember,
  type GivePasswordRequest,
  givePasswordSchema,
  type OneTimeLink,
  terminalQuerySchema,
  type UpdatePersonRequest,
  updatePersonSchema,
  type WirePerson,
} from '@stubpost/shared';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { PeopleReadModel } from './people.read-model';
import { PeopleService } from './people.service';

/** People and their roles, for the administrator; names of crews, for those who put them on turns. */
@Controller('api')
export class PeopleController {
  constructor(
    private readonly people: PeopleService,
    private readonly readModel: PeopleReadModel,
  ) {}

  @Get('people')
  @Permit('people.manage')
  list(): Promise<WirePerson[]> {
    return this.readModel.all();
  }

  @Post('people')
  @Permit('people.manage')
  async add(
    @Body(new ZodPipe(createPersonSchema)) body: CreatePersonRequest,
    @CurrentPerson() actor: CurrentPersonFacts,
  ): Promise<CreatedPerson> {
    const { id, link } = await this.people.add(body, actor);
    const person = await this.readModel.one(id);
    return link === null ? person : { ...person, link };
  }

  @Put('people/:id')
  @Permit('people.manage')
  async update(
    @Param('id') id: string,
    @Body(new ZodPipe(updatePersonSchema)) body: UpdatePersonRequest,
    @CurrentPerson() actor: CurrentPersonFacts,
  ): Promise<WirePerson> {
    await this.people.update(id, body, actor);
    return this.readModel.one(id);
  }

  @Post('people/:id/link')
  @Permit('people.manage')
  makeLink(@Param('id') id: string, @CurrentPerson() actor: CurrentPersonFacts): Promise<OneTimeLink> {
    return this.people.makeLink(id, actor);
  }

  @Put('people/:id/password')
  @Permit('people.manage')
  @HttpCode(204)
  async givePassword(
    @Param('id') id: string,
    @Body(new ZodPipe(givePasswordSchema)) body: GivePasswordRequest,
    @CurrentPerson() actor: CurrentPersonFacts,
  ): Promise<void> {
    await this.people.givePassword(id, body.password, actor);
  }

  @Delete('people/:id/sessions')
  @Permit('people.manage')
  @HttpCode(204)
  async endSessions(@Param('id') id: string, @CurrentPerson() actor: CurrentPersonFacts): Promise<void> {
    await this.people.endSessions(id, actor);
  }

  @Get('crew')
  @Permit('crew.read', { terminal: 'query.terminal' })
  crew(@Query(new ZodPipe(terminalQuerySchema)) query: { terminal: string }): Promise<CrewMember[]> {
    return this.readModel.crewOf(query.terminal);
  }
}
