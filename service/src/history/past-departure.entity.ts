import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';

/** A departure from before Stubpost, or from elsewhere, loaded from a table. A recorded turn counts before it. */
@Entity('past_departure')
@Unique('past_departure_once', ['terminalCode', 'serviceDate', 'train', 'scheduledDepartureAt'])
@Index('past_departure_import', ['importId'])
export class PastDepartureRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ name: 'import_id', type: 'text' })
  importId: string;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  @Column({ name: 'service_date', type: 'text' })
  serviceDate: string;

  @Column({ type: 'text' })
  train: string;

  @Column({ name: 'set_label', type: 'text', nullable: true })
  set: string | null;

  @Column({ type: 'text', nullable: true })
  track: string | null;

  @Column(nullableInstantColumn('scheduled_arrival_at'))
  scheduledArrivalAt: number | null;

  @Column(nullableInstantColumn('actual_arrival_at'))
  actualArrivalAt: number | null;

  @Column(instantColumn('scheduled_departure_at'))
  scheduledDepartureAt: number;

  /** Null when it was annulled or nobody recorded it. */
  @Column(nullableInstantColumn('actual_departure_at'))
  actualDepartureAt: number | null;

  @Column({ type: 'integer' })
  annulled: number;
}
