import { Injectable } from '@nestjs/common';
import type { Timetable } from '@stubpost/shared';
import { Reader } from '../database/reader';

/** Timetables kept in memory after they were read from their row: the running one, a draft and one to compare. */
const contentsKept = 3;

/** What was read from uploads. A content never changes, so it may be kept. */
@Injectable()
export class TimetableContents {
  private readonly known = new Map<string, Timetable>();

  constructor(private readonly reader: Reader) {}

  /** The content of a timetable; null when it has none, being unread or refused. */
  async find(timetableId: string): Promise<Timetable | null> {
    const known = this.known.get(timetableId);
    if (known !== undefined) {
      this.keep(timetableId, known);
      return known;
    }
    const [row] = await this.reader.query<{ content: string }>(
      'SELECT content FROM timetable_content WHERE timetable_id = ?',
      [timetableId],
    );
    if (row === undefined) return null;
    const content = JSON.parse(row.content) as Timetable;
    this.keep(timetableId, content);
    return content;
  }

  /** As `find`, for timetables of which it is known that they were read. */
  async require(timetableId: string): Promise<Timetable> {
    const content = await this.find(timetableId);
    if (content === null) throw new Error(`the timetable ${timetableId} has no content`);
    return content;
  }

  private keep(timetableId: string, content: Timetable): void {
    this.known.delete(timetableId);
    this.known.set(timetableId, content);
    const [oldest] = this.known.keys();
    if (this.known.size > contentsKept && oldest !== undefined) this.known.delete(oldest);
  }
}
