import { Injectable } from '@nestjs/common';
import type { Activation, CalendarDate, Instant } from '@stubpost/shared';
import { IsNull } from 'typeorm';
import type { Transaction } from '../database/unit-of-work';
import type { FeedReadAnswer } from './feed-reader';
import { TimetableActivationRow } from './timetable-activation.entity';
import { TimetableContentRow } from './timetable-content.entity';
import { TimetableDayRow } from './timetable-day.entity';
import { TimetableTerminalRow } from './timetable-terminal.entity';
import { TimetableRow } from './timetable.entity';

/** Which timetable is to run from when, for which terminals. */
export interface NewActivation {
  timetableId: string;
  from: CalendarDate;
  acceptGuesses: boolean;
  terminals: readonly { code: string; name: string; stationIds: readonly string[] }[];
  by: string;
  now: Instant;
}

/** Rows of timetables: the writing side. */
@Injectable()
export class TimetablesRepository {
  async insert(transaction: Transaction, row: TimetableRow): Promise<void> {
    await transaction.manager.insert(TimetableRow, row);
  }

  /** Counts one more beginning of the reading; how many there have been, 0 when it is not to be read any more. */
  async beginReading(transaction: Transaction, id: string): Promise<number> {
    const [row] = await transaction.query<{ attempts: number }[]>(
      `UPDATE timetable SET attempts = attempts + 1 WHERE id = ? AND state = 'reading' RETURNING attempts`,
      [id],
    );
    return row?.attempts ?? 0;
  }

  /** Ends the reading, once. */
  async finishReading(
    transaction: Transaction,
    { id, answer, now }: { id: string; answer: FeedReadAnswer; now: Instant },
  ): Promise<void> {
    const summary = answer.ok ? JSON.stringify(answer.summary) : null;
    const changed = await transaction.execute(
      `UPDATE timetable SET version = version + 1, state = ?, problems = ?, summary = ?, read_at = ?
       WHERE id = ? AND state = 'reading'`,
      [answer.ok ? 'ready' : 'refused', JSON.stringify(answer.problems), summary, now, id],
    );
    if (changed !== 1 || !answer.ok) return;
    await transaction.manager.insert(TimetableContentRow, { timetableId: id, content: answer.content });
  }

  /** Gives an order its number and keeps it with its terminals. */
  async activate(transaction: Transaction, activation: NewActivation): Promise<number> {
    const [last] = await transaction.query<{ number: number | null }[]>(
      'SELECT max(number) AS number FROM timetable_activation',
    );
    const number = (last?.number ?? 0) + 1;
    await transaction.manager.insert(TimetableActivationRow, {
      number,
      timetableId: activation.timetableId,
      fromDate: activation.from,
      acceptGuesses: activation.acceptGuesses ? 1 : 0,
      activatedBy: activation.by,
      takenBackBy: null,
      takenBackAt: null,
      createdAt: activation.now,
    });
    for (const [position, { code, name, stationIds }] of activation.terminals.entries()) {
      const row = { activationNumber: number, code, position, name, stationIds: [...stationIds] };
      await transaction.manager.insert(TimetableTerminalRow, row);
    }
    return number;
  }

  /** Orders that have not been taken back, the oldest first. */
  async findStanding(transaction: Transaction): Promise<TimetableActivationRow[]> {
    return transaction.manager.find(TimetableActivationRow, {
      where: { takenBackAt: IsNull() },
      order: { number: 'ASC' },
    });
  }

  async takeBack(
    transaction: Transaction,
    order: { number: number; by: string; now: Instant },
  ): Promise<void> {
    await transaction.execute(
      'UPDATE timetable_activation SET taken_back_by = ?, taken_back_at = ? WHERE number = ? AND taken_back_at IS NULL',
      [order.by, order.now, order.number],
    );
  }

  async findTerminals(transaction: Transaction, activationNumber: number): Promise<TimetableTerminalRow[]> {
    return transaction.manager.find(TimetableTerminalRow, {
      where: { activationNumber },
      order: { position: 'ASC' },
    });
  }

  /** Codes of all terminals that any order has ever named. */
  async findTerminalCodes(transaction: Transaction): Promise<string[]> {
    const rows = await transaction.query<{ code: string }[]>(
      'SELECT DISTINCT code FROM timetable_terminal ORDER BY code',
    );
    return rows.map((row) => row.code);
  }

  /** By which order the turns of a day were opened; null when they were not. */
  async findOpener(transaction: Transaction, serviceDate: CalendarDate): Promise<number | null> {
    const day = await transaction.manager.findOneBy(TimetableDayRow, { serviceDate });
    return day?.activationNumber ?? null;
  }

  async markOpened(
    transaction: Transaction,
    day: { serviceDate: CalendarDate; activationNumber: number; now: Instant },
  ): Promise<void> {
    await transaction.execute(
      `INSERT INTO timetable_day (service_date, activation_number, created_at) VALUES (?, ?, ?)
       ON CONFLICT (service_date) DO UPDATE SET activation_number = excluded.activation_number`,
      [day.serviceDate, day.activationNumber, day.now],
    );
  }

  async markClosed(transaction: Transaction, serviceDate: CalendarDate): Promise<void> {
    await transaction.manager.delete(TimetableDayRow, { serviceDate });
  }
}

/** An order as the rules of `shared` look at it. */
export function activationOf(row: TimetableActivationRow): TimetableActivationRow & Activation {
  return { ...row, from: row.fromDate };
}
