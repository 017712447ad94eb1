import { Injectable } from '@nestjs/common';
import { hash, verify } from '@node-rs/argon2';
import { judgePassword, passwordAdvised, passwordLongest, passwordShortest } from '@stubpost/shared';
import { Refusal } from '../common/refusal';

/** Argon2id in the library's numbering; its enumeration cannot be used from separately compiled files. */
const argon2id = 2;
/** OWASP's password storage sheet: Argon2id with 19 MiB, two passes, one lane. */
const cost = { algorithm: argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;
/** Two at a time leave the rest of a two-core machine to everybody else. */
const atOnce = 2;
const longestQueue = 60;

/** Whom a password is for; their own name and address make no good one. */
export interface PasswordOwner {
  email: string;
  name: string;
}

/** Judges, hashes and checks passwords; never more than two at once. */
@Injectable()
export class Passwords {
  private running = 0;
  private readonly waiting: (() => void)[] = [];
  private decoy: Promise<string> | undefined;

  /** Refuses a password that is too short, too long or too well known. */
  require(password: string, owner: PasswordOwner): void {
    const verdict = judgePassword(password, [owner.email, owner.name]);
    if (verdict === 'good') return;
    throw new Refusal({
      code: verdict,
      message: 'this password is not good enough',
      facts: { shortest: passwordShortest, longest: passwordLongest, advised: passwordAdvised },
    });
  }

  hash(password: string): Promise<string> {
    return this.inTurn(() => hash(password, cost));
  }

  /** Without a hash the same work is done for nothing, so that the time taken does not tell who exists. */
  async verify(passwordHash: string | null, password: string): Promise<boolean> {
    const against = passwordHash ?? (await this.decoyHash());
    const matches = await this.inTurn(() => verify(against, password));
    return matches && passwordHash !== null;
  }

  private decoyHash(): Promise<string> {
    this.decoy ??= this.hash('nobody has this password');
    return this.decoy;
  }

  private async inTurn<Outcome>(work: () => Promise<Outcome>): Promise<Outcome> {
    if (this.running >= atOnce) {
      if (this.waiting.length >= longestQueue) {
        throw new Refusal({ code: 'server.busy', message: 'too many people are signing in at this moment' });
      }
      await new Promise<void>((resolve) => this.waiting.push(resolve));
    } else {
      this.running += 1;
    }
    try {
      return await work();
    } finally {
      const next = this.waiting.shift();
      if (next === undefined) this.running -= 1;
      else next();
    }
  }
}
