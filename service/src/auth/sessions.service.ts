import { Injectable } from '@nestjs/common';
import type { Instant, Role, RoleGrant } from '@stubpost/shared';
import { Clock } from '../common/clock';
import type { CurrentPersonFacts } from '../common/signed-in';
import { Reader } from '../database/reader';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { type ReadSession, SessionCache } from './session-cache';
import { SessionEndings } from './session-endings';
import { SessionTokens } from './session-tokens';

const hour = 60 * 60 * 1000;

/** A session nobody used for this long is over: longer than a shift with its breaks. Our choice. */
export const sessionIdleMilliseconds = 16 * hour;
/** Whatever happens, one signs in again after this long. Our choice. */
export const sessionLongestMilliseconds = 7 * 24 * hour;
/** How stale "last seen" may become before it is written again. */
const touchMilliseconds = 60 * 1000;

/** A session that was just opened, with the token for its cookie. */
export interface OpenedSession {
  token: string;
  endsAt: Instant;
}

interface SessionPersonRow {
  person_id: string;
  name: string;
  last_seen_at: number;
  ends_at: number;
  role: string | null;
  terminal: string | null;
}

/** Sessions as rows: a token without a standing row is worth nothing, so ending a row ends the session at once. */
@Injectable()
export class SessionsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly clock: Clock,
    private readonly tokens: SessionTokens,
    private readonly cache: SessionCache,
    private readonly endings: SessionEndings,
  ) {}

  async open(transaction: Transaction, personId: string, device: string): Promise<OpenedSession> {
    const startedAt = this.clock.now();
    const endsAt = startedAt + sessionLongestMilliseconds;
    const id = this.tokens.newSessionId();
    await transaction.execute(
      `INSERT INTO session (id, person_id, started_at, last_seen_at, ends_at, ended_at, device)
       VALUES (?, ?, ?, ?, ?, NULL, ?)`,
      [id, personId, startedAt, startedAt, endsAt, device.slice(0, 200)],
    );
    return { token: this.tokens.sign({ id, personId, startedAt, endsAt }), endsAt };
  }

  /** The person of a standing session, or null. Using it keeps it from falling idle. */
  async resolve(sessionId: string): Promise<CurrentPersonFacts | null> {
    const now = this.clock.now();
    const session = this.cache.find(sessionId, now) ?? (await this.read(sessionId, now));
    if (session === null) return null;
    const idleMilliseconds = now - session.lastSeenAt;
    if (now >= session.endsAt || idleMilliseconds >= sessionIdleMilliseconds) return null;
    if (idleMilliseconds >= touchMilliseconds) await this.touch(sessionId, now);
    return session.person;
  }

  /** To be called where a person's name, roles or being active change: the next request sees it. */
  personChanges(transaction: Transaction, personId: string): void {
    transaction.afterCommit(() => this.cache.dropPerson(personId));
  }

  /** Ends a person's sessions, all of them or all but one. */
  async endAllOf(transaction: Transaction, personId: string, exceptSessionId?: string): Promise<void> {
    const rows = await transaction.query<{ id: string }[]>(
      'UPDATE session SET ended_at = ? WHERE person_id = ? AND ended_at IS NULL AND id <> ? RETURNING id',
      [this.clock.now(), personId, exceptSessionId ?? ''],
    );
    transaction.afterCommit(() => {
      this.cache.dropPerson(personId);
      this.endings.publish(rows.map((row) => row.id));
    });
  }

  /** Ends one session of a person; false when there is no such standing one. */
  end(personId: string, sessionId: string): Promise<boolean> {
    return this.unitOfWork.run(async (transaction) => {
      const ended = await transaction.execute(
        'UPDATE session SET ended_at = ? WHERE id = ? AND person_id = ? AND ended_at IS NULL',
        [this.clock.now(), sessionId, personId],
      );
      transaction.afterCommit(() => {
        this.cache.drop(sessionId);
        if (ended > 0) this.endings.publish([sessionId]);
      });
      return ended > 0;
    });
  }

  private async read(sessionId: string, now: Instant): Promise<ReadSession | null> {
    const { mark } = this.cache;
    const rows = await this.reader.query<SessionPersonRow>(
      `SELECT s.person_id, p.name, s.last_seen_at, s.ends_at, r.role, r.terminal
       FROM session s JOIN person p ON p.id = s.person_id LEFT JOIN person_role r ON r.person_id = p.id
       WHERE s.id = ? AND s.ended_at IS NULL AND p.active = ?`,
      [sessionId, true],
    );
    const [first] = rows;
    if (first === undefined) return null;
    const session: ReadSession = {
      person: { id: first.person_id, name: first.name, sessionId, roles: rows.flatMap(grantOf) },
      lastSeenAt: Number(first.last_seen_at),
      endsAt: Number(first.ends_at),
    };
    this.cache.keep(session, now, mark);
    return session;
  }

  private touch(sessionId: string, now: Instant): Promise<number> {
    return this.unitOfWork.run((transaction) => {
      transaction.afterCommit(() => this.cache.drop(sessionId));
      return transaction.execute('UPDATE session SET last_seen_at = ? WHERE id = ?', [now, sessionId]);
    });
  }
}

function grantOf(row: SessionPersonRow): RoleGrant[] {
  if (row.role === null || row.terminal === null) return [];
  return [{ role: row.role as Role, terminal: row.terminal }];
}
