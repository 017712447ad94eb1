import { Injectable } from '@nestjs/common';
import {
  addDays,
  calendarDateAt,
  compareTimetables,
  datesBetween,
  deriveTurns,
  formatInstant,
  type CalendarDate,
  type ComparedTurn,
  type DifferenceQuery,
  type Timetable,
  type WireComparedTurn,
  type WireDerivedTurn,
  type WireTimetableDifference,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { TimetableContents } from './timetable-contents';
import { TimetablesReadModel } from './timetables.read-model';

/** What a timetable would bring: its turns of a day, and what they change. */
@Injectable()
export class TimetableTurns {
  constructor(
    private readonly contents: TimetableContents,
    private readonly readModel: TimetablesReadModel,
    private readonly clock: Clock,
  ) {}

  /** The content of a timetable that was read; refuses one that is unknown or not ready. */
  async requireContent(id: string): Promise<Timetable> {
    const { state } = await this.readModel.require(id);
    const content = await this.contents.find(id);
    if (content !== null) return content;
    throw new Refusal({
      code: 'timetable.not_ready',
      message: state === 'refused' ? 'this timetable was refused' : 'this timetable is still being read',
      facts: { state },
    });
  }

  async ofDay(id: string, serviceDate: CalendarDate): Promise<WireDerivedTurn[]> {
    const content = await this.requireContent(id);
    return deriveTurns(content, serviceDate).map((turn) => ({
      serviceDate: turn.serviceDate,
      stationId: turn.stationId,
      blockId: turn.blockId,
      inboundTripId: turn.inboundTripId,
      arrivalAt: formatInstant(turn.arrivalAt),
      outboundTripId: turn.outboundTripId,
      departureAt: formatInstant(turn.departureAt),
      layoverSeconds: turn.layoverSeconds,
      reverses: turn.reverses,
      guessed: turn.guessed,
    }));
  }

  /** What would change, date by date, at the terminals of the timetable that runs then. */
  async differenceTo(id: string, query: DifferenceQuery): Promise<WireTimetableDifference> {
    const after = await this.requireContent(id);
    const from = query.from ?? calendarDateAt(this.clock.now(), after.zone);
    const running = await this.readModel.runningBeside(id, from);
    if (running === null) return { against: null, dates: [], turns: [] };
    const before = await this.contents.require(running.timetableId);
    const terminals = await this.readModel.terminalsOf(running.number);
    const codeOf = new Map(
      terminals.flatMap(({ code, stationIds }) => stationIds.map((id) => [id, code] as const)),
    );
    const difference = compareTimetables({
      before,
      after,
      dates: datesBetween(from, addDays(from, query.days - 1)),
      placeOf: (stationId) => codeOf.get(stationId) ?? null,
    });
    return {
      against: { id: running.timetableId, fileName: running.fileName },
      dates: difference.dates.map(({ place, ...date }) => ({ ...date, terminal: place })),
      turns: difference.turns.map(({ place, before: old, after: fresh, ...turn }) => ({
        ...turn,
        terminal: place,
        before: wireTurn(old),
        after: wireTurn(fresh),
      })),
    };
  }
}

function wireTurn(turn: ComparedTurn | null): WireComparedTurn | null {
  if (turn === null) return null;
  return { ...turn, arrivalAt: formatInstant(turn.arrivalAt), departureAt: formatInstant(turn.departureAt) };
}
