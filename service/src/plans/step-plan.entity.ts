import type { PlanStep } from '@stubpost/shared';
import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';
import { instantColumn, jsonColumn } from '../database/columns';

/** One version of a terminal's step plan. Never changed: a new version takes over from a service date on. */
@Entity('step_plan')
@Unique('step_plan_version', ['terminalCode', 'key', 'version'])
export class StepPlanRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ name: 'terminal_code', type: 'text' })
  terminalCode: string;

  @Column({ type: 'text' })
  key: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'integer' })
  version: number;

  @Column({ name: 'effective_from', type: 'text' })
  effectiveFrom: string;

  @Column(jsonColumn('steps'))
  steps: PlanStep[];

  @Column(instantColumn('created_at'))
  createdAt: number;

  /** Name of the author as it was that day; null for the plan that a terminal starts with. */
  @Column({ name: 'created_by', type: 'text', nullable: true })
  createdBy: string | null;
}
