import { addSeconds, secondsBetween, stepsFor, type Instant, type PlanStep } from '@stubpost/shared';
import { randomOf, type Random } from '../railroad/random';
import type { Act, SetDay, StoryTurn, TurnStory } from './act';
import { demoDay, hourAt, isRush, minutes, type DemoDay } from './demo-day';
import { afterwordsOf } from './afterwords';
import { playSteps } from './step-story';

/** Running time that a late train wins back on a trip. Our choice for the demo. */
const recoverySeconds = 80;
const incidentChance = { usual: 0.035, badWeek: 0.12 };

/** Seconds late of an arrival: what the set carried in, what the line added, and now and then an incident. */
function arrivalDelaySeconds(carriedSeconds: number, hour: number, day: DemoDay, random: Random): number {
  const line = 20 + 60 * random.normal() + (isRush(hour) ? 60 : 0);
  const incident = random.next() < (day.badWeek ? incidentChance.badWeek : incidentChance.usual);
  const extra = incident ? 240 + 480 * random.next() : 0;
  return Math.max(
    -45,
    carriedSeconds - recoverySeconds + line + extra,
    carriedSeconds > 300 ? carriedSeconds - 240 : -45,
  );
}

const byFeed = (observedAt: Instant, content: Act['content'], random: Random): Act => ({
  observedAt,
  toldAt: addSeconds(observedAt, 2 + 4 * random.next()),
  teller: 'feed',
  source: 'by-feed',
  content,
});

function openingActs(setDay: SetDay, turn: StoryTurn, index: number, shift: number): Act[] {
  const startsAt =
    (turn.scheduledArrivalAt ?? turn.scheduledDepartureAt ?? 0) - minutes(index === 0 ? 45 : 25);
  const desk = (content: Act['content'], seconds: number): Act => ({
    observedAt: addSeconds(startsAt, seconds),
    toldAt: addSeconds(startsAt, seconds),
    teller: content.kind === 'set' ? 'feed' : 'desk',
    source: content.kind === 'set' ? 'by-feed' : 'by-hand',
    content,
  });
  const crew = setDay.shifts[shift];
  const newCrew = index === 0 || shift !== shiftOf(setDay, index - 1);
  return [
    desk({ kind: 'set', set: setDay.set }, 0),
    ...(newCrew && crew
      ? [
          desk({ kind: 'crew', person: crew.conductor, as: 'conductor' as const }, 10),
          desk({ kind: 'crew', person: crew.engineer, as: 'engineer' as const }, 20),
        ]
      : []),
  ];
}

/** The second shift takes over half way through the set's turns. */
function shiftOf(setDay: SetDay, index: number): number {
  return index < setDay.turns.length / 2 ? 0 : 1;
}

/**
 * What a set and its crews do on one day, turn after turn: lateness is carried along, the terminal's work is
 * played by the plan's own durations. The same date and set give the same story.
 */
export function storyOfSetDay(
  setDay: SetDay,
  planSteps: readonly PlanStep[],
  dayStartsAt: Instant,
): TurnStory[] {
  const day = demoDay(setDay.turns[0]?.serviceDate ?? '');
  let carriedSeconds = 0;
  return setDay.turns.map((turn, index) => {
    const name = `${turn.serviceDate}|${turn.terminal}|${turn.inboundTrain}|${turn.outboundTrain}`;
    const random = randomOf(name);
    const shift = shiftOf(setDay, index);
    const crew = setDay.shifts[shift];
    if (!crew) throw new Error(`set ${setDay.set} has no crew for shift ${shift}`);
    const hour = hourAt(turn.scheduledArrivalAt ?? turn.scheduledDepartureAt ?? dayStartsAt, dayStartsAt);
    const acts = openingActs(setDay, turn, index, shift);
    const arrivedAt =
      turn.scheduledArrivalAt === null
        ? null
        : addSeconds(
            turn.scheduledArrivalAt,
            Math.round(arrivalDelaySeconds(carriedSeconds, hour, day, random)),
          );
    if (arrivedAt !== null && turn.scheduledArrivalAt !== null) {
      if (secondsBetween(turn.scheduledArrivalAt, arrivedAt) > 150) {
        const expectedAt = Math.round(arrivedAt / 60_000) * 60_000;
        acts.push(
          byFeed(turn.scheduledArrivalAt - minutes(9), { kind: 'expected-arrival', expectedAt }, random),
        );
      }
      acts.push(byFeed(arrivedAt, { kind: 'arrival' }, random));
    }
    const steps = stepsFor(planSteps, { kind: turn.kind, reverses: true });
    const work = playSteps({
      steps,
      turn,
      arrivedAt,
      day,
      hour,
      random,
      cars: setDay.cars,
      engineerName: crew.engineerName,
    });
    acts.push(...work.acts, ...afterwordsOf({ name, acts: work.acts, departedAt: work.departedAt }));
    if (work.departedAt !== null && turn.scheduledDepartureAt !== null) {
      acts.push(byFeed(work.departedAt, { kind: 'departure' }, random));
      carriedSeconds = Math.max(0, secondsBetween(turn.scheduledDepartureAt, work.departedAt));
    }
    acts.sort((a, b) => a.toldAt - b.toldAt);
    return { turnId: turn.id, crew: { conductor: crew.conductor, engineer: crew.engineer }, acts };
  });
}
