import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instantColumn, jsonColumn, nullableInstantColumn } from '../database/columns';

/** One cause on one subject. While it stands there is only one: the unique index sees to that. */
@Entity('alert')
@Index('alert_standing', ['subjectKind', 'subjectId', 'cause'], {
  unique: true,
  where: `"state" IN ('raised', 'taken', 'set-aside')`,
})
@Index('alert_terminal', ['terminalCode', 'state'])
@Index('alert_subject', ['subjectId'])
export class AlertRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  @Column({ name: 'service_date', type: 'text' })
  serviceDate: string;

  @Column({ name: 'subject_kind', type: 'text' })
  subjectKind: string;

  @Column({ name: 'subject_id', type: 'text' })
  subjectId: string;

  @Column({ name: 'turn_id', type: 'text', nullable: true })
  turnId: string | null;

  @Column({ type: 'text' })
  cause: string;

  @Column({ type: 'text' })
  priority: string;

  @Column({ type: 'text' })
  state: string;

  /** Where, in words. */
  @Column({ type: 'text' })
  subject: string;

  @Column({ type: 'text' })
  text: string;

  @Column({ type: 'text' })
  action: string;

  @Column({ type: 'text' })
  actor: string;

  @Column(nullableInstantColumn('by_when'))
  byWhen: number | null;

  @Column(jsonColumn('lines'))
  lines: string[];

  @Column(instantColumn('raised_at'))
  raisedAt: number;

  @Column(nullableInstantColumn('taken_at'))
  takenAt: number | null;

  @Column({ name: 'taken_by', type: 'text', nullable: true })
  takenBy: string | null;

  @Column({ name: 'taken_by_id', type: 'text', nullable: true })
  takenById: string | null;

  @Column(nullableInstantColumn('set_aside_until'))
  setAsideUntil: number | null;

  @Column({ name: 'set_aside_reason', type: 'text', nullable: true })
  setAsideReason: string | null;

  @Column({ name: 'set_aside_by', type: 'text', nullable: true })
  setAsideBy: string | null;

  @Column(nullableInstantColumn('cleared_at'))
  clearedAt: number | null;

  @Column(nullableInstantColumn('closed_at'))
  closedAt: number | null;

  @Column({ name: 'closed_by', type: 'text', nullable: true })
  closedBy: string | null;

  @Column({ name: 'closed_cause', type: 'text', nullable: true })
  closedCause: string | null;

  /** The cleared alert of the same cause that came back as this one. */
  @Column({ name: 'previous_id', type: 'text', nullable: true })
  previousId: string | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
