import { Column, Entity, PrimaryColumn } from 'typeorm';
import { jsonColumn } from '../database/columns';

/** A terminal chosen at an activation, and the stations of the timetable it is made of. */
@Entity('timetable_terminal')
export class TimetableTerminalRow {
  @PrimaryColumn({ name: 'activation_number', type: 'integer' })
  activationNumber: number;

  @PrimaryColumn({ type: 'text' })
  code: string;

  @Column({ type: 'integer' })
  position: number;

  @Column({ type: 'text' })
  name: string;

  @Column(jsonColumn('station_ids'))
  stationIds: string[];
}
