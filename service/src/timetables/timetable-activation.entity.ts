import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';

/** One order that a timetable runs from a service date on. A later order wins; one taken back no longer counts. */
@Entity('timetable_activation')
@Index('timetable_activation_timetable', ['timetableId'])
export class TimetableActivationRow {
  /** Order in which activations were made. */
  @PrimaryColumn({ type: 'integer' })
  number: number;

  @Column({ name: 'timetable_id', type: 'text' })
  timetableId: string;

  @Column({ name: 'from_date', type: 'text' })
  fromDate: string;

  /** 1 when guessed pairs count as turns. */
  @Column({ name: 'accept_guesses', type: 'integer' })
  acceptGuesses: number;

  @Column({ name: 'activated_by', type: 'text' })
  activatedBy: string;

  @Column({ name: 'taken_back_by', type: 'text', nullable: true })
  takenBackBy: string | null;

  @Column(nullableInstantColumn('taken_back_at'))
  takenBackAt: number | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
