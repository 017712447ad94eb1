import { addSeconds, type EntrySource, type Instant, type PlanStep, type Reading } from '@stubpost/shared';
import type { Random } from '../railroad/random';
import type { Act, StoryTurn, Teller } from './act';
import { isRush, type DemoDay } from './demo-day';

/** What the play of one turn's steps needs to know. */
export interface StepScene {
  steps: readonly PlanStep[];
  turn: StoryTurn;
  arrivedAt: Instant | null;
  day: DemoDay;
  /** Hour of the service day. */
  hour: number;
  random: Random;
  cars: readonly string[];
  engineerName: string;
}

/** How often an act is told in another way than by the crew's own hand. Our choice for the demo. */
const tellingChances = { byRadio: 0.09, later: 0.015, notAtAll: 0.002, runningTestForgotten: 0.02 };
const coldMorningEndsAtHour = 9;
const coldAirFactor = 1.7;
/** Crowded platforms slow everything down. */
const rushFactor = 1.06;
/** Handbrakes that the demo's crews set on a standing train; an example, not a rule. */
const handbrakesSet = 2;

function readingOf(step: PlanStep, scene: StepScene): Reading | undefined {
  const reading: Reading = {};
  if (step.reads.includes('count')) reading.count = handbrakesSet;
  if (step.reads.includes('cars')) reading.cars = scene.cars.slice(-handbrakesSet);
  if (step.reads.includes('brakePipePsi')) {
    reading.brakePipePsi = step.kind === 'movement' ? 98 + Math.round(4 * scene.random.next()) : 110;
  }
  return Object.keys(reading).length > 0 ? reading : undefined;
}

interface Telling {
  teller: Teller;
  source: EntrySource;
  delaySeconds: number;
  saidBy?: string;
}

/** How the crew's act reaches the record, or null when nobody writes it down. */
function tellingOf(step: PlanStep, scene: StepScene): Telling | null {
  const draw = scene.random.next();
  const forgotten = step.holdsDeparture ? tellingChances.notAtAll : tellingChances.runningTestForgotten;
  if (draw < forgotten) return null;
  const byRadio = step.anchor === 'departure' && !step.holdsDeparture ? 0.5 : tellingChances.byRadio;
  if (draw < forgotten + tellingChances.later && !step.holdsDeparture) {
    return { teller: 'conductor', source: 'entered-later', delaySeconds: 600 + 300 * scene.random.next() };
  }
  if (draw < forgotten + tellingChances.later + byRadio) {
    return {
      teller: 'desk',
      source: 'by-radio',
      delaySeconds: 12 + 30 * scene.random.next(),
      saidBy: `Engineer ${scene.engineerName}`,
    };
  }
  return { teller: 'conductor', source: 'by-hand', delaySeconds: 1 + 5 * scene.random.next() };
}

function durationOf(step: PlanStep, scene: StepScene): number {
  const drawn =
    scene.random.threePoint(step.shortSeconds, step.typicalSeconds, step.longSeconds) *
    (isRush(scene.hour) ? rushFactor : 1);
  const cold = scene.day.coldMorning && scene.hour < coldMorningEndsAtHour && step.kind === 'air';
  return cold ? drawn * coldAirFactor : drawn;
}

/** When each step that holds the departure is finished, played in the plan's order of dependence. */
function finishes(scene: StepScene): Map<string, Instant> {
  const done = new Map<string, Instant>();
  const start = scene.arrivedAt ?? (scene.turn.scheduledDepartureAt ?? 0) - 20 * 60_000;
  const open = scene.steps.filter((step) => !step.after.includes('departure'));
  while (done.size < open.length) {
    const ready = open.filter(
      (step) => !done.has(step.key) && step.after.every((key) => key === 'arrival' || done.has(key)),
    );
    if (ready.length === 0) break;
    for (const step of ready) {
      const notBefore =
        step.notBeforeSeconds === null
          ? start
          : addSeconds(scene.turn.scheduledDepartureAt ?? start, step.notBeforeSeconds);
      const predecessors = step.after.map((key) => done.get(key) ?? start);
      const begins = Math.max(start, notBefore, ...predecessors) + 1000 * 10 * scene.random.next();
      done.set(step.key, addSeconds(begins, durationOf(step, scene)));
    }
  }
  return done;
}

function actOf(step: PlanStep, finishedAt: Instant, scene: StepScene): Act[] {
  const telling = tellingOf(step, scene);
  if (!telling) return [];
  const reading = readingOf(step, scene);
  const observedAt = Math.round(finishedAt / 1000) * 1000;
  return [
    {
      observedAt,
      toldAt: addSeconds(observedAt, telling.delaySeconds),
      teller: telling.teller,
      source: telling.source,
      ...(telling.saidBy === undefined ? {} : { saidBy: telling.saidBy }),
      content: { kind: 'step-done', step: step.key, ...(reading === undefined ? {} : { reading }) },
    },
  ];
}

/** The acts of a turn's work, and when the train left (null for a tie-up). */
export function playSteps(scene: StepScene): { acts: Act[]; departedAt: Instant | null } {
  const done = finishes(scene);
  const acts = scene.steps.flatMap((step) => {
    const finishedAt = done.get(step.key);
    return finishedAt === undefined ? [] : actOf(step, finishedAt, scene);
  });
  const scheduled = scene.turn.scheduledDepartureAt;
  if (scheduled === null) return { acts, departedAt: null };
  const readyAt = Math.max(scheduled, ...done.values());
  const departedAt = Math.round(addSeconds(readyAt, 3 + 22 * scene.random.next()) / 1000) * 1000;
  const after = scene.steps
    .filter((step) => step.after.includes('departure'))
    .flatMap((step) => actOf(step, addSeconds(departedAt, 150 + 120 * scene.random.next()), scene));
  return { acts: [...acts, ...after], departedAt };
}
