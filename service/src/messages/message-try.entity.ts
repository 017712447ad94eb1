import type { SendOutcome } from '@stubpost/shared';
import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn } from '../database/columns';

/** What came of one try to send a message. */
@Entity('message_try')
export class MessageTryRow {
  @PrimaryColumn({ name: 'message_id', type: 'text' })
  messageId: string;

  @PrimaryColumn({ type: 'integer' })
  number: number;

  @Column({ type: 'text' })
  outcome: SendOutcome;

  @Column({ type: 'text' })
  detail: string;

  @Column(instantColumn('tried_at'))
  triedAt: number;
}
