import { describe, expect, it } from 'vitest';
import { nextAlertStep, noAlertMemory } from './alert-life';
import type { Finding } from './finding';
import { addSeconds, millisecondsInSecond, secondsBetween, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import type { PlanStep } from '../plan/step-plan';
import { seededRandom } from '../testing/seeded-random';
import { forecastTurn } from '../forecast/forecast';

/*
 * The set-up: the train comes in on time. Each step of the default plan takes a triangular time (short, typical as
 * the mode, long) and begins when the one before it is finished, the engineer in the leaving cab not before D − 6 min.
 * Every step is recorded at the moment it is finished. The train leaves at D or with the last step. From the arrival
 * until it leaves the turn is looked at every 5 s, as the sweep does; an alert is raised by the shipped hold times.
 * Late: more than 59 s after D. Without need: alerted, and left at D. Missed: late, and never alerted.
 */
const sweepSeconds = 5;
const arrival: Instant = Date.UTC(2026, 2, 3, 22, 0, 0);
const work = defaultStepPlanSteps.filter((step) => step.holdsDeparture);
const finding: Finding = {
  cause: 'late-departure',
  priority: 'watch',
  text: 'short',
  action: 'act',
  actor: 'dispatcher',
  byWhen: null,
  lines: [],
};

interface Outcome {
  delaySeconds: number;
  alerts: number;
}

function triangular({ shortSeconds, typicalSeconds, longSeconds }: PlanStep, random: () => number): number {
  const share = random();
  const range = longSeconds - shortSeconds;
  const rise = (typicalSeconds - shortSeconds) / range;
  return share < rise
    ? shortSeconds + range * Math.sqrt(share * rise)
    : longSeconds - range * Math.sqrt((1 - share) * (1 - rise));
}

function workThrough(departure: Instant, random: () => number): [key: string, at: Instant][] {
  let at = arrival;
  return work.map((step) => {
    const start =
      step.notBeforeSeconds === null ? at : Math.max(at, addSeconds(departure, step.notBeforeSeconds));
    at = start + Math.round(triangular(step, random) * millisecondsInSecond);
    return [step.key, at];
  });
}

function playTurn(layoverSeconds: number, random: () => number): Outcome {
  const departure = addSeconds(arrival, layoverSeconds);
  const records = workThrough(departure, random);
  const leaves = Math.max(departure, records.at(-1)?.[1] ?? departure);
  const doneAt: Record<string, Instant> = {};
  let memory = noAlertMemory;
  let alerts = 0;
  for (let now = arrival; now < leaves; now = addSeconds(now, sweepSeconds)) {
    for (const [key, at] of records) if (at <= now) doneAt[key] = at;
    const { slackSeconds } = forecastTurn(
      {
        kind: 'turn',
        steps: defaultStepPlanSteps,
        scheduledArrivalAt: arrival,
        expectedArrivalAt: null,
        actualArrivalAt: arrival,
        scheduledDepartureAt: departure,
        heldUntil: null,
        actualDepartureAt: null,
        doneAt,
      },
      now,
    );
    const isShort = slackSeconds !== null && slackSeconds < 0;
    const step = nextAlertStep(memory, { finding: isShort ? finding : null, slackSeconds }, now);
    memory = step.memory;
    if (step.action === 'raise') alerts += 1;
  }
  return { delaySeconds: secondsBetween(departure, leaves), alerts };
}

function simulate(layoverSeconds: number, turns: number) {
  const random = seededRandom(layoverSeconds);
  const outcomes = Array.from({ length: turns }, () => playTurn(layoverSeconds, random));
  const share = (holds: (outcome: Outcome) => boolean): number => outcomes.filter(holds).length / turns;
  return {
    late: share(({ delaySeconds }) => delaySeconds > 59),
    alerted: share(({ alerts }) => alerts > 0),
    withoutNeed: share(({ delaySeconds, alerts }) => alerts > 0 && delaySeconds <= 0),
    missed: share(({ delaySeconds, alerts }) => alerts === 0 && delaySeconds > 59),
    twice: share(({ alerts }) => alerts > 1),
  };
}

describe('alerts on simulated turns of the default plan', () => {
  it('of 12 minutes: about 7 in 100 leave over 59 s late, about 20 are alerted, under 1 without need, none is missed', () => {
    const shares = simulate(720, 2000);
    expect(shares.late).toBeGreaterThan(0.055);
    expect(shares.late).toBeLessThan(0.085);
    expect(shares.alerted).toBeGreaterThan(0.17);
    expect(shares.alerted).toBeLessThan(0.23);
    expect(shares.withoutNeed).toBeLessThan(0.01);
    expect(shares.missed).toBe(0);
    expect(shares.twice).toBeLessThan(0.005);
  });

  it.each([900, 1200])('of %s s: practically none is alerted, and none is missed', (layoverSeconds) => {
    const shares = simulate(layoverSeconds, 800);
    expect(shares.alerted).toBeLessThan(0.005);
    expect(shares.missed).toBe(0);
  });
});
