import type { TimetableTrip } from './timetable';
import { groupBy, inRunningOrder } from './trip-index';

/**
 * Shortest layover that is guessed for trains the file does not join: ten minutes (our choice; the shipped step plan
 * needs 520 s at its typical durations).
 */
export const shortestGuessSeconds = 600;

interface GuessQuestion {
  /** Trains without a known next train, and trains without a known train before. */
  arriving: readonly TimetableTrip[];
  leaving: readonly TimetableTrip[];
  placeOf: (stopId: string) => string;
}

/**
 * Pairs trains first in, first out at each place: every departure takes the train that has stood there longest, if it
 * has stood for the shortest layover. Only a guess, to be accepted by a person.
 */
export function guessPairs(question: GuessQuestion): { inbound: TimetableTrip; outbound: TimetableTrip }[] {
  const { placeOf } = question;
  const standing = groupBy(
    [...question.arriving].sort(
      (one, other) => one.arrivalSeconds - other.arrivalSeconds || inRunningOrder(one, other),
    ),
    (trip) => placeOf(trip.lastStopId),
  );
  return [...question.leaving].sort(inRunningOrder).flatMap((outbound) => {
    const queue = standing.get(placeOf(outbound.firstStopId)) ?? [];
    const [inbound] = queue;
    if (inbound === undefined || inbound.arrivalSeconds + shortestGuessSeconds > outbound.departureSeconds)
      return [];
    queue.shift();
    return [{ inbound, outbound }];
  });
}
