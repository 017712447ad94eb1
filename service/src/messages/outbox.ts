import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { Subject } from 'rxjs';
import type { Transaction } from '../database/unit-of-work';
import { messageIdOf, type NewMessage, TOKEN_MARK } from './outgoing';

/** Where messages are left to be sent, in the transaction of what they tell. */
@Injectable()
export class Outbox implements OnModuleDestroy {
  /** Stands in a body where the token of its link goes; it is as long as a token. */
  readonly tokenMark = TOKEN_MARK;
  private readonly bell = new Subject<void>();
  /** Rings when something new has been left, after its commit. */
  readonly rings = this.bell.asObservable();

  /** Leaves a message; one that is there already stays as it is. */
  async put(transaction: Transaction, message: NewMessage, now: Instant): Promise<void> {
    const added = await transaction.execute(
      `INSERT INTO message (id, channel, address, person_id, name, terminal_code, alert_id, occasion, subject, body,
         link_purpose, state, tries, next_at, claimed_by, sent_at, created_at)
       VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, 'waiting', 0, ?, NULL, NULL, ?) ON CONFLICT (id) DO NOTHING`,
      [
        messageIdOf(message),
        message.channel,
        message.address,
        message.person.id,
        message.person.name,
        message.terminalCode,
        message.alertId,
        message.occasion,
        message.subject,
        message.body,
        message.linkPurpose,
        now,
        now,
      ],
    );
    if (added > 0) transaction.afterCommit(() => this.bell.next());
  }

  onModuleDestroy(): void {
    this.bell.complete();
  }
}
