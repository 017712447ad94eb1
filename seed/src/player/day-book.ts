import type { INestApplicationContext } from '@nestjs/common';
import { Reader } from '@stubpost/service';
import { defaultStepPlanSteps, serviceInstant, type CalendarDate } from '@stubpost/shared';
import { demoZone } from '../railroad/geography';
import { groupBy } from '../railroad/group-by';
import { setOfBlock } from '../railroad/sets';
import type { SetDay, StoryTurn, TurnStory } from '../story/act';
import { dayOrdinal } from '../story/demo-day';
import { storyOfSetDay } from '../story/set-day-story';
import type { Cast } from './cast';

interface TurnRow {
  id: string;
  terminal: string;
  service_date: string;
  kind: StoryTurn['kind'];
  inbound_train: string | null;
  outbound_train: string | null;
  scheduled_arrival_at: number | null;
  scheduled_departure_at: number | null;
  block: string | null;
}

async function timetableTurns(app: INestApplicationContext, serviceDate: CalendarDate): Promise<StoryTurn[]> {
  const rows = await app.get(Reader).query<TurnRow>(
    `SELECT id, terminal_code AS terminal, service_date, kind, inbound_train, outbound_train, scheduled_arrival_at,
       scheduled_departure_at, planned_set AS block
     FROM turn WHERE service_date = ? AND origin = 'timetable' AND withdrawn_at IS NULL AND planned_set IS NOT NULL
     ORDER BY COALESCE(scheduled_arrival_at, scheduled_departure_at), id`,
    [serviceDate],
  );
  return rows.map((row) => ({
    id: row.id,
    terminal: row.terminal,
    serviceDate: row.service_date,
    kind: row.kind,
    inboundTrain: row.inbound_train,
    outboundTrain: row.outbound_train,
    scheduledArrivalAt: row.scheduled_arrival_at === null ? null : Number(row.scheduled_arrival_at),
    scheduledDepartureAt: row.scheduled_departure_at === null ? null : Number(row.scheduled_departure_at),
    block: row.block,
  }));
}

/** The crews of a block on a day: two shifts, moved on by three each day so that crews change sets. */
function shiftsOf(cast: Cast, blockIndex: number, serviceDate: CalendarDate): SetDay['shifts'] {
  const conductors = cast.withRole('conductor');
  const engineers = cast.withRole('engineer');
  const at = <Person>(people: readonly Person[], index: number): Person => {
    const person = people[index % people.length];
    if (person === undefined) throw new Error('the demo has no crews');
    return person;
  };
  const first = 2 * blockIndex + 3 * dayOrdinal(serviceDate);
  return [first, first + 1].map((index) => {
    const engineer = at(engineers, index);
    return { conductor: at(conductors, index).key, engineer: engineer.key, engineerName: engineer.name };
  });
}

/** The stories of every set on one service date, each set's turns in order; none when the day is not opened. */
export async function storiesOfDay(
  app: INestApplicationContext,
  cast: Cast,
  serviceDate: CalendarDate,
): Promise<TurnStory[][]> {
  const turns = await timetableTurns(app, serviceDate);
  const blocks = [...groupBy(turns, (turn) => turn.block ?? '')].sort(([a], [b]) => a.localeCompare(b));
  const dayStartsAt = serviceInstant(serviceDate, 0, demoZone);
  return blocks.map(([, blockTurns], blockIndex) => {
    const set = setOfBlock(blockIndex, dayOrdinal(serviceDate));
    const cars = set.units.filter((unit) => unit.kind !== 'locomotive').map((unit) => unit.number);
    const setDay = {
      set: set.label,
      cars,
      turns: blockTurns,
      shifts: shiftsOf(cast, blockIndex, serviceDate),
    };
    return storyOfSetDay(setDay, defaultStepPlanSteps, dayStartsAt);
  });
}
