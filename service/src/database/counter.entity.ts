import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The last number given under a name. */
@Entity('counter')
export class CounterRow {
  @PrimaryColumn({ type: 'text' })
  name: string;

  @Column({ type: 'integer' })
  value: number;
}
