import type { ImportProblem, TimetableSummary } from '@stubpost/shared';
import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn, jsonColumn, nullableInstantColumn } from '../database/columns';

/** One uploaded timetable and what was found in it. */
@Entity('timetable')
export class TimetableRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  version: number;

  /** `reading`, `ready` or `refused`; whether it is the running one follows from its activations. */
  @Column({ type: 'text' })
  state: string;

  @Column({ name: 'file_name', type: 'text' })
  fileName: string;

  @Column({ name: 'file_bytes', type: 'integer' })
  fileBytes: number;

  /** GTFS route types it is read for, such as `2,100-117`. */
  @Column({ name: 'route_types', type: 'text' })
  routeTypes: string;

  /** How often reading it was begun: a file that ends the service again and again is given up. */
  @Column({ type: 'integer' })
  attempts: number;

  @Column({ name: 'uploaded_by', type: 'text', nullable: true })
  uploadedBy: string | null;

  @Column(nullableInstantColumn('read_at'))
  readAt: number | null;

  @Column(jsonColumn('problems'))
  problems: ImportProblem[];

  @Column({ ...jsonColumn('summary'), nullable: true })
  summary: TimetableSummary | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
