import type { CalendarDate, Instant } from '../lib/instant';
import { turnsOfDay, type DerivedTurn } from './derive-turns';
import { addDays, daysBetween, secondsOfServiceDay } from './service-day';
import { runningDates } from './service-days';
import type { Timetable } from './timetable';
import { indexTrips, type TripIndex } from './trip-index';

/** One turn as it stands in one of two compared timetables. */
export interface ComparedTurn {
  inboundTrain: string;
  arrivalAt: Instant;
  outboundTrain: string;
  departureAt: Instant;
  layoverSeconds: number;
}

/** A turn that is not in both timetables alike. */
export interface TurnDifference {
  serviceDate: CalendarDate;
  change: 'added' | 'removed' | 'moved';
  place: string;
  before: ComparedTurn | null;
  after: ComparedTurn | null;
}

/** What differs on one date at one place. */
export interface DateDifference {
  serviceDate: CalendarDate;
  /** Date of the older timetable that was looked at: the same, or the last like weekday it runs on. */
  againstDate: CalendarDate | null;
  place: string;
  added: number;
  removed: number;
  moved: number;
  same: number;
}

/** The question: which two, on which dates of the newer, and what their stations are called in common. */
export interface Comparison {
  before: Timetable;
  after: Timetable;
  dates: readonly CalendarDate[];
  /** A common name for the stations of one place, such as its terminal's code; null for stations that do not count. */
  placeOf: (stationId: string) => string | null;
}

interface Timed {
  turn: DerivedTurn;
  place: string;
  /** Seconds of the service day of arrival and departure: comparable across dates. */
  arrivalSeconds: number;
  departureSeconds: number;
}

/**
 * Compares two timetables turn by turn. A turn of the same two times at the same place is the same, whatever its
 * trains are called. Of the others, those that share both trains, else the inbound, else the outbound train, are moved;
 * what is left was added or removed. Guessed turns are not compared.
 */
export function compareTimetables(comparison: Comparison): {
  dates: DateDifference[];
  turns: TurnDifference[];
} {
  const before = indexTrips(comparison.before);
  const after = indexTrips(comparison.after);
  const runsOnDates = runningDates(comparison.before);
  const result: { dates: DateDifference[]; turns: TurnDifference[] } = { dates: [], turns: [] };
  for (const serviceDate of comparison.dates) {
    const againstDate = likeDate(runsOnDates, serviceDate);
    const old = againstDate === null ? [] : timedTurns(before, againstDate, comparison.placeOf);
    const fresh = timedTurns(after, serviceDate, comparison.placeOf);
    for (const place of [...new Set([...old, ...fresh].map((turn) => turn.place))].sort()) {
      const at = (turns: Timed[]): Timed[] => turns.filter((turn) => turn.place === place);
      const { same, changes } = match(at(old), at(fresh));
      const count = (change: TurnDifference['change']): number =>
        changes.filter((difference) => difference.change === change).length;
      const counts = { added: count('added'), removed: count('removed'), moved: count('moved') };
      result.dates.push({ serviceDate, againstDate, place, same, ...counts });
      result.turns.push(...changes.map((change) => ({ ...change, serviceDate, place })));
    }
  }
  return result;
}

/** The date itself when the timetable reaches that far, else the last date it runs on with the same weekday. */
function likeDate(runningOn: readonly CalendarDate[], date: CalendarDate): CalendarDate | null {
  const first = runningOn[0];
  const last = runningOn.at(-1);
  if (first === undefined || last === undefined) return null;
  if (first <= date && date <= last) return date;
  const towards = date > last ? last : addDays(first, 6);
  const weeks = Math.floor(daysBetween(date, towards) / 7);
  const like = addDays(date, weeks * 7);
  return first <= like && like <= last ? like : null;
}

function timedTurns(index: TripIndex, date: CalendarDate, placeOf: Comparison['placeOf']): Timed[] {
  const { zone } = index.timetable;
  return turnsOfDay(index, date).flatMap((turn) => {
    const place = placeOf(turn.stationId);
    if (turn.guessed || place === null) return [];
    const arrivalSeconds = secondsOfServiceDay(turn.arrivalAt, date, zone);
    const departureSeconds = secondsOfServiceDay(turn.departureAt, date, zone);
    return [{ turn, place, arrivalSeconds, departureSeconds }];
  });
}

type Change = Omit<TurnDifference, 'serviceDate' | 'place'>;

/** Ways in which two turns can be one, the surest first. */
const likenesses: ((timed: Timed) => string)[] = [
  ({ arrivalSeconds, departureSeconds }) => `${arrivalSeconds} ${departureSeconds}`,
  ({ turn }) => JSON.stringify([turn.inboundTrain, turn.outboundTrain]),
  ({ turn }) => turn.inboundTrain,
  ({ turn }) => turn.outboundTrain,
];

function match(before: Timed[], after: Timed[]): { same: number; changes: Change[] } {
  let left = before;
  let fresh = after;
  let same = 0;
  const changes: Change[] = [];
  likenesses.forEach((keyOf, rank) => {
    const waiting = new Map<string, Timed[]>();
    for (const timed of left) waiting.set(keyOf(timed), [...(waiting.get(keyOf(timed)) ?? []), timed]);
    fresh = fresh.filter((timed) => {
      const partner = waiting.get(keyOf(timed))?.shift();
      if (partner === undefined) return true;
      left = left.filter((other) => other !== partner);
      if (rank === 0) same += 1;
      else changes.push({ change: 'moved', before: partOf(partner), after: partOf(timed) });
      return false;
    });
  });
  changes.push(...fresh.map((timed): Change => ({ change: 'added', before: null, after: partOf(timed) })));
  changes.push(...left.map((timed): Change => ({ change: 'removed', before: partOf(timed), after: null })));
  return { same, changes };
}

function partOf({ turn }: Timed): ComparedTurn {
  const { inboundTrain, arrivalAt, outboundTrain, departureAt, layoverSeconds } = turn;
  return { inboundTrain, arrivalAt, outboundTrain, departureAt, layoverSeconds };
}
