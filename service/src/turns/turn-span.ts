import type { Instant } from '@stubpost/shared';
import type { TurnRecord } from './turn-record';

/** The times of a turn that say when its train is, or should be, at the terminal. */
export type TurnTimes = Pick<
  TurnRecord,
  | 'scheduledArrivalAt'
  | 'expectedArrivalAt'
  | 'arrivalAt'
  | 'scheduledDepartureAt'
  | 'heldUntil'
  | 'departureAt'
>;

/**
 * First and last instant of a turn: from its arrival as planned or as it was, whichever is earlier, to its departure
 * as planned, held or as it was, whichever is later. Where it has only one of the two, that is both ends.
 */
export function spanOf(times: TurnTimes): { spanFrom: Instant; spanTo: Instant } {
  const arrivals = known([times.scheduledArrivalAt, times.expectedArrivalAt, times.arrivalAt]);
  const departures = known([times.scheduledDepartureAt, times.heldUntil, times.departureAt]);
  const starts = known([times.scheduledArrivalAt, times.arrivalAt]);
  const all = [...arrivals, ...departures];
  if (all.length === 0) throw new Error('a turn without any time');
  return {
    spanFrom: Math.min(...(starts.length > 0 ? starts : departures.length > 0 ? departures : arrivals)),
    spanTo: Math.max(...all),
  };
}

function known(instants: readonly (Instant | null)[]): Instant[] {
  return instants.filter((instant) => instant !== null);
}
