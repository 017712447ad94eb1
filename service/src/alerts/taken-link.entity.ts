import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn, nullableInstantColumn } from '../database/columns';

/** A link by which one person takes one alert, once, without signing in. Only a hash of its token is kept. */
@Entity('taken_link')
export class TakenLinkRow {
  @PrimaryColumn({ name: 'token_hash', type: 'text' })
  tokenHash: string;

  @Column({ name: 'alert_id', type: 'text' })
  alertId: string;

  @Column({ name: 'person_id', type: 'text' })
  personId: string;

  @Column(instantColumn('created_at'))
  createdAt: number;

  @Column(instantColumn('expires_at'))
  expiresAt: number;

  @Column(nullableInstantColumn('used_at'))
  usedAt: number | null;
}
