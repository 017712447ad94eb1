import { createHash, randomBytes } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { formatInstant, type OneTimeLink, type WireLink } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Config } from '../config/config';
import { Reader } from '../database/reader';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { Passwords } from './passwords';
import { SessionsService } from './sessions.service';

/** A link works this long. */
const linkMilliseconds = 24 * 60 * 60 * 1000;

interface LinkRow {
  token_hash: string;
  person_id: string;
  expires_at: number;
  email: string;
  name: string;
}

/** Links that set a password once. The token is seen once by whoever asked for it; the table keeps its hash. */
@Injectable()
export class OneTimeLinks {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly clock: Clock,
    private readonly config: Config,
    private readonly passwords: Passwords,
    private readonly sessions: SessionsService,
  ) {}

  /** Makes a link for a person; those made before stop working. */
  async make(transaction: Transaction, personId: string): Promise<OneTimeLink> {
    const now = this.clock.now();
    const token = randomBytes(24).toString('base64url');
    await transaction.execute('DELETE FROM one_time_link WHERE person_id = ? AND used_at IS NULL', [
      personId,
    ]);
    await transaction.execute(
      'INSERT INTO one_time_link (token_hash, person_id, created_at, expires_at, used_at) VALUES (?, ?, ?, ?, NULL)',
      [hashed(token), personId, now, now + linkMilliseconds],
    );
    return {
      url: `${this.config.publicUrl}/link/${token}`,
      expiresAt: formatInstant(now + linkMilliseconds),
    };
  }

  /** Whom a link is for. */
  async look(token: string): Promise<WireLink> {
    const link = await this.require(token);
    return { name: link.name, email: link.email, expiresAt: formatInstant(Number(link.expires_at)) };
  }

  /** Sets the password, ends the person's sessions and uses the link up; answers whose it was. */
  async use(token: string, password: string): Promise<string> {
    const link = await this.require(token);
    this.passwords.require(password, link);
    const passwordHash = await this.passwords.hash(password);
    await this.unitOfWork.run(async (transaction) => {
      const used = await transaction.execute(
        'UPDATE one_time_link SET used_at = ? WHERE token_hash = ? AND used_at IS NULL',
        [this.clock.now(), link.token_hash],
      );
      if (used === 0) throw unknownLink();
      await transaction.execute('UPDATE person SET password_hash = ?, version = version + 1 WHERE id = ?', [
        passwordHash,
        link.person_id,
      ]);
      await this.sessions.endAllOf(transaction, link.person_id);
    });
    return link.person_id;
  }

  private async require(token: string): Promise<LinkRow> {
    const [link] = await this.reader.query<LinkRow>(
      `SELECT l.token_hash, l.person_id, l.expires_at, p.email, p.name
       FROM one_time_link l JOIN person p ON p.id = l.person_id
       WHERE l.token_hash = ? AND l.used_at IS NULL AND p.active = ?`,
      [hashed(token), true],
    );
    if (link === undefined || this.clock.now() >= Number(link.expires_at)) throw unknownLink();
    return link;
  }
}

function hashed(token: string): string {
  return createHash('sha256').update(token).digest('base64url');
}

function unknownLink(): Refusal {
  return new Refusal({ code: 'link.unknown', message: 'this link was used, has run out or never was' });
}
