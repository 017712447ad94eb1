import { Injectable } from '@nestjs/common';
import type { CalendarDate, Instant, KeptEntry, SealedPoint } from '@stubpost/shared';
import { Reader } from '../database/reader';

/** An entry with everything its table repeats of it. */
export interface StoredEntry extends KeptEntry {
  body: string;
  subjectKind: string;
  subjectId: string;
  kind: string;
  terminalCode: string;
  serviceDate: CalendarDate;
  observedAt: Instant;
}

/** The sealed log as it lies in the database, by its running numbers; both ends of a range are included. */
@Injectable()
export class LogReadModel {
  constructor(private readonly reader: Reader) {}

  /** Number and hash of the newest entry; null while there is none. */
  async newest(): Promise<SealedPoint | null> {
    const [row] = await this.reader.query<SealedPoint>(`${selectPoints} ORDER BY sequence DESC LIMIT 1`);
    return row ?? null;
  }

  /** The number that was given out last; entries up to it must be there. */
  async lastNumberGiven(): Promise<number> {
    const [row] = await this.reader.query<{ value: number }>(
      `SELECT value FROM counter WHERE name = 'entry'`,
    );
    return Number(row?.value ?? 0);
  }

  /** The smallest and the greatest number among entries received in a half-open span; null when there is none. */
  async numbersReceived(from: Instant, to: Instant): Promise<{ first: number; last: number } | null> {
    const [row] = await this.reader.query<{ first: number | null; last: number | null }>(
      `SELECT min(sequence) AS first, max(sequence) AS last FROM entry WHERE received_at >= ? AND received_at < ?`,
      [from, to],
    );
    if (row === undefined || row.first === null || row.last === null) return null;
    return { first: row.first, last: row.last };
  }

  /** So many entries from a number on. */
  async entriesFrom(sequence: number, count: number): Promise<StoredEntry[]> {
    const rows = await this.reader.query<StoredEntry>(
      `SELECT sequence, id, received_at AS "receivedAt", previous_hash AS "previousHash", body_hash AS "bodyHash", hash, body,
       subject_kind AS "subjectKind", subject_id AS "subjectId", kind, terminal_code AS "terminalCode",
       service_date AS "serviceDate", observed_at AS "observedAt"
       FROM entry WHERE sequence >= ? ORDER BY sequence LIMIT ?`,
      [sequence, count],
    );
    return rows.map((row) => ({
      ...row,
      receivedAt: Number(row.receivedAt),
      observedAt: Number(row.observedAt),
    }));
  }

  /** The same entries, without what they say. */
  async pointsFrom(sequence: number, count: number): Promise<SealedPoint[]> {
    const rows = await this.reader.query<SealedPoint>(
      `${selectPoints} WHERE sequence >= ? ORDER BY sequence LIMIT ?`,
      [sequence, count],
    );
    return rows.map((row) => ({ ...row, receivedAt: Number(row.receivedAt) }));
  }
}

const selectPoints = 'SELECT sequence, hash, received_at AS "receivedAt" FROM entry';
