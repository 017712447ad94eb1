import { Injectable } from '@nestjs/common';
import { type Instant, columnsOf, noPreviousHash, sealEntry } from '@stubpost/shared';
import { Counters } from '../database/counters';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';
import { sha256 } from './sha256';

/** An entry on its way into the log. */
export interface NewEntry {
  id: string;
  receivedAt: Instant;
  /** Everything the entry says; sealed in its canonical form. The searched columns are taken from it. */
  body: Record<string, unknown>;
}

/** Where an entry stands in the log. */
export interface Seal {
  sequence: number;
  hash: string;
}

/** An entry as the log holds it. */
export interface LoggedEntry extends Seal {
  id: string;
  subjectId: string;
  receivedAt: Instant;
  body: Record<string, unknown>;
}

interface RawEntry {
  sequence: number;
  id: string;
  subject_id: string;
  received_at: number | string;
  body: string;
  hash: string;
}

const readColumns = 'sequence, id, subject_id, received_at, body, hash';

const loggedFrom = (raw: RawEntry): LoggedEntry => ({
  sequence: raw.sequence,
  id: raw.id,
  subjectId: raw.subject_id,
  receivedAt: Number(raw.received_at),
  body: JSON.parse(raw.body) as Record<string, unknown>,
  hash: raw.hash,
});

/** The sealed log: entries are numbered, chained and appended, and never touched again. */
@Injectable()
export class EntryLog {
  constructor(
    private readonly reader: Reader,
    private readonly counters: Counters,
  ) {}

  async append(transaction: Transaction, entry: NewEntry): Promise<Seal> {
    const columns = columnsOf(entry.body);
    if (columns === null) throw new Error(`the body of ${entry.id} does not say what it is about`);
    const sequence = await this.counters.next(transaction, 'entry');
    const [last] = await transaction.query<{ hash: string }[]>('SELECT hash FROM entry WHERE sequence = ?', [
      sequence - 1,
    ]);
    const previousHash = last?.hash ?? noPreviousHash;
    const { id, receivedAt, body } = entry;
    const sealed = sealEntry({ previousHash, sequence, id, receivedAt, body }, sha256);
    await transaction.execute(
      `INSERT INTO entry (sequence, id, subject_kind, subject_id, kind, terminal_code, service_date, observed_at,
       received_at, body, body_hash, previous_hash, hash) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      [
        sequence,
        id,
        columns.subjectKind,
        columns.subjectId,
        columns.kind,
        columns.terminalCode,
        columns.serviceDate,
        columns.observedAt,
        receivedAt,
        sealed.body,
        sealed.bodyHash,
        previousHash,
        sealed.hash,
      ],
    );
    return { sequence, hash: sealed.hash };
  }

  /** The entry with an id, whatever it is about; null when there is none. */
  async findById(transaction: Transaction, id: string): Promise<LoggedEntry | null> {
    const [raw] = await transaction.query<RawEntry[]>(`SELECT ${readColumns} FROM entry WHERE id = ?`, [id]);
    return raw === undefined ? null : loggedFrom(raw);
  }

  /** Entries about one subject in sequence order, as an open transaction sees them. */
  async findAboutIn(transaction: Transaction, subjectId: string): Promise<LoggedEntry[]> {
    const rows = await transaction.query<RawEntry[]>(
      `SELECT ${readColumns} FROM entry WHERE subject_id = ? ORDER BY sequence`,
      [subjectId],
    );
    return rows.map(loggedFrom);
  }

  /** Entries about some subjects, by subject, each in sequence order. */
  async findAbout(subjectIds: readonly string[]): Promise<Map<string, LoggedEntry[]>> {
    const bySubject = new Map<string, LoggedEntry[]>();
    if (subjectIds.length === 0) return bySubject;
    const rows = await this.reader.query<RawEntry>(
      `SELECT ${readColumns} FROM entry WHERE subject_id IN (${subjectIds.map(() => '?').join(', ')})
       ORDER BY subject_id, sequence`,
      [...subjectIds],
    );
    for (const raw of rows) {
      const known = bySubject.get(raw.subject_id);
      if (known === undefined) bySubject.set(raw.subject_id, [loggedFrom(raw)]);
      else known.push(loggedFrom(raw));
    }
    return bySubject;
  }
}
