import { Injectable } from '@nestjs/common';
import { ChangeLog } from '../database/change-log';
import type { Transaction } from '../database/unit-of-work';
import type { TurnRecord } from './turn-record';

/** What the change table says about a turn. */
type ChangedTurn = Pick<TurnRecord, 'id' | 'version' | 'terminalCode'>;

/**
 * Gathers the turns that a transaction changes, so that each stands in the table of changes once, at its last
 * version, however many entries came in together.
 */
@Injectable()
export class TurnChanges {
  private readonly noted = new WeakMap<Transaction, Map<string, ChangedTurn>>();

  constructor(private readonly changes: ChangeLog) {}

  note(transaction: Transaction, { id, version, terminalCode }: ChangedTurn): void {
    const turns = this.noted.get(transaction) ?? new Map<string, ChangedTurn>();
    this.noted.set(transaction, turns);
    turns.set(id, { id, version, terminalCode });
  }

  /** Writes down what was noted; called once, at the end of the transaction. */
  async write(transaction: Transaction): Promise<void> {
    for (const { id, version, terminalCode } of this.noted.get(transaction)?.values() ?? []) {
      await this.changes.append(transaction, { kind: 'turn', objectId: id, version, terminalCode });
    }
    this.noted.delete(transaction);
  }
}
