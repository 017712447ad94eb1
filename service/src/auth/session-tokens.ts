import { type KeyObject, randomBytes } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import type { Instant } from '@stubpost/shared';

/** Injection token of the signing key. */
export const SESSION_KEY = Symbol('session key');

/** Fixed parts of every token; anything else is refused. */
export const tokenRules = { issuer: 'stubpost', audience: 'stubpost-session', algorithm: 'HS256' } as const;

/** What a token says: which session row it stands for, whose, and until when at most (seconds). */
export interface SessionClaims {
  jti: string;
  sub: string;
  exp: number;
}

/** Makes and reads the token in the session cookie. */
@Injectable()
export class SessionTokens {
  constructor(
    private readonly jwt: JwtService,
    @Inject(SESSION_KEY) private readonly key: KeyObject,
  ) {}

  newSessionId(): string {
    return randomBytes(24).toString('base64url');
  }

  sign(session: { id: string; personId: string; startedAt: Instant; endsAt: Instant }): string {
    return this.jwt.sign(
      { iat: Math.floor(session.startedAt / 1000), exp: Math.floor(session.endsAt / 1000) },
      {
        // The declared type leaves key objects out; the library underneath takes them.
        secret: this.key as unknown as Buffer,
        algorithm: tokenRules.algorithm,
        issuer: tokenRules.issuer,
        audience: tokenRules.audience,
        jwtid: session.id,
        subject: session.personId,
      },
    );
  }

  /** The session a token names, or null for anything we did not sign. Says nothing about whether it still stands. */
  sessionIdOf(token: string): string | null {
    try {
      const claims = this.jwt.verify<SessionClaims>(token, {
        secret: this.key as unknown as Buffer,
        algorithms: [tokenRules.algorithm],
        issuer: tokenRules.issuer,
        audience: tokenRules.audience,
        ignoreExpiration: true,
      });
      return claims.jti;
    } catch {
      return null;
    }
  }
}
