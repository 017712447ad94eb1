import { addSeconds, type Instant } from '../lib/instant';
import type { AlertState, Priority } from '../lateness/finding';
import {
  type DutyPerson,
  type DutyRoster,
  type EscalationStep,
  isQuiet,
  type MessageChannel,
  onDuty,
  type Rung,
  RUNGS,
} from './roster';

/** What about an alert decides who is told. */
export interface ToldAlert {
  priority: Priority;
  state: AlertState;
  raisedAt: Instant;
  /** When somebody took it; null while nobody has it. */
  takenAt: Instant | null;
}

/** Somebody who is to know of an alert by now. */
export interface Told {
  personId: string;
  channel: MessageChannel;
  /** As whom the person is told. */
  rung: Rung;
  /** The step that reached the person, in seconds of standing untaken. */
  afterSeconds: number;
}

/**
 * Everybody who is to have been told of an alert by `now`, each once by each way, in the order of the steps. The list
 * only grows while the alert stands untaken, so whoever runs late tells the rest, and nobody twice. An alert that is
 * taken, set aside, cleared or closed climbs no further: nobody new.
 *
 * A step tells those who have the duty at the moment it is due. Where a rung is empty the step goes on to the next
 * one at once. People in their quiet hours are passed over, save those on the desk; only when that leaves nobody at
 * all, and the alert is *Act now*, do quiet hours not count. Rules and seconds are our choice.
 */
export function whoIsTold(alert: ToldAlert, roster: DutyRoster, now: Instant): Told[] {
  if (alert.state !== 'raised' || alert.takenAt !== null) return [];
  const told = new Map<string, Told>();
  for (const step of stepsOf(roster, alert.priority)) {
    const dueAt = addSeconds(alert.raisedAt, step.afterSeconds);
    if (dueAt > now) break;
    const { rung, people } = answerersOf(step, roster, dueAt);
    const { afterSeconds } = step;
    const reached = people.flatMap(({ id: personId }) =>
      step.channels.map((channel) => ({ personId, channel, rung, afterSeconds })),
    );
    for (const each of reached) {
      const key = `${each.personId} ${each.channel}`;
      if (!told.has(key)) told.set(key, each);
    }
  }
  return [...told.values()];
}

function stepsOf({ steps }: DutyRoster, priority: Priority): EscalationStep[] {
  return steps
    .filter((step) => step.priority === priority)
    .sort((a, b) => a.afterSeconds - b.afterSeconds || RUNGS.indexOf(a.rung) - RUNGS.indexOf(b.rung));
}

function answerersOf(
  step: EscalationStep,
  roster: DutyRoster,
  at: Instant,
): { rung: Rung; people: DutyPerson[] } {
  const rungs = RUNGS.slice(RUNGS.indexOf(step.rung));
  const answering = rungs
    .map((rung) => ({ rung, people: peopleOn(rung, roster, at).filter(isAwake(rung, roster, at)) }))
    .find(({ people }) => people.length > 0);
  if (answering !== undefined) return answering;
  const asleep = rungs
    .map((rung) => ({ rung, people: peopleOn(rung, roster, at) }))
    .find(({ people }) => people.length > 0);
  return step.priority === 'act-now' && asleep !== undefined ? asleep : { rung: step.rung, people: [] };
}

function peopleOn(rung: Rung, { shifts, people }: DutyRoster, at: Instant): DutyPerson[] {
  if (rung === 'supervisor') return people.filter((person) => person.isSupervisor);
  const ids = onDuty(shifts, rung, at);
  return ids.flatMap((id) => people.find((person) => person.id === id) ?? []);
}

function isAwake(rung: Rung, { zone }: DutyRoster, at: Instant): (person: DutyPerson) => boolean {
  return (person) => rung === 'desk' || !isQuiet(person.quiet, zone, at);
}
