import { assertNever } from '../lib/assert-never';
import type { Instant } from '../lib/instant';
import { arrivalEvent, departureEvent } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import type { Account } from './account';
import type { ReliefFact } from './crew';
import type { EntrySource } from './entry';
import type { EntryFinding } from './entry-finding';
import type { TurnFacts } from './facts';

/** Writes an instant as a time of day with seconds, in the terminal's zone. */
export type FormatTime = (instant: Instant) => string;

/** How a fact is known, in the words of the screens. */
export const sourceWords: Readonly<Record<EntrySource, string>> = {
  'by-hand': 'by hand',
  'by-feed': 'by feed',
  'by-radio': 'by radio',
  'entered-later': 'entered later',
};

/**
 * A finding about entries in words: a fact, without blame. "1 of 2 handbrakes released. Car 1412 still set." Times
 * are written by `formatTime`.
 */
export function formatEntryFinding(
  finding: EntryFinding,
  steps: readonly PlanStep[],
  formatTime: FormatTime,
): string {
  const name = (key: string): string => nameOf(key, steps);
  switch (finding.code) {
    case 'entry.two_times':
      return `Two times for ${lowerFirst(name(finding.step))}: ${finding.accounts.map((account) => accountWords(account, formatTime)).join(', ')}. Which one?`;
    case 'entry.objection': {
      const { step, account, objection } = finding;
      const who = objection.by?.name ?? 'Somebody';
      return `${name(step)} ${accountWords(account, formatTime)}: ${who} does not agree: ${objection.reason ?? ''}. Which one?`;
    }
    case 'entry.out_of_order': {
      const { step, at, before, beforeAt } = finding;
      if (beforeAt === null)
        return `${name(step)} recorded at ${formatTime(at)}, ${lowerFirst(name(before))} not recorded.`;
      return `${name(step)} at ${formatTime(at)}, before ${lowerFirst(name(before))} at ${formatTime(beforeAt)}.`;
    }
    case 'entry.too_early':
      return `${name(finding.step)} at ${formatTime(finding.at)}, not before ${formatTime(finding.notBefore)} by the plan.`;
    case 'entry.before_arrival':
      return `${name(finding.step)} at ${formatTime(finding.at)}, before the arrival at ${formatTime(finding.arrivalAt)}.`;
    case 'entry.after_departure':
      return `${name(finding.step)} at ${formatTime(finding.at)}, after the train left at ${formatTime(finding.departureAt)}.`;
    case 'entry.step_missing':
      return `Left at ${formatTime(finding.departureAt)}, ${lowerFirst(name(finding.step))} not recorded.`;
    case 'entry.blue_signal_up':
      return `${name(finding.step)} at ${formatTime(finding.at)}, blue signal of ${finding.by} up.`;
    case 'entry.in_future':
      return `An entry claims ${formatTime(finding.at)} and came in at ${formatTime(finding.receivedAt)}. Check the clock of the device.`;
    case 'entry.not_face_to_face':
    case 'entry.correction_waiting':
    case 'entry.tied_up_open':
      return formatPersonFinding(finding, name, formatTime);
    default:
      return formatCountFinding(finding, name);
  }
}

type PersonFinding = Extract<
  EntryFinding,
  { code: 'entry.not_face_to_face' | 'entry.correction_waiting' | 'entry.tied_up_open' }
>;

