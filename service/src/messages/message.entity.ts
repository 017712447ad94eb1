import type { MessageChannel, MessageState } from '@stubpost/shared';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';

/** One outgoing message, written in the transaction of what it tells. Its id follows from what it is about. */
@Entity('message')
@Index('message_due', ['state', 'nextAt'])
@Index('message_alert', ['alertId'])
export class MessageRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  channel: MessageChannel;

  /** Address or number it goes to. */
  @Column({ type: 'text' })
  address: string;

  @Column({ name: 'person_id', type: 'text' })
  personId: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ name: 'terminal_code', type: 'text', nullable: true })
  terminalCode: string | null;

  @Column({ name: 'alert_id', type: 'text', nullable: true })
  alertId: string | null;

  /** What it is about: `told`, `taken`, `cleared`, `silence`. */
  @Column({ type: 'text' })
  occasion: string;

  @Column({ type: 'text' })
  subject: string;

  /** With a mark where the token of its link goes. */
  @Column({ type: 'text' })
  body: string;

  /** What the token of its link is made from; null without a link. */
  @Column({ name: 'link_purpose', type: 'text', nullable: true })
  linkPurpose: string | null;

  @Column({ type: 'text' })
  state: MessageState;

  @Column({ type: 'integer' })
  tries: number;

  @Column(nullableInstantColumn('next_at'))
  nextAt: number | null;

  /** The run of the service that is sending it. */
  @Column({ name: 'claimed_by', type: 'text', nullable: true })
  claimedBy: string | null;

  @Column(nullableInstantColumn('sent_at'))
  sentAt: number | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
