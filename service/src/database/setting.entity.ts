import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn } from './columns';

/** A named value of the installation (scope `*`) or of one terminal (scope is its code). */
@Entity('setting')
export class SettingRow {
  @PrimaryColumn({ type: 'text' })
  scope: string;

  @PrimaryColumn({ type: 'text' })
  name: string;

  /** JSON text. */
  @Column({ type: 'text' })
  value: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ name: 'changed_by', type: 'text', nullable: true })
  changedBy: string | null;

  @Column(instantColumn('changed_at'))
  changedAt: number;
}
