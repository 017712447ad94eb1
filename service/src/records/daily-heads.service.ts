import { setImmediate as breathe } from 'node:timers/promises';
import { Injectable } from '@nestjs/common';
import {
  type CalendarDate,
  type DailyHead,
  HeadFinder,
  type Instant,
  addDays,
  millisecondsInMinute,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { LogReadModel } from './log.read-model';

/** A head as it was published. */
export interface PublishedHead extends DailyHead {
  publishedAt: Instant;
}

/** How far heads were searched, and those that were found and are not published yet. */
interface HeadSearch {
  finder: HeadFinder;
  ended: DailyHead[];
  next: number;
}

/** Entries looked at in one go while heads are searched. */
const sliceLength = 2000;
/** A request that came in before midnight is in the log by then. Our choice. */
const graceMilliseconds = 5 * millisecondsInMinute;

/** Publishes the head of each day of receipt once the day is over, also of days that ended while nobody was running. */
@Injectable()
export class DailyHeads {
  private reading: Promise<HeadSearch> | null = null;
  /** Newest number at the last look: a day is only closed while nothing more comes in for it. */
  private lastSeen: number | null = null;

  constructor(
    private readonly log: LogReadModel,
    private readonly reader: Reader,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** Published heads, oldest first, within days of which both are included. */
  async published(days: { from?: CalendarDate | undefined; to?: CalendarDate | undefined } = {}) {
    const rows = await this.reader.query<PublishedHead>(
      `SELECT date, sequence, hash, entries, published_at AS "publishedAt" FROM daily_head
       WHERE date >= ? AND date <= ? ORDER BY sequence`,
      [days.from ?? '', days.to ?? '9999-12-31'],
    );
    return rows.map((row) => ({ ...row, publishedAt: Number(row.publishedAt) }));
  }

  /** What the head of the day that is not closed yet would be now; null when nothing came in since the last head. */
  async open(): Promise<DailyHead | null> {
    return (await this.readOn()).finder.open();
  }

  /** The newest published head before a number, and the first one from it on; null where there is none. */
  async around(sequence: number): Promise<{ before: DailyHead | null; from: DailyHead | null }> {
    const columns = 'SELECT date, sequence, hash, entries FROM daily_head WHERE sequence';
    const [before] = await this.reader.query<DailyHead>(`${columns} < ? ORDER BY sequence DESC LIMIT 1`, [
      sequence,
    ]);
    const [from] = await this.reader.query<DailyHead>(`${columns} >= ? ORDER BY sequence LIMIT 1`, [
      sequence,
    ]);
    return { before: before ?? null, from: from ?? null };
  }

  /** Publishes what is due. The last day of the log waits until it is over and the log has stood still for a while. */
  async publish(now: Instant): Promise<DailyHead[]> {
    const search = await this.readOn();
    const open = search.finder.open();
    const stoodStill = open !== null && open.sequence === this.lastSeen;
    this.lastSeen = open?.sequence ?? null;
    if (open !== null && stoodStill && isOver(open.date, now)) {
      search.finder.close();
      search.ended.push(open);
    }
    const due = [...search.ended];
    if (due.length > 0) await this.keep(due, now);
    search.ended.splice(0, due.length);
    return due;
  }

  /** Goes on where the last look ended; one look at a time. */
  private readOn(): Promise<HeadSearch> {
    const before = this.reading ?? this.begin();
    this.reading = before
      .then((search) => this.readAll(search))
      .catch((error: unknown) => {
        this.reading = null;
        throw error;
      });
    return this.reading;
  }

  private async begin(): Promise<HeadSearch> {
    const last = (await this.published()).at(-1) ?? null;
    return { finder: new HeadFinder(last), ended: [], next: (last?.sequence ?? 0) + 1 };
  }

  private async readAll(search: HeadSearch): Promise<HeadSearch> {
    for (;;) {
      const points = await this.log.pointsFrom(search.next, sliceLength);
      for (const point of points) {
        const head = search.finder.take(point);
        if (head !== null) search.ended.push(head);
        search.next = point.sequence + 1;
      }
      if (points.length < sliceLength) return search;
      await breathe();
    }
  }

  private async keep(heads: readonly DailyHead[], now: Instant): Promise<void> {
    await this.unitOfWork.run(async (transaction) => {
      for (const { date, sequence, hash, entries } of heads) {
        await transaction.execute(
          'INSERT INTO daily_head (date, sequence, hash, entries, published_at) VALUES (?, ?, ?, ?, ?)',
          [date, sequence, hash, entries, now],
        );
      }
    });
  }
}

function isOver(date: CalendarDate, now: Instant): boolean {
  return now >= Date.parse(`${addDays(date, 1)}T00:00:00Z`) + graceMilliseconds;
}
