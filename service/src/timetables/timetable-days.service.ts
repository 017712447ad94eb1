import { Injectable, Logger } from '@nestjs/common';
import {
  activationOn,
  addDays,
  calendarDateAt,
  datesBetween,
  openingsFor,
  type CalendarDate,
  type Instant,
  type PlannedOpening,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { TerminalsService } from '../terminals/terminals.service';
import { TurnOpener } from '../turns/turn-opener';
import type { TimetableActivationRow } from './timetable-activation.entity';
import { TimetableContents } from './timetable-contents';
import { activationOf, TimetablesRepository } from './timetables.repository';

/** Service days after today whose turns stand open. */
export const daysAhead = 2;

/**
 * Keeps the turns of today and the next service days open as the running timetable plans them. A day is opened once
 * for each order that comes to run on it; doing it again changes nothing.
 */
@Injectable()
export class TimetableDays {
  private readonly logger = new Logger(TimetableDays.name);

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly timetables: TimetablesRepository,
    private readonly contents: TimetableContents,
    private readonly terminals: TerminalsService,
    private readonly opener: TurnOpener,
    private readonly clock: Clock,
  ) {}

  /** Opens what is not open yet, in a transaction of its own; gives the dates. */
  async roll(): Promise<CalendarDate[]> {
    const dates = await this.unitOfWork.run((transaction) => this.rollIn(transaction, this.clock.now()));
    if (dates.length > 0) this.logger.log(`opened the turns of ${dates.join(', ')}`);
    return dates;
  }

  /** Opens a service day outside the rolling ones, such as a past one. Nothing happens where nothing runs, or twice. */
  async open(serviceDate: CalendarDate): Promise<void> {
    await this.unitOfWork.run(async (transaction) => {
      const orders = (await this.timetables.findStanding(transaction)).map(activationOf);
      const order = activationOn(orders, serviceDate);
      const opener = await this.timetables.findOpener(transaction, serviceDate);
      if (order === null || order.number === opener) return;
      await this.openDay(transaction, { order, serviceDate, now: this.clock.now() });
    });
  }

  /** As `roll`, inside a larger piece of work. */
  async rollIn(transaction: Transaction, now: Instant): Promise<CalendarDate[]> {
    const orders = (await this.timetables.findStanding(transaction)).map(activationOf);
    const newest = orders.at(-1);
    if (newest === undefined) return [];
    const { zone } = await this.contents.require(newest.timetableId);
    const today = calendarDateAt(now, zone);
    const changed: CalendarDate[] = [];
    for (const serviceDate of datesBetween(today, addDays(today, daysAhead))) {
      const order = activationOn(orders, serviceDate);
      const opener = await this.timetables.findOpener(transaction, serviceDate);
      if ((order?.number ?? null) === opener) continue;
      await this.openDay(transaction, { order, serviceDate, now });
      changed.push(serviceDate);
    }
    return changed;
  }

  /** Makes the turns of a day those of an order; turns on which something has happened stay as they are. */
  private async openDay(
    transaction: Transaction,
    day: { order: TimetableActivationRow | null; serviceDate: CalendarDate; now: Instant },
  ): Promise<void> {
    const { order, serviceDate, now } = day;
    const openings = order === null ? [] : await this.openingsOf(transaction, order, serviceDate);
    for (const terminal of await this.timetables.findTerminalCodes(transaction)) {
      const keep = openings
        .filter((opening) => opening.terminal === terminal)
        .map((opening) => opening.pairKey);
      await this.opener.withdrawUnstarted(transaction, { terminal, serviceDate, keep, now });
    }
    if (order === null) {
      await this.timetables.markClosed(transaction, serviceDate);
      return;
    }
    const zones = await this.terminals.zonesIn(transaction);
    await this.opener.openTurns(transaction, { timetableId: order.timetableId, zones, openings, now });
    await this.timetables.markOpened(transaction, { serviceDate, activationNumber: order.number, now });
  }

  private async openingsOf(
    transaction: Transaction,
    order: TimetableActivationRow,
    serviceDate: CalendarDate,
  ): Promise<PlannedOpening[]> {
    const timetable = await this.contents.require(order.timetableId);
    const terminals = await this.timetables.findTerminals(transaction, order.number);
    return openingsFor(timetable, { serviceDate, terminals, acceptGuesses: order.acceptGuesses === 1 });
  }
}
