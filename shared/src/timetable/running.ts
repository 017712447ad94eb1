import type { CalendarDate } from '../lib/instant';
import { addDays } from './service-day';

/** An order that a timetable runs from a service date on. */
export interface Activation {
  /** Order in which such orders were given; the later one wins. */
  number: number;
  from: CalendarDate;
}

/**
 * The order that counts on a service date: the latest given of those that have begun by then. Orders taken back must
 * not be among them.
 */
export function activationOn<Order extends Activation>(
  activations: readonly Order[],
  date: CalendarDate,
): Order | null {
  const begun = activations.filter((activation) => activation.from <= date);
  return begun.reduce<Order | null>(
    (latest, activation) => (latest === null || activation.number > latest.number ? activation : latest),
    null,
  );
}

/**
 * First and last service date on which an order counts, the last null when nothing follows it. Null when later orders
 * leave it no day at all.
 */
export function spanOfActivation(
  activations: readonly Activation[],
  activation: Activation,
): { from: CalendarDate; until: CalendarDate | null } | null {
  const [next] = activations
    .filter((other) => other.number > activation.number)
    .map((other) => other.from)
    .sort();
  if (next === undefined) return { from: activation.from, until: null };
  const until = addDays(next, -1);
  return until < activation.from ? null : { from: activation.from, until };
}
