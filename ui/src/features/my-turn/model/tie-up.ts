import { rolesOf, type PlanStep, type TieUpCheck, type WireTurn } from '@stubpost/shared';
import { handbrakeWords } from './act-form';
import { hasLeft, missingArrival } from './next-act';

/** What the person has put in about a set that is left. Nothing stands in it before the first touch. */
export interface TieUpForm {
  /** Cars on which a handbrake stands set; null before it is said. Empty says that none is set. */
  cars: readonly string[] | null;
  /** How many, where the cars are not known by number; null before it is said. */
  count: number | null;
  checks: readonly TieUpCheck[];
  /** Whether the set was cut off from its air; null before it is said. */
  offAir: boolean | null;
}

export const emptyTieUp: TieUpForm = { cars: null, count: null, checks: [], offAir: null };

/** Handbrakes as the form says them; null before it does. */
export function leftHandbrakes(form: TieUpForm): { count: number; cars: string[] } | null {
  if (form.cars !== null) return { count: form.cars.length, cars: [...form.cars] };
  return form.count === null ? null : { count: form.count, cars: [] };
}

/** Handbrakes that stand set by the records of the turn: the cars of the set step less those released; null where none are. */
export function recordedHandbrakes(
  turn: WireTurn,
  steps: readonly PlanStep[],
): { count: number; cars: string[] } | null {
  const keys = rolesOf(steps).secure.map(({ key }) => key);
  const readings = turn.steps
    .filter(({ key, doneAt }) => keys.includes(key) && doneAt !== null)
    .map(({ reading }) => reading);
  const named = readings.flatMap((reading) => reading?.cars ?? []);
  const { securement } = turn;
  const released = securement?.released ?? 0;
  const cars = released > 0 ? named.filter((car) => securement?.carsStillSet.includes(car)) : named;
  const counted = readings.reduce((sum, reading) => sum + (reading?.count ?? reading?.cars?.length ?? 0), 0);
  const count = Math.max(0, counted - released);
  return count === 0 ? null : { count, cars: cars.length === count ? cars : [] };
}

/** What is open about the securement, in words: each asks for a reason. Empty when nothing is. */
export function securementGaps(turn: WireTurn, steps: readonly PlanStep[], form: TieUpForm): string[] {
  const keys = rolesOf(steps).secure.map(({ key }) => key);
  const open = turn.steps.filter(
    ({ key, doneAt, state }) => keys.includes(key) && doneAt === null && state !== 'not-needed',
  );
  const left = leftHandbrakes(form);
  return [
    ...open.map(({ shortLabel }) => `${shortLabel}: not recorded.`),
    ...(left?.count === 0 ? ['No handbrake stands set.'] : []),
  ];
}

/** What the bar waits for, in words; null when it may open. */
export function tieUpWaitsFor(form: TieUpForm, gaps: readonly string[], reason: string): string | null {
  if (leftHandbrakes(form) === null) return 'waits for the handbrakes';
  if (form.offAir === null) return 'waits for the air';
  return gaps.length > 0 && reason === '' ? 'waits for the reason' : null;
}

/** "2 handbrakes, cars 1408 and 1412", "1 handbrake", "no handbrake". */
export function leftWords(left: { count: number; cars: string[] }): string {
  return left.count === 0 ? 'no handbrake' : handbrakeWords(left);
}

/**
 * The turns of a person whose set stands here and is not to leave by their hand: tie-ups first, then the others, newest
 * arrival first.
 */
export function turnsToTieUp(turns: readonly WireTurn[]): WireTurn[] {
  const arrivedAt = (turn: WireTurn): string => turn.inbound?.actualArrivalAt ?? '';
  return turns
    .filter((turn) => turn.annulled === null && !hasLeft(turn) && !missingArrival(turn))
    .sort(
      (a, b) =>
        Number(b.kind === 'tie-up') - Number(a.kind === 'tie-up') || arrivedAt(b).localeCompare(arrivedAt(a)),
    );
}
