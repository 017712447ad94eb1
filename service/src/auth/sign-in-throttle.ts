import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';

/** How many failed tries are free, and how the wait grows after them. Milliseconds. */
interface ThrottleRule {
  free: number;
  firstWait: number;
  longestWait: number;
}

const minute = 60 * 1000;
/** Our choice: five slips are human; after that a guesser gets a few tries an hour, the owner waits half a minute. */
const accountRule: ThrottleRule = { free: 5, firstWait: minute / 2, longestWait: 15 * minute };
/** Our choice: many people may share one address, so it is allowed more. */
const addressRule: ThrottleRule = { free: 50, firstWait: minute / 2, longestWait: 5 * minute };
/** Failed tries this old are forgotten. */
const memory = 60 * minute;

/** Who tries, and from where. */
export interface SignInTry {
  /** The name as it was typed: an address, or `badge ` and the badge. */
  account: string;
  address: string;
}

/**
 * Slows guessing down, by account and by address. Each try is counted before the password is looked at, so that many
 * at once count as many; a good one wipes the count. The table keeps hashes: people type passwords into name fields.
 */
@Injectable()
export class SignInThrottle {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /** Counts a try, or refuses it with the seconds to wait. */
  async admit(attempt: SignInTry): Promise<void> {
    const waitMilliseconds = await this.unitOfWork.run(async (transaction) => {
      const account = await this.rowOf(transaction, accountKey(attempt));
      const address = await this.rowOf(transaction, addressKey(attempt));
      const wait = Math.max(account.blockedUntil, address.blockedUntil) - this.clock.now();
      if (wait > 0) return wait;
      await this.count(transaction, account, accountRule);
      await this.count(transaction, address, addressRule);
      return 0;
    });
    if (waitMilliseconds <= 0) return;
    throw new Refusal({
      code: 'session.too_many_tries',
      message: 'too many failed tries',
      facts: { retryAfterSeconds: Math.ceil(waitMilliseconds / 1000) },
    });
  }

  /** A good try wipes what was counted. */
  async forget(transaction: Transaction, attempt: SignInTry): Promise<void> {
    await transaction.execute('DELETE FROM sign_in_attempt WHERE key IN (?, ?)', [
      accountKey(attempt),
      addressKey(attempt),
    ]);
  }

  private async rowOf(transaction: Transaction, key: string): Promise<ThrottleRow> {
    const [row] = await transaction.query<
      { failed: number; last_failed_at: number; blocked_until: number }[]
    >('SELECT failed, last_failed_at, blocked_until FROM sign_in_attempt WHERE key = ?', [key]);
    if (row === undefined || this.clock.now() - Number(row.last_failed_at) > memory) {
      return { key, failed: 0, blockedUntil: 0 };
    }
    return { key, failed: row.failed, blockedUntil: Number(row.blocked_until) };
  }

  private async count(transaction: Transaction, row: ThrottleRow, rule: ThrottleRule): Promise<void> {
    const now = this.clock.now();
    const failed = row.failed + 1;
    await transaction.execute(
      `INSERT INTO sign_in_attempt (key, failed, last_failed_at, blocked_until) VALUES (?, ?, ?, ?)
       ON CONFLICT (key) DO UPDATE SET failed = excluded.failed, last_failed_at = excluded.last_failed_at,
       blocked_until = excluded.blocked_until`,
      [row.key, failed, now, now + waitAfter(failed, rule)],
    );
  }
}

interface ThrottleRow {
  key: string;
  failed: number;
  blockedUntil: number;
}

/** The wait doubles with each try past the free ones: 30 s, 1 min, 2 min … up to the longest. */
function waitAfter(failed: number, rule: ThrottleRule): number {
  if (failed < rule.free) return 0;
  return Math.min(rule.longestWait, rule.firstWait * 2 ** Math.min(failed - rule.free, 20));
}

function accountKey(attempt: SignInTry): string {
  return hashed(`account ${attempt.account.toLowerCase()}`);
}

function addressKey(attempt: SignInTry): string {
  return hashed(`address ${attempt.address}`);
}

function hashed(text: string): string {
  return createHash('sha256').update(text).digest('base64url');
}
