import {
  formatInstant,
  parseInstant,
  rolesOf,
  stepsFor,
  turnFrom,
  type Account,
  type PlanStep,
  type PlannedTurn,
  type RecordEntryRequest,
  type StepPlan,
  type TurnFacts,
  type WireEntry,
  type WireStep,
  type WireTurn,
} from '@stubpost/shared';
import { withCrewUnderWay, withMatters } from './known-matters';
import { asWireEntry, toEntries, type Writer } from './wire-entries';

/** A turn as this phone knows it: what the service told, with the entries that are still under way put in. */
export interface KnownTurn {
  turn: WireTurn;
  /** The steps of this turn, by the plan in force on its day. */
  steps: readonly PlanStep[];
  /** The steps of the whole plan. */
  planSteps: readonly PlanStep[];
  /** Handbrakes by all entries; null until the entries of the turn are here. */
  handbrakes: TurnFacts['handbrakes'] | null;
  /** Keys of the steps that take handbrakes off. */
  releases: ReadonlySet<string>;
}

/** What is needed to know a turn. `entries` is undefined while they load. */
export interface TurnSources {
  turn: WireTurn;
  plan: Pick<StepPlan, 'steps'>;
  entries: readonly WireEntry[] | undefined;
  waiting: readonly RecordEntryRequest[];
  writer: Writer;
}

const instant = (text: string | null | undefined): number | null =>
  text === null || text === undefined ? null : parseInstant(text);

function plannedOf(turn: WireTurn): PlannedTurn {
  return {
    id: turn.id,
    kind: turn.kind,
    serviceDate: turn.serviceDate,
    reverses: turn.reverses,
    inboundTrain: turn.inbound?.train ?? null,
    outboundTrain: turn.outbound?.train ?? null,
    scheduledArrivalAt: instant(turn.inbound?.scheduledArrivalAt),
    scheduledDepartureAt: instant(turn.outbound?.scheduledDepartureAt),
    track: turn.track,
    set: turn.set,
  };
}

/**
 * Puts the entries under way into a turn. The rules of the entries are those of the core: the facts are worked out once
 * with and once without them, and only what they change goes over the service's own word.
 */
export function knownTurn({ turn, plan, entries, waiting, writer }: TurnSources): KnownTurn {
  const steps = stepsFor(plan.steps, turn);
  const releases = new Set(rolesOf(steps).release.map((step) => step.key));
  const planned = plannedOf(turn);
  const told = toEntries(turn.id, entries ?? []);
  const own = toEntries(
    turn.id,
    waiting.map((request) => asWireEntry(request, writer)),
  );
  const before = turnFrom(planned, steps, told);
  const after = own.length === 0 ? before : turnFrom(planned, steps, [...told, ...own]);
  const facts = own.length === 0 ? turn : withFacts(turn, before, after);
  const settled =
    own.length === 0 || entries === undefined ? facts : withMatters(facts, after, waiting, writer);
  return {
    turn: withCrewUnderWay(settled, waiting, writer),
    steps,
    planSteps: plan.steps,
    handbrakes: entries === undefined ? null : after.handbrakes,
    releases,
  };
}

function withFacts(turn: WireTurn, before: TurnFacts, after: TurnFacts): WireTurn {
  const { inbound, outbound } = turn;
  const arrivalAt = changed(before.arrivalAt, after.arrivalAt, inbound?.actualArrivalAt ?? null);
  const departureAt = changed(before.departureAt, after.departureAt, outbound?.actualDepartureAt ?? null);
  return {
    ...turn,
    lastHeardAt: newest(turn.lastHeardAt, after.lastHeardAt),
    inbound: inbound === null ? null : { ...inbound, actualArrivalAt: arrivalAt },
    outbound: outbound === null ? null : { ...outbound, actualDepartureAt: departureAt },
    steps: turn.steps.map((step) => withAccount(step, before.done[step.key], after.done[step.key])),
  };
}

const newest = (told: string | null, own: number | null): string | null =>
  own === null || (told !== null && Date.parse(told) >= own) ? told : formatInstant(own);

/** The service's word, unless the entries under way say something else. */
function changed(before: number | null, after: number | null, told: string | null): string | null {
  if (before === after) return told;
  return after === null ? null : formatInstant(after);
}

function withAccount(step: WireStep, before: Account | undefined, after: Account | undefined): WireStep {
  if (before?.entryId === after?.entryId) return step;
  if (after === undefined) {
    return {
      ...step,
      state: 'withdrawn',
      doneAt: null,
      source: null,
      by: null,
      saidBy: null,
      reading: null,
      entryId: null,
    };
  }
  return {
    ...step,
    state: 'done',
    doneAt: formatInstant(after.at),
    source: after.source,
    by: after.by?.name ?? null,
    saidBy: after.saidBy,
    reading: after.reading,
    entryId: after.entryId,
  };
}
