import { Injectable } from '@nestjs/common';
import {
  mayEverywhere,
  terminalTracks,
  type ActivationRequest,
  type PersonAccess,
  type Timetable,
  type WireTerminalChoice,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { TerminalsService } from '../terminals/terminals.service';
import { TimetableDays } from './timetable-days.service';
import { TimetableTurns } from './timetable-turns.service';
import { TimetablesReadModel } from './timetables.read-model';
import { TimetablesRepository } from './timetables.repository';

type Orderer = PersonAccess & { name: string };

/**
 * Makes timetables the running one and takes that back. Each is one unit of work with all its terminals, tracks and
 * turns: when any part fails, the timetable that runs is as it was.
 */
@Injectable()
export class TimetableActivations {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly readModel: TimetablesReadModel,
    private readonly turns: TimetableTurns,
    private readonly timetables: TimetablesRepository,
    private readonly days: TimetableDays,
    private readonly terminals: TerminalsService,
    private readonly clock: Clock,
  ) {}

  async activate(id: string, request: ActivationRequest, person: Orderer): Promise<void> {
    const timetable = await this.turns.requireContent(id);
    requireEverywhere(person);
    const terminals = checkedTerminals(timetable, request.terminals);
    await this.unitOfWork.run(async (transaction) => {
      const now = this.clock.now();
      for (const terminal of terminals) await this.makeTerminal(transaction, timetable, terminal);
      await this.timetables.activate(transaction, {
        timetableId: id,
        from: request.from,
        acceptGuesses: request.acceptGuesses ?? false,
        terminals,
        by: person.name,
        now,
      });
      await this.days.rollIn(transaction, now);
    });
  }

  /** Takes the newest orders back, which must be for this timetable; gives the id of the one that runs again. */
  async rollBack(id: string, person: Orderer): Promise<string> {
    await this.readModel.require(id);
    requireEverywhere(person);
    return this.unitOfWork.run(async (transaction) => {
      const orders = await this.timetables.findStanding(transaction);
      const before = orders.findLast((order) => order.timetableId !== id);
      if (orders.at(-1)?.timetableId !== id) {
        throw new Refusal({
          code: 'timetable.not_newest',
          message: 'another timetable was made active after this one',
        });
      }
      if (before === undefined) {
        throw new Refusal({
          code: 'timetable.nothing_before',
          message: 'no timetable was active before this one',
        });
      }
      const now = this.clock.now();
      for (const { number } of orders.filter((order) => order.number > before.number)) {
        await this.timetables.takeBack(transaction, { number, by: person.name, now });
      }
      await this.days.rollIn(transaction, now);
      return before.timetableId;
    });
  }

  /** A new terminal, or the known one under its new name; its tracks keep lengths and markers, missing ones come. */
  private async makeTerminal(
    transaction: Transaction,
    timetable: Timetable,
    { code, name, stationIds }: WireTerminalChoice,
  ): Promise<void> {
    await this.terminals.ensureIn(transaction, { code, name, zone: timetable.zone });
    await this.terminals.ensureTracksIn(transaction, code, terminalTracks(timetable, stationIds).labels);
  }
}

/** A timetable touches every terminal, so a right at some of them is not enough. */
function requireEverywhere(person: PersonAccess): void {
  if (mayEverywhere(person, 'timetables.import')) return;
  throw new Refusal({
    code: 'access.forbidden',
    message: 'a timetable is for all terminals: the right must be too',
    facts: { permission: 'timetables.import' },
  });
}

/** The choice with every station named by the top of its chain; refuses what cannot be meant. */
function checkedTerminals(
  timetable: Timetable,
  choices: readonly WireTerminalChoice[],
): WireTerminalChoice[] {
  const stationOf = new Map(timetable.stops.map((stop) => [stop.stopId, stop.stationId]));
  const takenBy = new Map<string, string>();
  const codes = new Set<string>();
  return choices.map(({ code, name, stationIds }) => {
    if (codes.has(code)) {
      const message = `two terminals have the code ${code}`;
      throw new Refusal({ code: 'timetable.terminal_twice', message, facts: { terminal: code } });
    }
    codes.add(code);
    const stations = stationIds.map((stationId) => {
      const top = stationOf.get(stationId);
      if (top === undefined) {
        const message = `the timetable has no station ${stationId}`;
        throw new Refusal({ code: 'timetable.station_unknown', message, facts: { stationId } });
      }
      if ((takenBy.get(top) ?? code) !== code) {
        const message = `station ${stationId} is in two terminals`;
        throw new Refusal({ code: 'timetable.station_twice', message, facts: { stationId } });
      }
      takenBy.set(top, code);
      return top;
    });
    return { code, name, stationIds: [...new Set(stations)] };
  });
}
