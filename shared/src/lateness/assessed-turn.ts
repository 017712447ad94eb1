import type { Instant } from '../lib/instant';
import type { Forecast } from '../forecast/forecast';
import type { Doer, StepKind } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import { shortestTurnSeconds } from '../plan/steps-for-turn';
import { attendanceAt } from '../turn/attendance';
import type { CrewRole } from '../turn/entry';
import type { TurnFacts } from '../turn/facts';
import { lifeOf } from '../turn/life';
import type { TurnKind, TurnState } from '../turn/turn';

/** One step as `assess` looks at it. */
export interface AssessedStep {
  key: string;
  label: string;
  shortLabel: string;
  kind: StepKind;
  doer: Doer;
  holdsDeparture: boolean;
  isAfterDeparture: boolean;
  /** Whether it brings the engineer into the leaving cab. */
  mansCab: boolean;
  dueAt: Instant;
  latestFinishAt: Instant;
  finishAt: Instant;
  doneAt: Instant | null;
  /** Why it cannot be done, as somebody said. */
  cannotDo: string | null;
}

/** What `assess` and `healthOf` look at: made from facts on the server and from the wire turn in the browser. */
export interface AssessedTurn {
  kind: TurnKind;
  state: TurnState;
  /** A turn of a drill: nothing is raised for it. */
  practice: boolean;
  crew: readonly { as: CrewRole; name: string }[];
  scheduledArrivalAt: Instant | null;
  expectedArrivalAt: Instant | null;
  arrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  departureAt: Instant | null;
  steps: readonly AssessedStep[];
  forecast: Pick<
    Forecast,
    'arrivalAnchorAt' | 'departureAnchorAt' | 'readyAt' | 'slackSeconds' | 'criticalSteps'
  >;
  /** The plan's longest path at typical durations; 0 without steps. */
  shortestTurnSeconds: number;
  handbrakes: { set: number | null; released: number | null; carsStillSet: readonly string[] };
  /** Since when nobody is at the train and no handbrake stands set; null otherwise. */
  unsecuredSince: Instant | null;
  blueSignal: { since: Instant; by: string } | null;
  lastHeardAt: Instant | null;
  /** When the outbound train is recorded at its next stop; null while it is not, or nobody tells. */
  nextStopAt: Instant | null;
}

/** What the facts of a turn do not hold. Both may be left out. */
export interface AssessedContext {
  practice?: boolean;
  nextStopAt?: Instant | null;
}

/** A turn as `assess` looks at it, from its facts and its forecast at `now`. */
export function assessedTurnOf(
  facts: TurnFacts,
  forecast: Forecast,
  now: Instant,
  context: AssessedContext = {},
): AssessedTurn {
  const { planned, handbrakes } = facts;
  return {
    kind: planned.kind,
    state: lifeOf(facts, now),
    practice: context.practice ?? false,
    crew: facts.crew,
    scheduledArrivalAt: planned.scheduledArrivalAt,
    expectedArrivalAt: facts.expectedArrivalAt,
    arrivalAt: facts.arrivalAt,
    scheduledDepartureAt: planned.scheduledDepartureAt,
    departureAt: facts.departureAt,
    steps: assessedSteps(facts, forecast),
    forecast,
    shortestTurnSeconds: shortestTurnSeconds(facts.steps),
    handbrakes,
    unsecuredSince: attendanceAt(facts, now).unsecuredSince,
    blueSignal: facts.blueSignal,
    lastHeardAt: facts.lastHeardAt,
    nextStopAt: context.nextStopAt ?? null,
  };
}

function assessedSteps(facts: TurnFacts, forecast: Forecast): AssessedStep[] {
  const { afterDeparture, manCab } = rolesOf(facts.steps);
  return facts.steps.flatMap((step, index) => {
    const times = forecast.steps[index];
    if (times === undefined) return [];
    const { key, label, shortLabel, kind, doer, holdsDeparture } = step;
    return {
      key,
      label,
      shortLabel,
      kind,
      doer,
      holdsDeparture,
      isAfterDeparture: afterDeparture.has(key),
      mansCab: manCab.includes(step),
      dueAt: times.dueAt,
      latestFinishAt: times.latestFinishAt,
      finishAt: times.finishAt,
      doneAt: facts.doneAt[key] ?? null,
      cannotDo: facts.cannotDo.find((each) => each.step === key)?.reason ?? null,
    };
  });
}
