import { Column, Entity, PrimaryColumn } from 'typeorm';
import { instantColumn, jsonColumn } from '../database/columns';

/** A line of an imported table that is wrong, in words. The header is line 1. */
export interface RowProblem {
  line: number | null;
  message: string;
}

/** One table of past departures that somebody sent, and what became of it. */
@Entity('history_import')
export class HistoryImportRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  state: string;

  @Column({ name: 'file_name', type: 'text' })
  fileName: string;

  @Column({ name: 'row_count', type: 'integer' })
  rowCount: number;

  @Column(jsonColumn('problems'))
  problems: RowProblem[];

  @Column({ name: 'uploaded_by', type: 'text', nullable: true })
  uploadedBy: string | null;

  @Column(instantColumn('created_at'))
  createdAt: number;
}
