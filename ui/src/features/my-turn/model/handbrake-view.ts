import { rolesOf, type PlanStep, type WireTurn } from '@stubpost/shared';
import { carList } from './act-form';
import type { KnownTurn } from './known-turn';

/** Which hand a step has on the handbrakes: it sets them, takes them off, or has nothing to do with them. */
export type Hand = 'set' | 'released' | null;

/** What the page of a handbrake step is built from. */
export interface HandbrakeView {
  hand: Hand;
  /** Cars that can be touched: for a set those of the train, for a release those with a handbrake set. Empty: count only. */
  cars: string[];
  /** Cars already released by an earlier entry. */
  released: string[];
  /** How many are off, of how many set, while the counts differ; null otherwise. */
  shortCount: { released: number; set: number; carsStillSet: string[] } | null;
}

/** Whether a step sets handbrakes or takes them off, by the plan. */
export function handOf(steps: readonly PlanStep[], key: string | undefined): Hand {
  const roles = rolesOf(steps);
  if (roles.secure.some((step) => step.key === key)) return 'set';
  return roles.release.some((step) => step.key === key) ? 'released' : null;
}

/** The handbrakes of a turn as the page of one step needs them. */
export function handbrakeView(
  turn: WireTurn,
  steps: readonly PlanStep[],
  handbrakes: KnownTurn['handbrakes'],
  key: string | undefined,
): HandbrakeView {
  const hand = handOf(steps, key);
  if (hand !== 'released')
    return { hand, cars: hand === 'set' ? turn.cars : [], released: [], shortCount: null };
  const secureKeys = rolesOf(steps).secure.map((step) => step.key);
  const carsSet = turn.steps
    .filter((step) => secureKeys.includes(step.key))
    .flatMap((step) => step.reading?.cars ?? []);
  const set = handbrakes?.set ?? 0;
  const released = handbrakes?.released ?? 0;
  const carsStillSet = handbrakes?.carsStillSet ?? [];
  const carsReleased = carsStillSet.length === 0 ? [] : carsSet.filter((car) => !carsStillSet.includes(car));
  return {
    hand,
    cars: carsSet,
    released: carsReleased,
    shortCount: released > 0 && released < set ? { released, set, carsStillSet } : null,
  };
}

/** The counts that differ, in words: "1 of 2 handbrakes released". */
export function shortCountTitle({ released, set }: { released: number; set: number }): string {
  return `${released} of ${set} ${set === 1 ? 'handbrake' : 'handbrakes'} released`;
}

/** What is left, in words: "Car 1412 still set.", "Cars 1408 and 1412 still set.", "1 still set." */
export function handbrakesLeft({
  released,
  set,
  carsStillSet,
}: NonNullable<HandbrakeView['shortCount']>): string {
  if (carsStillSet.length === 0) return `${set - released} still set.`;
  return `${carsStillSet.length === 1 ? 'Car' : 'Cars'} ${carList(carsStillSet)} still set.`;
}
