import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put, Req, Res } from '@nestjs/common';
import {
  type ChangePasswordRequest,
  changePasswordSchema,
  type ChangePinRequest,
  changePinSchema,
  type OwnBadge,
  type OwnSession,
  type SessionAnswer,
  type SignInRequest,
  signInSchema,
} from '@stubpost/shared';
import type { Request, Response } from 'express';
import { CurrentPerson, Permit, Public } from '../common/decorators';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { visitorOf } from '../common/visitor';
import { ZodPipe } from '../common/zod.pipe';
import { OwnPin } from './own-pin.service';
import { OwnSessionsReadModel } from './own-sessions.read-model';
import { SessionCookie } from './session-cookie';
import { SessionTokens } from './session-tokens';
import { SessionsService } from './sessions.service';
import { SignInService } from './sign-in.service';

/** Signing in and out, and what a person may see and do about their own sign-in. */
@Controller('api/session')
export class SessionController {
  constructor(
    private readonly signIns: SignInService,
    private readonly sessions: SessionsService,
    private readonly ownSessions: OwnSessionsReadModel,
    private readonly ownPin: OwnPin,
    private readonly cookie: SessionCookie,
    private readonly tokens: SessionTokens,
  ) {}

  @Post()
  @Public()
  @HttpCode(200)
  async signIn(
    @Body(new ZodPipe(signInSchema)) body: SignInRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    const signedIn = await this.signIns.signIn(body, visitorOf(request));
    await this.endEarlierSessionOf(request);
    this.cookie.set(response, signedIn.token, signedIn.endsAt);
    return { person: signedIn.person };
  }

  @Get()
  @Permit('session')
  who(@CurrentPerson() person: CurrentPersonFacts): SessionAnswer {
    return { person: { id: person.id, name: person.name, roles: person.roles } };
  }

  @Delete()
  @Permit('session')
  @HttpCode(204)
  async signOut(
    @CurrentPerson() person: CurrentPersonFacts,
    @Res({ passthrough: true }) response: Response,
  ): Promise<void> {
    await this.sessions.end(person.id, person.sessionId);
    this.cookie.clear(response);
    // The browser drops what it kept for this person, too.
    response.setHeader('Clear-Site-Data', '"cache"');
  }

  @Put('password')
  @Permit('session')
  @HttpCode(204)
  async changePassword(
    @CurrentPerson() person: CurrentPersonFacts,
    @Body(new ZodPipe(changePasswordSchema)) body: ChangePasswordRequest,
    @Req() request: Request,
  ): Promise<void> {
    const { address } = visitorOf(request);
    await this.signIns.changePassword({ personId: person.id, sessionId: person.sessionId, address }, body);
  }

  @Get('pin')
  @Permit('session')
  badge(@CurrentPerson() person: CurrentPersonFacts): Promise<OwnBadge> {
    return this.ownPin.look(person.id);
  }

  @Put('pin')
  @Permit('session')
  @HttpCode(204)
  async changePin(
    @CurrentPerson() person: CurrentPersonFacts,
    @Body(new ZodPipe(changePinSchema)) body: ChangePinRequest,
    @Req() request: Request,
  ): Promise<void> {
    const { address } = visitorOf(request);
    await this.ownPin.change({ personId: person.id, address }, body);
  }

  @Get('list')
  @Permit('session')
  list(@CurrentPerson() person: CurrentPersonFacts): Promise<OwnSession[]> {
    return this.ownSessions.of(person);
  }

  @Delete('list/:id')
  @Permit('session')
  @HttpCode(204)
  async endOne(@CurrentPerson() person: CurrentPersonFacts, @Param('id') id: string): Promise<void> {
    if (await this.sessions.end(person.id, id)) return;
    throw new Refusal({ code: 'session.unknown', message: 'there is no such session of yours' });
  }

  /** A browser that signs in anew leaves no earlier session of its own behind. */
  private async endEarlierSessionOf(request: Request): Promise<void> {
    const token = this.cookie.read(request);
    const sessionId = token === null ? null : this.tokens.sessionIdOf(token);
    const earlier = sessionId === null ? null : await this.sessions.resolve(sessionId);
    if (earlier !== null) await this.sessions.end(earlier.id, earlier.sessionId);
  }
}
