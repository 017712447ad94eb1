import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn } from '../database/columns';

/** Failed tries for one account or from one address; the key is a hash, as people type passwords into the wrong field. */
@Entity('sign_in_attempt')
export class SignInAttemptRow {
  @PrimaryColumn({ type: 'text' })
  key: string;

  @Column({ type: 'integer' })
  failed: number;

  @Column(instantColumn('last_failed_at'))
  lastFailedAt: number;

  @Column(instantColumn('blocked_until'))
  blockedUntil: number;
}
