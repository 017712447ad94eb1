import { Column, Entity, PrimaryColumn } from 'typeorm';

/** What was read from an upload, apart from its row so that lists stay light. */
@Entity('timetable_content')
export class TimetableContentRow {
  @PrimaryColumn({ name: 'timetable_id', type: 'text' })
  timetableId: string;

  /** JSON text of the timetable. */
  @Column({ type: 'text' })
  content: string;
}
