import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn } from '../database/columns';

/** A service day whose turns are opened, and by which activation: the same one need not open it again. */
@Entity('timetable_day')
export class TimetableDayRow {
  @PrimaryColumn({ name: 'service_date', type: 'text' })
  serviceDate: string;

  @Column({ name: 'activation_number', type: 'integer' })
  activationNumber: number;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
