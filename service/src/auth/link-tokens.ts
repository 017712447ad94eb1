import { createHash, createHmac, type KeyObject } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { SESSION_KEY } from './session-tokens';

/** Characters of a token: 132 bits, short enough for a text message. */
export const linkTokenLength = 22;

/**
 * Tokens of links in messages. A token follows from what it is for and the installation's key, so that a message which
 * goes out again after a crash is the same message; tables keep hashes, and nobody reads a token out of them.
 */
@Injectable()
export class LinkTokens {
  constructor(@Inject(SESSION_KEY) private readonly key: KeyObject) {}

  /** The token for something, named by a text of its own. */
  tokenFor(purpose: string): string {
    return createHmac('sha256', this.key)
      .update(`link in a message: ${purpose}`)
      .digest('base64url')
      .slice(0, linkTokenLength);
  }

  /** What a table keeps of a token. */
  hashOf(token: string): string {
    return createHash('sha256').update(token).digest('base64url');
  }
}
