import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { CHANGE_KINDS, type ChangeKind } from '../database/change-log';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';

/** A reader that missed more than this loads everything anew; that is quicker than the replay. Our choice. */
export const longestReplay = 500;
/** Changes are kept this long for readers that come back. Our choice: two days, a weekend phone loads anew. */
const keptMilliseconds = 48 * 60 * 60 * 1000;

/** One missed change. */
export interface MissedChange {
  number: number;
  kind: ChangeKind;
  objectId: string;
}

/** The table of changes, read by those who come back. */
@Injectable()
export class ChangeHistory {
  constructor(private readonly reader: Reader) {}

  /** Number of the newest change, 0 when there is none. */
  async newest(): Promise<number> {
    const [row] = await this.reader.query<{ number: number | null }>(
      'SELECT max(number) AS number FROM change',
    );
    return row?.number ?? 0;
  }

  /** What a terminal's reader has missed after a change, in order; null when that cannot be told any more. */
  async since(terminalCode: string, number: number): Promise<MissedChange[] | null> {
    const [ends] = await this.reader.query<{ oldest: number | null; newest: number | null }>(
      'SELECT min(number) AS oldest, max(number) AS newest FROM change',
    );
    const newest = ends?.newest ?? 0;
    const oldest = ends?.oldest ?? newest + 1;
    if (number > newest || number < oldest - 1) return null;
    const rows = await this.reader.query<{ number: number; kind: string; object_id: string }>(
      'SELECT number, kind, object_id FROM change WHERE terminal_code = ? AND number > ? ORDER BY number LIMIT ?',
      [terminalCode, number, longestReplay + 1],
    );
    if (rows.length > longestReplay) return null;
    return rows.flatMap((row) => {
      const kind = CHANGE_KINDS.find((known) => known === row.kind);
      return kind === undefined ? [] : [{ number: row.number, kind, objectId: row.object_id }];
    });
  }

  /** Drops changes that nobody will ask for any more; the newest always stays, so that numbers can be compared. */
  async prune(transaction: Transaction, now: Instant): Promise<number> {
    return transaction.execute(
      'DELETE FROM change WHERE created_at < ? AND number < (SELECT max(number) FROM change)',
      [now - keptMilliseconds],
    );
  }
}
