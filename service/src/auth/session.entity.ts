import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';
import { PersonRow } from '../people/person.entity';

/** One sign-in. The token in the cookie only names this row; ending the row ends the session at once. */
@Entity('session')
@Index('session_person_ended', ['personId', 'endedAt'])
export class SessionRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ name: 'person_id', type: 'text' })
  @ForeignKey(() => PersonRow, { name: 'session_person', onDelete: 'CASCADE' })
  personId: string;

  @Column(instantColumn('started_at'))
  startedAt: number;

  @Column(instantColumn('last_seen_at'))
  lastSeenAt: number;

  @Column(instantColumn('ends_at'))
  endsAt: number;

  @Column(nullableInstantColumn('ended_at'))
  endedAt: number | null;

  @Column({ type: 'text' })
  device: string;
}
