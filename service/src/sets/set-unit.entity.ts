import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EquipmentSetRow } from './equipment-set.entity';
import { UnitRow } from './unit.entity';

/** A unit's place in a set, counted from the end at the bumping post. */
@Entity('set_unit')
@Index('set_unit_unit', ['unitId'])
export class SetUnitRow {
  @PrimaryColumn({ name: 'set_id', type: 'text' })
  @ForeignKey(() => EquipmentSetRow, { name: 'set_unit_set', onDelete: 'CASCADE' })
  setId: string;

  @PrimaryColumn({ type: 'integer' })
  position: number;

  @Column({ name: 'unit_id', type: 'text' })
  @ForeignKey(() => UnitRow, { name: 'set_unit_of_unit' })
  unitId: string;
}
