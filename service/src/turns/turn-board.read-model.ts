import { Injectable } from '@nestjs/common';
import {
  type BoardQuery,
  type CalendarDate,
  type Instant,
  boardAheadMinutes,
  boardBackMinutes,
  millisecondsInHour,
  millisecondsInMinute,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { TurnVersion } from './turn-files';

/** Turns of a terminal by their service date, or by the time their train is there: half-open. */
export type BoardRange =
  | { kind: 'day'; serviceDate: CalendarDate }
  | { kind: 'range'; from: Instant; to: Instant }
  /** The same, and with it every turn that still stands open although its time is over. */
  | { kind: 'now'; from: Instant; to: Instant; now: Instant };

/** An open turn that was heard of stays on the board until it closes by itself. */
const heardMilliseconds = 24 * millisecondsInHour;
/** One that nobody ever spoke of leaves it earlier. Our choice: a late train stays in sight, a forgotten one does not. */
const unheardMilliseconds = 2 * millisecondsInHour;

/** What a board question asks for at a moment. */
export function boardRangeOf(query: BoardQuery, now: Instant): BoardRange {
  if (query.serviceDate !== undefined) return { kind: 'day', serviceDate: query.serviceDate };
  const from =
    query.from === undefined ? now - boardBackMinutes * millisecondsInMinute : Date.parse(query.from);
  const to = query.to === undefined ? now + boardAheadMinutes * millisecondsInMinute : Date.parse(query.to);
  return query.from === undefined ? { kind: 'now', from, to, now } : { kind: 'range', from, to };
}

/** Which turns stand on a board. */
@Injectable()
export class TurnBoardReadModel {
  constructor(private readonly reader: Reader) {}

  /** Ids and versions of the turns, in the order of their trains. */
  find(terminal: string, range: BoardRange): Promise<TurnVersion[]> {
    const { where, parameters } = conditionOf(range);
    return this.reader.query<TurnVersion>(
      `SELECT id, version FROM turn WHERE terminal_code = ? AND withdrawn_at IS NULL AND ${where}
       ORDER BY span_from, id`,
      [terminal, ...parameters],
    );
  }
}

function conditionOf(range: BoardRange): { where: string; parameters: unknown[] } {
  switch (range.kind) {
    case 'day':
      return { where: 'service_date = ?', parameters: [range.serviceDate] };
    case 'range':
      return { where: 'span_to >= ? AND span_from < ?', parameters: [range.from, range.to] };
    case 'now': {
      const heardFrom = range.now - heardMilliseconds;
      const unheardFrom = range.now - unheardMilliseconds;
      return {
        where: `span_to >= ? AND span_from < ? AND (span_to >= ? OR (settled_at IS NULL AND departure_at IS NULL
          AND (entry_count > 0 OR span_to >= ?)))`,
        parameters: [Math.min(range.from, heardFrom), range.to, range.from, unheardFrom],
      };
    }
  }
}
