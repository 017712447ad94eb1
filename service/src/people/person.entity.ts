import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn } from '../database/columns';

/** Somebody who can sign in. */
@Entity('person')
@Unique('person_email', ['email'])
@Index('person_badge', ['badge'], { unique: true })
export class PersonRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  /** In small letters. */
  @Column({ type: 'text' })
  email: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ name: 'password_hash', type: 'text', nullable: true })
  passwordHash: string | null;

  /** In large letters. */
  @Column({ type: 'text', nullable: true })
  badge: string | null;

  @Column({ name: 'pin_hash', type: 'text', nullable: true })
  pinHash: string | null;

  /** E.164, for text messages. */
  @Column({ type: 'text', nullable: true })
  phone: string | null;

  @Column({ type: 'boolean' })
  active: boolean;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
