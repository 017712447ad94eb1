import type { Instant } from '../lib/instant';
import { arrivalEvent, departureEvent } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import { accountOf, type Account } from './account';
import { answersIn, openObjections, type Answer } from './answers';
import { approvalsIn } from './approvals';
import { followBlueSignals } from './blue-signals';
import { correctionsIn } from './corrections';
import { followCrew, type CrewOnTurn } from './crew';
import type { Entry } from './entry';
import { findInEntries } from './entry-findings';
import type { AsksAgreement, CannotDo, InQuestion, TurnFacts } from './facts';
import { completeReleases, countHandbrakes, setsNone, type Handbrakes } from './handbrakes';
import { defectsIn, tieUpIn } from './remarks';
import { weighAccounts, type Weighed } from './rulings';
import {
  compareEntries,
  keepEntries,
  latestObserved,
  ofKind,
  standingEntries,
  type EntryOf,
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
  const approvals = approvalsIn(kept);
  const standing = standingEntries(kept, approvals.idle);
  const said = { answers: answersIn(standing.entries), rulings: ofKind(standing.entries, 'ruled') };
  const movement = movementFacts(planned, standing, said);
  const work = stepFacts(steps, kept, standing, said);
  const blueSignals = followBlueSignals(standing.entries);
  const up = blueSignals.find((signal) => signal.until === null);
  const facts = {
    planned,
    steps,
    carriedOver,
    entries: kept,
    ...movement,
    ...followCrew(standing.entries, carriedOver, said.answers),
    ...work,
    inQuestion: [...movement.inQuestion, ...work.inQuestion],
    corrections: correctionsIn(kept, approvals),
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

/** What people say to the accounts of others: that they agree or not, and which one counts. */
interface Said {
  answers: readonly Answer[];
  rulings: readonly EntryOf<'ruled'>[];
}

const accountsOf = (standing: StandingEntries, kind: 'arrival' | 'departure'): Account[] =>
  ofKind(standing.entries, kind).map((entry) => accountOf(entry, standing.corrected.has(entry.id)));

/** Whether a thing is in question: its times differ, or somebody objects to one of `all` its accounts. */
function questionAbout(step: string, weighed: Weighed, all: readonly Account[], said: Said): InQuestion[] {
  const objections = openObjections(said.answers, all, weighed.ruling);
  const { timesDiffer } = weighed;
  if (!timesDiffer && objections.length === 0) return [];
  const accounts = weighed.accounts.length > 0 ? weighed.accounts : weighAccounts(all, said.rulings).accounts;
  return [{ step, accounts, timesDiffer, objections }];
}

/** When and where the train came and went, by rank or ruling; what the desk last said about it. */
function movementFacts(planned: PlannedTurn, standing: StandingEntries, said: Said) {
  const arrivals = weighAccounts(accountsOf(standing, 'arrival'), said.rulings);
  const departures = weighAccounts(accountsOf(standing, 'departure'), said.rulings);
  const arrival = arrivals.accounts[0] ?? null;
  const departure = departures.accounts[0] ?? null;
  const hold = latestObserved(ofKind(standing.entries, 'hold'));
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
    inQuestion: [
      ...questionAbout(arrivalEvent, arrivals, arrivals.accounts, said),
      ...questionAbout(departureEvent, departures, departures.accounts, said),
    ],
  };
}

/** What is recorded about each step of the turn. */
function stepFacts(
  steps: readonly PlanStep[],
  kept: readonly Entry[],
  standing: StandingEntries,
  said: Said,
) {
  const accounts = new Map<string, Account[]>();
  for (const entry of ofKind(standing.entries, 'step-done')) {
    const account = accountOf(entry, standing.corrected.has(entry.id));
    accounts.set(entry.step, [...(accounts.get(entry.step) ?? []), account]);
  }
  const tiedUp = tieUpIn(standing.entries);
  const handbrakes = countHandbrakes(steps, accounts, { rulings: said.rulings, tiedUp });
  const done: Record<string, Account> = {};
  const doneAt: Record<string, Instant> = {};
  const inQuestion: InQuestion[] = [];
  const asksAgreement: AsksAgreement[] = [];
  for (const step of steps) {
    const all = accounts.get(step.key) ?? [];
    const weighed = weighAccounts(countable(step, steps, all, handbrakes), said.rulings);
    const counting = weighed.accounts[0];
    if (counting !== undefined) {
      done[step.key] = counting;
      doneAt[step.key] = counting.at;
    }
    inQuestion.push(...questionAbout(step.key, weighed, all, said));
    asksAgreement.push(...unansweredIn(step.key, all, said));
  }
  const recorded = new Set(ofKind(kept, 'step-done').map((entry) => entry.step));
  const withdrawn = steps.map((step) => step.key).filter((key) => recorded.has(key) && !accounts.has(key));
  const cannotDo = cannotDoFacts(standing.entries, done);
  return { done, doneAt, inQuestion, asksAgreement, withdrawn, handbrakes, tiedUp, cannotDo };
}

/**
 * The accounts by radio that wait for the crew's word: nobody has answered them, no ruling knows them, and the crew
 * has not told of the step by hand, which is an answer too.
 */
function unansweredIn(step: string, all: readonly Account[], { answers, rulings }: Said): AsksAgreement[] {
  if (all.some((account) => account.source === 'by-hand')) return [];
  const known = new Set([
    ...answers.map((answer) => answer.target),
    ...rulings.flatMap((ruling) => [ruling.target, ...ruling.considered]),
  ]);
  return all
    .filter((account) => account.source === 'by-radio' && !known.has(account.entryId))
    .map((account) => ({ step, account }));
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
    defects: defectsIn(entries),
    briefings: ofKind(entries, 'briefing').map((entry) => accountOf(entry, false)),
    notes: ofKind(entries, 'note').map((entry) => ({
      entryId: entry.id,
      at: entry.observedAt,
      by: entry.by?.name ?? null,
      note: entry.note,
    })),
  };
}
