import { Injectable } from '@nestjs/common';
import { formatInstant, type OwnSession } from '@stubpost/shared';
import { Clock } from '../common/clock';
import type { CurrentPersonFacts } from '../common/signed-in';
import { Reader } from '../database/reader';
import { sessionIdleMilliseconds } from './sessions.service';

interface OwnSessionRow {
  id: string;
  started_at: number;
  last_seen_at: number;
  ends_at: number;
  device: string;
}

/** The standing sessions of one person, newest use first. */
@Injectable()
export class OwnSessionsReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly clock: Clock,
  ) {}

  async of(person: CurrentPersonFacts): Promise<OwnSession[]> {
    const now = this.clock.now();
    const rows = await this.reader.query<OwnSessionRow>(
      `SELECT id, started_at, last_seen_at, ends_at, device FROM session
       WHERE person_id = ? AND ended_at IS NULL AND ends_at > ? AND last_seen_at > ? ORDER BY last_seen_at DESC`,
      [person.id, now, now - sessionIdleMilliseconds],
    );
    return rows.map((row) => ({
      id: row.id,
      startedAt: formatInstant(Number(row.started_at)),
      lastSeenAt: formatInstant(Number(row.last_seen_at)),
      endsAt: formatInstant(Number(row.ends_at)),
      device: row.device,
      current: row.id === person.sessionId,
    }));
  }
}
