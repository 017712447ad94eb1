import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn } from '../database/columns';

/** The last entry of a day of receipt, published once the day was over. The database refuses to change or delete it. */
@Entity('daily_head')
export class DailyHeadRow {
  @PrimaryColumn({ type: 'text' })
  date: string;

  @Column({ type: 'integer' })
  sequence: number;

  @Column({ type: 'text' })
  hash: string;

  @Column({ type: 'integer' })
  entries: number;

  @Column(instantColumn('published_at'))
  publishedAt: number;
}
