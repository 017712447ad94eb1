import { Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { Config } from '../config/config';
import { LinkTokens } from './link-tokens';
import { LinksController } from './links.controller';
import { OneTimeLinks } from './one-time-links.service';
import { OwnPin } from './own-pin.service';
import { OwnSessionsReadModel } from './own-sessions.read-model';
import { Passwords } from './passwords';
import { SessionCache } from './session-cache';
import { SessionCookie } from './session-cookie';
import { SessionEndings } from './session-endings';
import { loadSessionKey } from './session-secret';
import { SESSION_KEY, SessionTokens } from './session-tokens';
import { SessionController } from './session.controller';
import { SessionGuard } from './session.guard';
import { SessionStrategy } from './session.strategy';
import { SessionsService } from './sessions.service';
import { SignInService } from './sign-in.service';
import { SignInThrottle } from './sign-in-throttle';

/** Who is asking: signing in, sessions, passwords, one-time links, and the guard before every route. */
@Module({
  imports: [PassportModule, JwtModule.register({})],
  controllers: [SessionController, LinksController],
  providers: [
    { provide: SESSION_KEY, inject: [Config], useFactory: loadSessionKey },
    { provide: APP_GUARD, useClass: SessionGuard },
    LinkTokens,
    OneTimeLinks,
    OwnPin,
    OwnSessionsReadModel,
    Passwords,
    SessionCache,
    SessionCookie,
    SessionEndings,
    SessionStrategy,
    SessionTokens,
    SessionsService,
    SignInService,
    SignInThrottle,
  ],
  exports: [
    LinkTokens,
    OneTimeLinks,
    Passwords,
    SessionCookie,
    SessionEndings,
    SessionsService,
    SignInService,
  ],
})
export class AuthModule {}
