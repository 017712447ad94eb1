import { Injectable } from '@nestjs/common';
import type { AlertCause, AlertMemory, Instant } from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';
import { isBlank } from './turn-look';

interface RawWatch {
  subject_id: string;
  cause: string;
  memory: string;
}

/** What the hold times have seen, by subject and cause. A cause that was never seen has no row. */
@Injectable()
export class WatchRepository {
  constructor(private readonly reader: Reader) {}

  async findOf(transaction: Transaction, subjectId: string): Promise<Map<AlertCause, AlertMemory>> {
    const rows = await transaction.query<RawWatch[]>(
      'SELECT subject_id, cause, memory FROM alert_watch WHERE subject_id = ?',
      [subjectId],
    );
    return new Map(rows.map((row) => [row.cause as AlertCause, JSON.parse(row.memory) as AlertMemory]));
  }

  /** Every memory there is; the sweep looks at all of them at once. */
  async findAll(): Promise<Map<string, Map<AlertCause, AlertMemory>>> {
    const bySubject = new Map<string, Map<AlertCause, AlertMemory>>();
    for (const row of await this.reader.query<RawWatch>(
      'SELECT subject_id, cause, memory FROM alert_watch',
    )) {
      const memories = bySubject.get(row.subject_id) ?? new Map<AlertCause, AlertMemory>();
      bySubject.set(row.subject_id, memories);
      memories.set(row.cause as AlertCause, JSON.parse(row.memory) as AlertMemory);
    }
    return bySubject;
  }

  async keep(
    transaction: Transaction,
    watch: { subjectId: string; cause: AlertCause; memory: AlertMemory; now: Instant },
  ): Promise<void> {
    const { subjectId, cause, memory, now } = watch;
    if (isBlank(memory)) return this.forget(transaction, subjectId, cause);
    await transaction.execute(
      `INSERT INTO alert_watch (subject_id, cause, memory, changed_at) VALUES (?, ?, ?, ?)
       ON CONFLICT (subject_id, cause) DO UPDATE SET memory = excluded.memory, changed_at = excluded.changed_at`,
      [subjectId, cause, JSON.stringify(memory), now],
    );
  }

  async forget(transaction: Transaction, subjectId: string, cause: AlertCause): Promise<void> {
    await transaction.execute('DELETE FROM alert_watch WHERE subject_id = ? AND cause = ?', [
      subjectId,
      cause,
    ]);
  }
}