function formatPersonFinding(
  finding: PersonFinding,
  name: (key: string) => string,
  formatTime: FormatTime,
): string {
  switch (finding.code) {
    case 'entry.not_face_to_face':
      return reliefWords(finding.relief, formatTime);
    case 'entry.correction_waiting': {
      const { kind, what, by, askedAt } = finding.correction;
      const change = kind === 'withdrawn' ? 'Withdrawal' : 'Correction';
      const who = by === null ? '' : ` by ${by.name}`;
      const known = name(what);
      const subject = known === what ? what.replaceAll('-', ' ') : lowerFirst(known);
      return `${change} of ${subject} asked for at ${formatTime(askedAt)}${who}. It waits for a supervisor.`;
    }
    case 'entry.tied_up_open': {
      const { tieUp, steps } = finding;
      const open = steps.map((step) => lowerFirst(name(step))).join(', ');
      const reason = tieUp.reason === null ? 'No reason given' : `Reason: ${tieUp.reason}`;
      return `Tied up at ${formatTime(tieUp.at)}, ${open} not recorded. ${reason}.`;
    }
    default:
      return assertNever(finding);
  }
}

/**
 * When an operator first takes charge, a Class II test is called for unless the relief is face to face.
 * Source: 49 CFR 238.317(a)(5), editions of 2004 and 2005; not confirmed by the railroad.
 */
const reliefRule =
  'An operator who first takes charge other than face to face: Class II brake test (49 CFR 238.317(a)(5), editions 2004 and 2005).';

function reliefWords(relief: ReliefFact, formatTime: FormatTime): string {
  const goes = relief.out?.name ?? 'Engineer';
  const comes = relief.in?.name ?? 'nobody';
  const missing = [relief.out, relief.in].find((person) => person?.personId === relief.awaits);
  const how =
    missing === undefined || missing === null
      ? 'not face to face'
      : `face to face by one account, ${missing.name} has not said so`;
  return `${goes} relieved by ${comes} at ${formatTime(relief.at)}, ${how}. ${reliefRule}`;
}

type CountFinding = Extract<
  EntryFinding,
  {
    code:
      | 'entry.smaller_count'
      | 'entry.larger_count'
      | 'entry.no_count'
      | 'entry.no_handbrake'
      | 'entry.unknown_step'
      | 'entry.unknown_target';
  }
>;

function formatCountFinding(finding: CountFinding, name: (key: string) => string): string {
  switch (finding.code) {
    case 'entry.smaller_count': {
      const { released, set, cars } = finding;
      const still =
        cars.length > 0 ? ` ${cars.length > 1 ? 'Cars' : 'Car'} ${cars.join(', ')} still set.` : '';
      return `${released} of ${set} handbrakes released.${still}`;
    }
    case 'entry.larger_count':
      return `${finding.released} handbrakes released, ${finding.set} set.`;
    case 'entry.no_count':
      return `${name(finding.step)} recorded without a count, ${finding.set} set.`;
    case 'entry.no_handbrake':
      return `${name(finding.step)} recorded with a count of 0. The step stays open.`;
    case 'entry.unknown_step':
      return `"${finding.step}" is recorded and is no step of this turn.`;
    case 'entry.unknown_target':
      return 'An entry speaks of another entry that is not on this turn.';
    default:
      return assertNever(finding);
  }
}

/**
 * What is open or doubtful about one step, in words, one a line: that it cannot be done and why, and every finding
 * about it. `step` is a key of the plan.
 */
export function stepRemarks(facts: TurnFacts, step: string, formatTime: FormatTime): string[] {
  const cannot = facts.cannotDo
    .filter((each) => each.step === step)
    .map((each) => `Cannot be done: ${each.reason}${each.by === null ? '' : ` (${each.by})`}`);
  const found = facts.findings
    .filter((finding) => 'step' in finding && finding.step === step)
    .map((finding) => formatEntryFinding(finding, facts.steps, formatTime));
  return [...cannot, ...found];
}

function accountWords(account: Account, formatTime: FormatTime): string {
  const who = account.saidBy ?? account.by?.name;
  return `${formatTime(account.at)} ${sourceWords[account.source]}${who === undefined ? '' : ` (${who})`}`;
}

function nameOf(key: string, steps: readonly PlanStep[]): string {
  if (key === arrivalEvent) return 'Arrival';
  if (key === departureEvent) return 'Departure';
  return steps.find((step) => step.key === key)?.shortLabel ?? key;
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
