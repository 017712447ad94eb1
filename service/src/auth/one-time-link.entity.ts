import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';
import { PersonRow } from '../people/person.entity';

/** A link that sets a password once. Only a hash of its token is kept. */
@Entity('one_time_link')
export class OneTimeLinkRow {
  @PrimaryColumn({ name: 'token_hash', type: 'text' })
  tokenHash: string;

  @Column({ name: 'person_id', type: 'text' })
  @ForeignKey(() => PersonRow, { name: 'one_time_link_person', onDelete: 'CASCADE' })
  personId: string;

  @Column(instantColumn('created_at'))
  createdAt: number;

  @Column(instantColumn('expires_at'))
  expiresAt: number;

  @Column(nullableInstantColumn('used_at'))
  usedAt: number | null;
}
