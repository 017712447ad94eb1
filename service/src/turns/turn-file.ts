import {
  type CrewOnTurn,
  type Entry,
  type PlannedTurn,
  type TurnFacts,
  stepsFor,
  turnFrom,
} from '@stubpost/shared';
import type { AlertRecord } from '../alerts/alert-record';
import type { StoredPlan } from '../plans/plan.repository';
import type { CrewMemberOfTurn } from './turn.entity';
import type { TurnRecord } from './turn-record';

/** Everything known about a turn at one version of its row. Never changed: a later version is another file. */
export interface TurnFile {
  record: TurnRecord;
  plan: StoredPlan;
  entries: readonly Entry[];
  facts: TurnFacts;
  /** Cars of the set in order from the bumping post; empty while the set is unknown. */
  cars: readonly string[];
  /** Alerts that stand, the most urgent first. */
  alerts: readonly AlertRecord[];
}

/** What a file is made from; its facts follow. */
export type TurnFileParts = Omit<TurnFile, 'facts'>;

/** Puts a file together. */
export function turnFileFrom(parts: TurnFileParts): TurnFile {
  return { ...parts, facts: turnFactsFrom(parts) };
}

/** The facts of a turn from its row, its plan and its entries. */
export function turnFactsFrom({
  record,
  plan,
  entries,
}: Pick<TurnFileParts, 'record' | 'plan' | 'entries'>): TurnFacts {
  const steps = stepsFor(plan.steps, { kind: record.kind, reverses: record.reverses });
  return turnFrom(plannedTurnOf(record), steps, entries, record.carriedCrew.map(carriedOver));
}

function plannedTurnOf(record: TurnRecord): PlannedTurn {
  return {
    id: record.id,
    kind: record.kind,
    serviceDate: record.serviceDate,
    reverses: record.reverses,
    inboundTrain: record.inboundTrain,
    outboundTrain: record.outboundTrain,
    scheduledArrivalAt: record.scheduledArrivalAt,
    scheduledDepartureAt: record.scheduledDepartureAt,
    track: record.plannedTrack,
    set: record.plannedSet,
  };
}

function carriedOver({ as, personId, name }: CrewMemberOfTurn): CrewOnTurn {
  return { as, personId, name, since: null, carriedOver: true };
}
