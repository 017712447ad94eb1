import { Body, Controller, Get, HttpCode, Param, Post, Req, Res } from '@nestjs/common';
import { type SessionAnswer, type UseLinkRequest, useLinkSchema, type WireLink } from '@stubpost/shared';
import type { Request, Response } from 'express';
import { Public } from '../common/decorators';
import { visitorOf } from '../common/visitor';
import { ZodPipe } from '../common/zod.pipe';
import { OneTimeLinks } from './one-time-links.service';
import { SessionCookie } from './session-cookie';
import { SignInService } from './sign-in.service';

/** What somebody with a one-time link can do: see whom it is for, set a password, be signed in. */
@Controller('api/links')
export class LinksController {
  constructor(
    private readonly links: OneTimeLinks,
    private readonly signIns: SignInService,
    private readonly cookie: SessionCookie,
  ) {}

  @Get(':token')
  @Public()
  look(@Param('token') token: string): Promise<WireLink> {
    return this.links.look(token);
  }

  @Post(':token')
  @Public()
  @HttpCode(200)
  async use(
    @Param('token') token: string,
    @Body(new ZodPipe(useLinkSchema)) body: UseLinkRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    const personId = await this.links.use(token, body.password);
    const signedIn = await this.signIns.openFor(personId, visitorOf(request).device);
    this.cookie.set(response, signedIn.token, signedIn.endsAt);
    return { person: signedIn.person };
  }
}
