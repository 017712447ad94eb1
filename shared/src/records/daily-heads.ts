import { formatInstant, millisecondsInHour, type CalendarDate, type Instant } from '../lib/instant';

/** The last entry of a day. Whoever keeps it can later prove that nothing up to it was changed, added or cut off. */
export interface DailyHead {
  /** Day of receipt in UTC. */
  date: CalendarDate;
  sequence: number;
  hash: string;
  /** Entries since the head before. */
  entries: number;
}

/** What is needed of an entry to find heads. */
export interface SealedPoint {
  sequence: number;
  hash: string;
  receivedAt: Instant;
}

/**
 * The day an entry is received, in UTC: `2026-03-03`. Days of receipt in UTC, because they are the same for every
 * terminal and zone, have no hour twice, and grow with the log; a service date says neither when an entry came in nor
 * in which order.
 */
export function receiptDay(instant: Instant): CalendarDate {
  return formatInstant(instant).slice(0, 10);
}

const dayAfter = (date: CalendarDate): CalendarDate =>
  receiptDay(Date.parse(`${date}T00:00:00Z`) + 24 * millisecondsInHour);

/**
 * Finds the daily heads of a log from its entries in order. A head never moves: an entry that comes in after the head
 * of its day belongs to the next day, and where the clock ran backwards the later day counts on. Days without entries
 * have no head.
 */
export class HeadFinder {
  private day: CalendarDate | null = null;
  private lastPoint: SealedPoint | null = null;

  /** `last` is the newest head that is published already; entries are taken from the one after it on. */
  constructor(private last: DailyHead | null = null) {}

  /** Takes the next entry. Gives the head of the day before it when it is the first of another day. */
  take(point: SealedPoint): DailyHead | null {
    const earliest = this.day ?? (this.last === null ? '' : dayAfter(this.last.date));
    const received = receiptDay(point.receivedAt);
    const day = received > earliest ? received : earliest;
    const ended = this.day !== null && day > this.day ? this.close() : null;
    this.day = day;
    this.lastPoint = point;
    return ended;
  }

  /** The day that is still open with its newest entry: what its head would be now. Null before the first entry. */
  open(): DailyHead | null {
    if (this.day === null || this.lastPoint === null) return null;
    const { sequence, hash } = this.lastPoint;
    return { date: this.day, sequence, hash, entries: sequence - (this.last?.sequence ?? 0) };
  }

  /** Ends the open day and gives its head; entries that still come in for it belong to the next day. */
  close(): DailyHead | null {
    const head = this.open();
    if (head !== null) this.last = head;
    this.day = null;
    this.lastPoint = null;
    return head;
  }
}
