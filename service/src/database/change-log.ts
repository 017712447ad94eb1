import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { Subject, type Observable } from 'rxjs';
import { Clock } from '../common/clock';
import { Counters } from './counters';
import type { Transaction } from './unit-of-work';

/** Kinds of object whose changes are told to everybody who looks. */
export const CHANGE_KINDS = ['turn', 'alert', 'terminal', 'timetable'] as const;
export type ChangeKind = (typeof CHANGE_KINDS)[number];

/** One change of one object. Its number is the id of the live event, and grows by one with each change. */
export interface Change {
  number: number;
  kind: ChangeKind;
  objectId: string;
  /** Version of the object after the change. */
  version: number;
  terminalCode: string;
  at: Instant;
}

/** Changes as they are committed, in order. Completes when the service stops, so that streams end. */
@Injectable()
export class ChangeFeed implements OnModuleDestroy {
  private readonly subject = new Subject<Change>();
  readonly changes: Observable<Change> = this.subject.asObservable();

  publish(change: Change): void {
    this.subject.next(change);
  }

  onModuleDestroy(): void {
    this.subject.complete();
  }
}

/** Writes a change into the same transaction as the change itself and tells it once that is committed. */
@Injectable()
export class ChangeLog {
  constructor(
    private readonly counters: Counters,
    private readonly feed: ChangeFeed,
    private readonly clock: Clock,
  ) {}

  async append(transaction: Transaction, change: Omit<Change, 'number' | 'at'>): Promise<number> {
    const number = await this.counters.next(transaction, 'change');
    const at = this.clock.now();
    await transaction.execute(
      'INSERT INTO change (number, kind, object_id, version, terminal_code, created_at) VALUES (?, ?, ?, ?, ?, ?)',
      [number, change.kind, change.objectId, change.version, change.terminalCode, at],
    );
    transaction.afterCommit(() => this.feed.publish({ ...change, number, at }));
    return number;
  }
}
