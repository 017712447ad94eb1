import type { StoppingMarker } from '@stubpost/shared';
import { Column, Entity, ForeignKey, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn, jsonColumn } from '../database/columns';
import { TerminalRow } from './terminal.entity';

/** One track of a terminal; `position` is its place on the board. */
@Entity('track')
@Unique('track_label', ['terminalId', 'label'])
export class TrackRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ name: 'terminal_id', type: 'text' })
  @ForeignKey(() => TerminalRow, { name: 'track_terminal', onDelete: 'CASCADE' })
  terminalId: string;

  @Column({ type: 'integer' })
  position: number;

  @Column({ type: 'text' })
  label: string;

  @Column({ name: 'length_feet', type: 'integer', nullable: true })
  lengthFeet: number | null;

  @Column({ type: 'integer', nullable: true })
  cars: number | null;

  @Column({ name: 'grade_percent', type: 'real', nullable: true })
  gradePercent: number | null;

  @Column(jsonColumn('markers'))
  markers: StoppingMarker[];

  @Column(instantColumn('created_at'))
  createdAt: number;
}
