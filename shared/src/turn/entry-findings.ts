import { addSeconds, millisecondsInMinute, type Instant } from '../lib/instant';
import { arrivalEvent, departureEvent } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import { blueSignalAt } from './blue-signals';
import type { EntryFinding } from './entry-finding';
import type { InQuestion, TurnFacts } from './facts';
import { ofKind, type StandingEntries } from './standing-entries';

/** How far a claimed time may lie after its receipt before the clock is doubted. Our choice: a minute. */
const clockDoubtMilliseconds = millisecondsInMinute;

type Known = Omit<TurnFacts, 'findings'>;

/** Everything that is wrong with the entries of a turn, in the order of the plan; the same for every order of arrival. */
export function findInEntries(facts: Known, standing: StandingEntries): EntryFinding[] {
  return [
    ...facts.inQuestion.flatMap(findInQuestion),
    ...facts.steps.flatMap((step) => findInStep(facts, step)),
    ...findInHandbrakes(facts, standing),
    ...findInDeparture(facts),
    ...findInReliefs(facts),
    ...findInTieUp(facts),
    ...facts.corrections
      .filter((correction) => correction.state === 'waiting')
      .map((correction): EntryFinding => ({ code: 'entry.correction_waiting', correction })),
    ...findInWords(facts, standing),
  ];
}

function findInQuestion({ step, accounts, timesDiffer, objections }: InQuestion): EntryFinding[] {
  const times: EntryFinding[] = timesDiffer ? [{ code: 'entry.two_times', step, accounts }] : [];
  const objected = objections.flatMap((objection): EntryFinding[] => {
    const account = accounts.find((each) => each.entryId === objection.target);
    return account === undefined ? [] : [{ code: 'entry.objection', step, account, objection }];
  });
  return [...times, ...objected];
}

function findInStep(facts: Known, step: PlanStep): EntryFinding[] {
  const at = facts.doneAt[step.key];
  if (at === undefined) return [];
  const found = findOutOfOrder(facts, step, at);
  const { arrivalAt, departureAt } = facts;
  if (arrivalAt !== null && at < arrivalAt) {
    found.push({ code: 'entry.before_arrival', step: step.key, at, arrivalAt });
  }
  const notBefore = notBeforeOf(facts, step);
  if (notBefore !== null && at < notBefore) {
    found.push({ code: 'entry.too_early', step: step.key, at, notBefore });
  }
  const holds = rolesOf(facts.steps).hold.includes(step);
  if (holds && departureAt !== null && at > departureAt) {
    found.push({ code: 'entry.after_departure', step: step.key, at, departureAt });
  }
  const signal = step.anchor === 'departure' ? blueSignalAt(facts.blueSignals, at) : null;
  if (signal !== null) found.push({ code: 'entry.blue_signal_up', step: step.key, at, by: signal.by });
  return found;
}

function findOutOfOrder(facts: Known, step: PlanStep, at: Instant): EntryFinding[] {
  return step.after.flatMap((before): EntryFinding[] => {
    if (before === arrivalEvent && facts.arrivalAt !== null) return [];
    const beforeAt = before === departureEvent ? facts.departureAt : (facts.doneAt[before] ?? null);
    if (beforeAt !== null && beforeAt <= at) return [];
    return [{ code: 'entry.out_of_order', step: step.key, at, before, beforeAt }];
  });
}

function notBeforeOf(facts: Known, step: PlanStep): Instant | null {
  const scheduled = facts.planned.scheduledDepartureAt;
  if (step.notBeforeSeconds === null || scheduled === null) return null;
  return addSeconds(Math.max(scheduled, facts.heldUntil ?? scheduled), step.notBeforeSeconds);
}

function findInHandbrakes(facts: Known, standing: StandingEntries): EntryFinding[] {
  const { secure, release } = rolesOf(facts.steps);
  const recorded = ofKind(standing.entries, 'step-done');
  const none = secure
    .filter((step) => recorded.some((entry) => entry.step === step.key && entry.reading?.count === 0))
    .map((step): EntryFinding => ({ code: 'entry.no_handbrake', step: step.key }));
  const { set, released, carsStillSet } = facts.handbrakes;
  const step = release.find((each) => recorded.some((entry) => entry.step === each.key))?.key;
  if (step === undefined || set === null) return none;
  if (released === null) return [...none, { code: 'entry.no_count', step, set }];
  if (released > set) return [...none, { code: 'entry.larger_count', step, released, set }];
  if (released === set) return none;
  return [...none, { code: 'entry.smaller_count', step, released, set, cars: carsStillSet }];
}

function findInDeparture(facts: Known): EntryFinding[] {
  const { departureAt } = facts;
  if (departureAt === null) return [];
  const missing = rolesOf(facts.steps)
    .hold.filter((step) => facts.doneAt[step.key] === undefined)
    .map((step): EntryFinding => ({ code: 'entry.step_missing', step: step.key, departureAt }));
  const signal = blueSignalAt(facts.blueSignals, departureAt);
  if (signal === null) return missing;
  return [...missing, { code: 'entry.blue_signal_up', step: departureEvent, at: departureAt, by: signal.by }];
}

/** A new operator calls for a test unless the relief is face to face; who changes another job calls for none. */
function findInReliefs(facts: Known): EntryFinding[] {
  return facts.reliefs
    .filter((relief) => relief.as === 'engineer' && relief.out !== null && relief.in !== null)
    .filter((relief) => !relief.faceToFace)
    .map((relief): EntryFinding => ({ code: 'entry.not_face_to_face', relief }));
}

function findInTieUp({ tiedUp, steps, doneAt }: Known): EntryFinding[] {
  const open = rolesOf(steps)
    .secure.map((step) => step.key)
    .filter((key) => doneAt[key] === undefined);
  if (tiedUp === null || open.length === 0) return [];
  return [{ code: 'entry.tied_up_open', tieUp: tiedUp, steps: open }];
}

/** Entries whose own words do not fit: unknown steps and targets, times from a wrong clock. */
function findInWords(facts: Known, standing: StandingEntries): EntryFinding[] {
  const keys = new Set(facts.steps.map((step) => step.key));
  const ids = new Set(facts.entries.map((entry) => entry.id));
  return standing.entries.flatMap((entry): EntryFinding[] => {
    const found: EntryFinding[] = [];
    if ((entry.kind === 'step-done' || entry.kind === 'cannot-do') && !keys.has(entry.step)) {
      found.push({ code: 'entry.unknown_step', step: entry.step });
    }
    if ('target' in entry && !ids.has(entry.target)) {
      found.push({ code: 'entry.unknown_target', entryId: entry.id });
    }
    if (entry.observedAt > entry.receivedAt + clockDoubtMilliseconds) {
      const { observedAt: at, receivedAt } = entry;
      found.push({ code: 'entry.in_future', entryId: entry.id, at, receivedAt });
    }
    return found;
  });
}
