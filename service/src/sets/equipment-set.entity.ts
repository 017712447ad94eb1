import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';

/** Units that run together under one label. */
@Entity('equipment_set')
@Unique('equipment_set_label', ['label'])
export class EquipmentSetRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ type: 'text' })
  label: string;

  /** Number of the unit that leads on leaving a terminal; null while unknown. */
  @Column({ name: 'leading_unit', type: 'text', nullable: true })
  leadingUnit: string | null;

  /** Since when the set has been off air; null while it is on air. */
  @Column(nullableInstantColumn('off_air_since'))
  offAirSince: number | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
