import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn } from '../database/columns';

/** A terminal station and the zone its clocks show. */
@Entity('terminal')
@Unique('terminal_code', ['code'])
export class TerminalRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ type: 'text' })
  code: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'text' })
  zone: string;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
