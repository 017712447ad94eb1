import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn, jsonColumn } from '../database/columns';

/**
 * What the hold times of one cause on one subject have seen so far. In a table, so that a stop of the process
 * neither forgets how long a condition has stood nor raises it twice.
 */
@Entity('alert_watch')
export class AlertWatchRow {
  @PrimaryColumn({ name: 'subject_id', type: 'text' })
  subjectId: string;

  @PrimaryColumn({ type: 'text' })
  cause: string;

  @Column(jsonColumn('memory'))
  memory: unknown;

  @Column(instantColumn('changed_at'))
  changedAt: number;
}
