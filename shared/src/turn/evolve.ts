import type { Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import { accountOf, compareAccounts, countingAccount, isInQuestion, type Account } from './account';
import { followBlueSignals } from './blue-signals';
import { followCrew, type CrewOnTurn } from './crew';
import type { Entry } from './entry';
import { findInEntries } from './entry-findings';
import type { CannotDo, InQuestion, TurnFacts } from './facts';
import { completeReleases, countHandbrakes, setsNone, type Handbrakes } from './handbrakes';
import {
  compareEntries,
  keepEntries,
  latestObserved,
  ofKind,
  standingEntries,
  type StandingEntries,
} from './standing-entries';
import type { PlannedTurn } from './turn';

/** A turn of which nothing has been heard yet. `carriedOver` is the crew from the set's turn before. */
export function startOfTurn(
  planned: PlannedTurn,
  steps: readonly PlanStep[],
  carriedOver: readonly CrewOnTurn[] = [],
): TurnFacts {
  return turnFrom(planned, steps, [], carriedOver);
}

/**
 * A turn with one more entry. Nothing is refused: what is wrong with the entry becomes a finding. An id that is
 * already among the entries changes nothing.
 */
export function evolve(facts: TurnFacts, entry: Entry): TurnFacts {
  return turnFrom(facts.planned, facts.steps, [...facts.entries, entry], facts.carriedOver);
}

/**
 * The facts of a turn from all its entries, in whatever order they are given. `steps` are the steps of this turn,
 * from `stepsFor`, not those of the whole plan.
 */
export function turnFrom(
  planned: PlannedTurn,
  steps: readonly PlanStep[],
  entries: readonly Entry[],
  carriedOver: readonly CrewOnTurn[] = [],
): TurnFacts {
  const kept = keepEntries(entries);
  const standing = standingEntries(kept);
  const movement = movementFacts(planned, standing);
  const work = stepFacts(steps, kept, standing);
  const blueSignals = followBlueSignals(standing.entries);
  const up = blueSignals.find((signal) => signal.until === null);
  const facts = {
    planned,
    steps,
    carriedOver,
    entries: kept,
    ...movement,
    ...followCrew(standing.entries, carriedOver),
    ...work,
    inQuestion: [...movement.inQuestion, ...work.inQuestion],
    blueSignal: up === undefined ? null : { since: up.from, by: up.by },
    blueSignals,
    ...remarkFacts(standing.entries),
    lastHeardAt: kept.reduce<Instant | null>(
      (last, each) => Math.max(last ?? each.receivedAt, each.receivedAt),
      null,
    ),
  };
  return { ...facts, findings: findInEntries(facts, standing) };
}

const accountsOf = (standing: StandingEntries, kind: 'arrival' | 'departure' | 'briefing'): Account[] =>
  ofKind(standing.entries, kind)
    .map((entry) => accountOf(entry, standing.corrected.has(entry.id)))
    .sort(compareAccounts);

/** When and where the train came and went, by rank; what the desk last said about it. */
function movementFacts(planned: PlannedTurn, standing: StandingEntries) {
  const arrivals = accountsOf(standing, 'arrival');
  const departures = accountsOf(standing, 'departure');
  const arrival = arrivals[0] ?? null;
  const departure = departures[0] ?? null;
  const hold = latestObserved(ofKind(standing.entries, 'hold'));
  const questions: InQuestion[] = [
    { step: 'arrival', accounts: arrivals },
    { step: 'departure', accounts: departures },
  ];
  return {
    arrival,
    arrivalAt: arrival?.at ?? null,
    departure,
    departureAt: departure?.at ?? null,
    expectedArrivalAt: latestObserved(ofKind(standing.entries, 'expected-arrival'))?.expectedAt ?? null,
    heldUntil: hold?.until ?? null,
    holdReason: hold?.reason ?? null,
    track: latestObserved(ofKind(standing.entries, 'track'))?.track ?? planned.track,
    set: latestObserved(ofKind(standing.entries, 'set'))?.set ?? planned.set,
    inQuestion: questions.filter(({ accounts }) => isInQuestion(accounts)),
  };
}

/** What is recorded about each step of the turn. */
function stepFacts(steps: readonly PlanStep[], kept: readonly Entry[], standing: StandingEntries) {
  const accounts = new Map<string, Account[]>();
  for (const entry of ofKind(standing.entries, 'step-done')) {
    const account = accountOf(entry, standing.corrected.has(entry.id));
    accounts.set(entry.step, [...(accounts.get(entry.step) ?? []), account]);
  }
  const handbrakes = countHandbrakes(steps, accounts);
  const done: Record<string, Account> = {};
  const doneAt: Record<string, Instant> = {};
  const inQuestion: InQuestion[] = [];
  for (const step of steps) {
    const counted = countable(step, steps, accounts.get(step.key) ?? [], handbrakes).sort(compareAccounts);
    const counting = countingAccount(counted);
    if (counting === null) continue;
    done[step.key] = counting;
    doneAt[step.key] = counting.at;
    if (isInQuestion(counted)) inQuestion.push({ step: step.key, accounts: counted });
  }
  const recorded = new Set(ofKind(kept, 'step-done').map((entry) => entry.step));
  const withdrawn = steps.map((step) => step.key).filter((key) => recorded.has(key) && !accounts.has(key));
  return { done, doneAt, inQuestion, withdrawn, handbrakes, cannotDo: cannotDoFacts(standing.entries, done) };
}

/** The accounts that make a step done: for a release those by which the counts agree, for a set those of any brake. */
function countable(
  step: PlanStep,
  steps: readonly PlanStep[],
  accounts: readonly Account[],
  handbrakes: Handbrakes,
): Account[] {
  const roles = rolesOf(steps);
  if (roles.release.includes(step)) return completeReleases(accounts, handbrakes.set);
  if (roles.secure.includes(step)) return accounts.filter((account) => !setsNone(account));
  return [...accounts];
}

function cannotDoFacts(entries: readonly Entry[], done: Readonly<Record<string, Account>>): CannotDo[] {
  const said = ofKind(entries, 'cannot-do').filter((entry) => done[entry.step] === undefined);
  const steps = [...new Set(said.map((entry) => entry.step))].sort();
  return steps.flatMap((step) => {
    const latest = latestObserved(said.filter((entry) => entry.step === step));
    if (latest === null) return [];
    const by = latest.saidBy ?? latest.by?.name ?? null;
    return [{ step, entryId: latest.id, at: latest.observedAt, reason: latest.reason, by }];
  });
}

/** What people said besides. */
function remarkFacts(entries: readonly Entry[]) {
  const annulled = ofKind(entries, 'annulled').sort(compareEntries)[0];
  return {
    annulled:
      annulled === undefined
        ? null
        : {
            entryId: annulled.id,
            at: annulled.observedAt,
            reason: annulled.reason,
            by: annulled.by?.name ?? null,
          },
    briefings: ofKind(entries, 'briefing').map((entry) => accountOf(entry, false)),
    notes: ofKind(entries, 'note').map((entry) => ({
      entryId: entry.id,
      at: entry.observedAt,
      by: entry.by?.name ?? null,
      note: entry.note,
    })),
  };
}
