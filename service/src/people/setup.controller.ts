import { Body, Controller, Get, Post, Req, Res } from '@nestjs/common';
import {
  type FirstAdministratorRequest,
  firstAdministratorSchema,
  type SessionAnswer,
  type SetupAnswer,
} from '@stubpost/shared';
import type { Request, Response } from 'express';
import { SessionCookie } from '../auth/session-cookie';
import { SignInService } from '../auth/sign-in.service';
import { Public } from '../common/decorators';
import { Refusal } from '../common/refusal';
import { visitorOf } from '../common/visitor';
import { ZodPipe } from '../common/zod.pipe';
import { Installation } from '../database/installation';
import { PeopleReadModel } from './people.read-model';
import { PeopleService } from './people.service';

/** The one-time set-up of an installation that has nobody yet. */
@Controller('api/setup')
export class SetupController {
  constructor(
    private readonly people: PeopleService,
    private readonly installation: Installation,
    private readonly readModel: PeopleReadModel,
    private readonly signIns: SignInService,
    private readonly cookie: SessionCookie,
  ) {}

  @Get()
  @Public()
  async isNeeded(): Promise<SetupAnswer> {
    return { needed: await this.isSetupNeeded() };
  }

  @Post()
  @Public()
  async setUp(
    @Body(new ZodPipe(firstAdministratorSchema)) body: FirstAdministratorRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    if (!(await this.isSetupNeeded())) {
      throw new Refusal({ code: 'setup.done', message: 'this installation has its people already' });
    }
    const personId = await this.people.addFirstAdministrator(body);
    const signedIn = await this.signIns.openFor(personId, visitorOf(request).device);
    this.cookie.set(response, signedIn.token, signedIn.endsAt);
    return { person: signedIn.person };
  }

  private async isSetupNeeded(): Promise<boolean> {
    return !(await this.readModel.isAnybodyThere()) && !(await this.installation.isDemoWanted());
  }
}
