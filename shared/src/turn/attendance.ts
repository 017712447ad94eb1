import { addSeconds, type Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import type { TurnFacts } from './facts';

/**
 * Seconds after the arrival without a handbrake and without any entry after which the train is taken to be left
 * alone. A rule of the product, not of the law.
 */
export const silenceSeconds = 600;

/** Whether somebody is at the train who can work its brakes, as far as the entries say. */
export interface Attendance {
  /** Since when nobody is; null while somebody is, before the arrival and after the departure. */
  unattendedSince: Instant | null;
  /** Since when nobody is and no handbrake stands set; null otherwise. */
  unsecuredSince: Instant | null;
}

const attended: Attendance = { unattendedSince: null, unsecuredSince: null };

interface Change {
  at: Instant;
  manned: boolean;
}

/**
 * Whether a standing train is unattended and unsecured at `now`. Unattended begins when the ends are changed (the
 * arriving cab is empty), when the crew or its engineer is relieved and nobody takes over, when the set is tied up, or 600 s after the
 * arrival when the handbrake is outstanding and there has been no entry since the arrival. It ends with the
 * engineer in the leaving cab, with a relief taken over, and with the departure. Unsecured is unattended while no
 * handbrake stands set, by count. A turn whose plan has no securement after the arrival is not judged.
 */
export function attendanceAt(facts: TurnFacts, now: Instant): Attendance {
  const { arrivalAt, departureAt } = facts;
  if (arrivalAt === null || arrivalAt > now) return attended;
  if (departureAt !== null && departureAt <= now) return attended;
  if (rolesOf(facts.steps).secure.length === 0) return attended;
  const changes = [
    ...cabChanges(facts),
    ...reliefChanges(facts),
    ...tieUpChanges(facts),
    ...silence(facts, arrivalAt),
  ];
  let unattendedSince: Instant | null = null;
  for (const change of changes.sort(mannedLast)) {
    if (change.at > now) break;
    unattendedSince = change.manned ? null : (unattendedSince ?? change.at);
  }
  return { unattendedSince, unsecuredSince: unsecuredSince(facts, unattendedSince, now) };
}

/** In order of time; at the same time the one that ends unattended comes last. */
function mannedLast(a: Change, b: Change): number {
  return a.at - b.at || Number(a.manned) - Number(b.manned);
}

/** When all of some steps were recorded; null while any is not, or when there is none. */
function allDoneAt(facts: TurnFacts, steps: readonly PlanStep[]): Instant | null {
  if (steps.length === 0) return null;
  const times = steps.map((step) => facts.doneAt[step.key]);
  return times.reduce<Instant | null>(
    (latest, at) => (at === undefined || latest === null ? null : Math.max(latest, at)),
    -Infinity,
  );
}

function cabChanges(facts: TurnFacts): Change[] {
  const { changeEnds, manCab } = rolesOf(facts.steps);
  const left = allDoneAt(facts, changeEnds);
  const manned = allDoneAt(facts, manCab);
  const changes: Change[] = [];
  if (manned !== null) changes.push({ at: manned, manned: true });
  if (left !== null && (manned === null || left <= manned)) changes.push({ at: left, manned: false });
  return changes;
}

function reliefChanges(facts: TurnFacts): Change[] {
  return facts.reliefs
    .filter((relief) => relief.takenOver || relief.as === 'engineer' || !relief.crewLeft)
    .map((relief) => ({ at: relief.at, manned: relief.takenOver }));
}

function tieUpChanges({ tiedUp }: TurnFacts): Change[] {
  return tiedUp === null ? [] : [{ at: tiedUp.at, manned: false }];
}

function silence(facts: TurnFacts, arrivalAt: Instant): Change[] {
  const until = addSeconds(arrivalAt, silenceSeconds);
  const securedAt = allDoneAt(facts, rolesOf(facts.steps).secure);
  if (securedAt !== null && securedAt <= until) return [];
  const heard = facts.entries.some(
    (entry) => entry.kind !== 'arrival' && entry.observedAt > arrivalAt && entry.observedAt <= until,
  );
  return heard ? [] : [{ at: until, manned: false }];
}

function unsecuredSince(facts: TurnFacts, unattendedSince: Instant | null, now: Instant): Instant | null {
  if (unattendedSince === null) return null;
  const log = facts.handbrakes.log.filter((change) => change.at <= now);
  if ((log.at(-1)?.standing ?? 0) > 0) return null;
  const lastStanding = log.findLastIndex((change) => change.standing > 0);
  const takenOff = log[lastStanding + 1];
  return lastStanding < 0 || takenOff === undefined
    ? unattendedSince
    : Math.max(unattendedSince, takenOff.at);
}

/** How many handbrakes stand set at `now`, by count. A set without a count is 1. */
export function handbrakesStanding(facts: TurnFacts, now: Instant): number {
  return facts.handbrakes.log.findLast((change) => change.at <= now)?.standing ?? 0;
}
