import type { KeyObject } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import type { Request } from 'express';
import { Strategy } from 'passport-jwt';
import type { CurrentPersonFacts } from '../common/signed-in';
import { SessionCookie } from './session-cookie';
import { SESSION_KEY, type SessionClaims, tokenRules } from './session-tokens';
import { SessionsService } from './sessions.service';

/** Name of the strategy in passport. */
export const SESSION_STRATEGY = 'session-cookie';

/** Reads the cookie, checks the signature, then asks the session row: revoked, idle and expired ones are nobody. */
@Injectable()
export class SessionStrategy extends PassportStrategy(Strategy, SESSION_STRATEGY) {
  constructor(
    cookie: SessionCookie,
    private readonly sessions: SessionsService,
    @Inject(SESSION_KEY) key: KeyObject,
  ) {
    super({
      jwtFromRequest: (request: Request) => cookie.read(request),
      // The declared type leaves key objects out; the library underneath takes them.
      secretOrKey: key as unknown as Buffer,
      algorithms: [tokenRules.algorithm],
      issuer: tokenRules.issuer,
      audience: tokenRules.audience,
      // The row holds both limits and is judged by our own clock.
      ignoreExpiration: true,
    });
  }

  async validate(claims: SessionClaims): Promise<CurrentPersonFacts | false> {
    const person = await this.sessions.resolve(claims.jti);
    return person !== null && person.id === claims.sub ? person : false;
  }
}
