import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn } from '../database/columns';

/**
 * One sealed entry. Only ever appended: the database itself refuses to change or delete a row. `body` is the
 * canonical JSON that `body_hash` is taken over; the other columns repeat what is searched for.
 */
@Entity('entry')
@Unique('entry_id', ['id'])
@Index('entry_subject', ['subjectId', 'sequence'])
@Index('entry_day', ['terminalCode', 'serviceDate'])
@Index('entry_received', ['receivedAt'])
export class EntryRow {
  @PrimaryColumn({ type: 'integer' })
  sequence: number;

  @Column({ type: 'text' })
  id: string;

  @Column({ name: 'subject_kind', type: 'text' })
  subjectKind: string;

  @Column({ name: 'subject_id', type: 'text' })
  subjectId: string;

  @Column({ type: 'text' })
  kind: string;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  @Column({ name: 'service_date', type: 'text' })
  serviceDate: string;

  @Column(instantColumn('observed_at'))
  observedAt: number;

  @Column(instantColumn('received_at'))
  receivedAt: number;

  @Column({ type: 'text' })
  body: string;

  @Column({ name: 'body_hash', type: 'text' })
  bodyHash: string;

  @Column({ name: 'previous_hash', type: 'text' })
  previousHash: string;

  @Column({ type: 'text' })
  hash: string;
}
