import { Body, Controller, Get, HttpCode, Post, Req, Res } from '@nestjs/common';
import {
  type DemoSessionRequest,
  demoSessionSchema,
  type SessionAnswer,
  type WireDemo,
} from '@stubpost/shared';
import type { Request, Response } from 'express';
import { SessionCookie } from '../auth/session-cookie';
import { Permit, Public } from '../common/decorators';
import { visitorOf } from '../common/visitor';
import { ZodPipe } from '../common/zod.pipe';
import { DemoService } from './demo.service';

/** What only a demo has: people to sign in as with one click, and a way out. */
@Controller('api/demo')
export class DemoController {
  constructor(
    private readonly demo: DemoService,
    private readonly cookie: SessionCookie,
  ) {}

  @Get()
  @Public()
  look(): Promise<WireDemo> {
    return this.demo.look();
  }

  @Post('session')
  @Public()
  @HttpCode(200)
  async signIn(
    @Body(new ZodPipe(demoSessionSchema)) body: DemoSessionRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    const signedIn = await this.demo.signIn(body.personId, visitorOf(request).device);
    this.cookie.set(response, signedIn.token, signedIn.endsAt);
    return { person: signedIn.person };
  }

  @Post('leaving')
  @Permit('demo.leave')
  @HttpCode(202)
  async leave(@Res({ passthrough: true }) response: Response): Promise<void> {
    await this.demo.leave();
    this.cookie.clear(response);
    // The answer goes out first: the restart closes every connection.
    response.once('finish', () => setImmediate(() => this.demo.restart()));
  }
}
