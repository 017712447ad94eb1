import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instantColumn } from './columns';

/** One change of one object, in the order of commits. */
@Entity('change')
@Index('change_terminal', ['terminalCode', 'number'])
export class ChangeRow {
  @PrimaryColumn({ type: 'integer' })
  number: number;

  @Column({ type: 'text' })
  kind: string;

  @Column({ name: 'object_id', type: 'text' })
  objectId: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
