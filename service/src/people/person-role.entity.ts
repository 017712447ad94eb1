import { Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { PersonRow } from './person.entity';

/** One role of a person at one terminal, or at all (`*`). */
@Entity('person_role')
export class PersonRoleRow {
  @PrimaryColumn({ name: 'person_id', type: 'text' })
  @ForeignKey(() => PersonRow, { name: 'person_role_person', onDelete: 'CASCADE' })
  personId: string;

  @PrimaryColumn({ type: 'text' })
  role: string;

  @PrimaryColumn({ type: 'text' })
  terminal: string;
}
