import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn } from '../database/columns';

/** One vehicle. */
@Entity('unit')
@Unique('unit_number', ['number'])
export class UnitRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  number: string;

  /** `locomotive`, `coach`, `cab-car` or `multiple-unit`. */
  @Column({ type: 'text' })
  kind: string;

  @Column({ name: 'length_feet', type: 'real', nullable: true })
  lengthFeet: number | null;

  @Column({ type: 'real', nullable: true })
  tons: number | null;

  /** Force the handbrake holds with, in pounds, where known. */
  @Column({ name: 'handbrake_pounds', type: 'real', nullable: true })
  handbrakePounds: number | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
