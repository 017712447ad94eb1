import { describe, expect, it } from 'vitest';
import { addSeconds, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { stepsFor } from '../plan/steps-for-turn';
import { aStep } from '../testing/builders';
import { forecastTurn, outlookOf, type Forecast, type StepForecast } from './forecast';
import type { ForecastInput } from './forecast-input';

const arrival: Instant = Date.UTC(2026, 2, 3, 22, 0, 0);
const departure = addSeconds(arrival, 1200);
const afterArrival = (seconds: number): Instant => addSeconds(arrival, seconds);
const beforeDeparture = (seconds: number): Instant => addSeconds(departure, -seconds);

/** A turn of 20 minutes that came in on time, with the default plan; nothing is done. */
function anInput(overrides: Partial<ForecastInput> = {}): ForecastInput {
  return {
    kind: 'turn',
    steps: defaultStepPlanSteps,
    scheduledArrivalAt: arrival,
    expectedArrivalAt: null,
    actualArrivalAt: arrival,
    scheduledDepartureAt: departure,
    heldUntil: null,
    actualDepartureAt: null,
    doneAt: {},
    ...overrides,
  };
}

function stepOf(forecast: Forecast, key: string): StepForecast {
  const step = forecast.steps.find((each) => each.key === key);
  if (step === undefined) throw new Error(`no step ${key}`);
  return step;
}

/** The three steps after the arrival, done as fast as is typical. */
const endsChanged = {
  'handbrake-set': afterArrival(75),
  'cab-brake-check': afterArrival(135),
  'ends-changed': afterArrival(345),
};

describe('planned times', () => {
  it('are anchor plus offset: 2, 6 and 10 min after the arrival, 5, 4, 2 and 1 min before the departure, 5 min after it', () => {
    const forecast = forecastTurn(anInput(), arrival);
    expect(forecast.steps.map(({ key, dueAt }) => [key, dueAt])).toEqual([
      ['handbrake-set', afterArrival(120)],
      ['cab-brake-check', afterArrival(360)],
      ['ends-changed', afterArrival(600)],
      ['engineer-in-cab', beforeDeparture(300)],
      ['handbrake-released', beforeDeparture(240)],
      ['brakes-released', beforeDeparture(120)],
      ['leaving-end-test', beforeDeparture(60)],
      ['running-test', addSeconds(departure, 300)],
    ]);
  });

  it('give the latest finishes of the default plan: D, D−45, D−105, D−155, D−175, D−385, D−445 from the last to the first', () => {
    const forecast = forecastTurn(anInput(), arrival);
    expect(forecast.steps.map(({ key, latestFinishAt }) => [key, latestFinishAt])).toEqual([
      ['handbrake-set', beforeDeparture(445)],
      ['cab-brake-check', beforeDeparture(385)],
      ['ends-changed', beforeDeparture(175)],
      ['engineer-in-cab', beforeDeparture(155)],
      ['handbrake-released', beforeDeparture(105)],
      ['brakes-released', beforeDeparture(45)],
      ['leaving-end-test', departure],
      ['running-test', addSeconds(departure, 300)],
    ]);
  });

  it('do not move the departure for a late arrival: the squeeze is the picture', () => {
    const late = forecastTurn(anInput({ actualArrivalAt: afterArrival(600) }), afterArrival(600));
    expect(late.departureAnchorAt).toBe(departure);
    expect(stepOf(late, 'handbrake-set').dueAt).toBe(afterArrival(720));
    expect(stepOf(late, 'engineer-in-cab').dueAt).toBe(beforeDeparture(300));
  });

  it('move with a hold, which is the later of its time and the schedule', () => {
    const held = forecastTurn(anInput({ heldUntil: addSeconds(departure, 300) }), arrival);
    expect(held.departureAnchorAt).toBe(addSeconds(departure, 300));
    expect(stepOf(held, 'leaving-end-test').latestFinishAt).toBe(addSeconds(departure, 300));
    const heldEarly = forecastTurn(anInput({ heldUntil: beforeDeparture(300) }), arrival);
    expect(heldEarly.departureAnchorAt).toBe(departure);
  });

  it.each<[name: string, overrides: Partial<ForecastInput>, now: Instant, anchor: Instant]>([
    [
      'the actual arrival, also when it was early',
      { actualArrivalAt: afterArrival(-90) },
      arrival,
      afterArrival(-90),
    ],
    ['the schedule before the train is due', { actualArrivalAt: null }, afterArrival(-600), arrival],
    [
      'the expected arrival when that is later',
      { actualArrivalAt: null, expectedArrivalAt: afterArrival(240) },
      arrival,
      afterArrival(240),
    ],
    [
      'the schedule when the train is expected early',
      { actualArrivalAt: null, expectedArrivalAt: afterArrival(-240) },
      afterArrival(-600),
      arrival,
    ],
    [
      'now, when the train should be in and is not',
      { actualArrivalAt: null },
      afterArrival(70),
      afterArrival(70),
    ],
  ])('count from %s', (_, overrides, now, anchor) => {
    expect(forecastTurn(anInput(overrides), now).arrivalAnchorAt).toBe(anchor);
  });
});

describe('the forward pass', () => {
  const finishOf = (seconds: number): number =>
    (stepOf(forecastTurn(anInput(), afterArrival(seconds)), 'handbrake-set').finishAt - arrival) / 1000;

  it('lets a step that is not done take its typical time', () => {
    expect(finishOf(0)).toBe(75);
    expect(finishOf(75)).toBe(75);
  });

  it('gives a step past its typical time a third of what is left to its long time', () => {
    expect(finishOf(76)).toBeCloseTo(76 + (150 - 76) / 3, 3);
    expect(finishOf(120)).toBe(130);
    expect(finishOf(149)).toBeCloseTo(149 + 1 / 3, 3);
  });

  it('expects a step past its long time at any moment', () => {
    expect(finishOf(150)).toBe(150);
    expect(finishOf(4000)).toBe(4000);
  });

  it('takes the recorded time of a step that is done, however long it took', () => {
    const forecast = forecastTurn(
      anInput({ doneAt: { 'handbrake-set': afterArrival(300) } }),
      afterArrival(310),
    );
    expect(stepOf(forecast, 'handbrake-set').finishAt).toBe(afterArrival(300));
    expect(stepOf(forecast, 'cab-brake-check')).toMatchObject({
      startAt: afterArrival(300),
      finishAt: afterArrival(360),
    });
  });

  it('waits for the not-before time six minutes before the departure', () => {
    const forecast = forecastTurn(anInput({ doneAt: endsChanged }), afterArrival(400));
    expect(stepOf(forecast, 'engineer-in-cab')).toMatchObject({
      startAt: beforeDeparture(360),
      finishAt: beforeDeparture(340),
    });
    expect(forecast.readyAt).toBe(beforeDeparture(185));
    expect(forecast.expectedDepartureAt).toBe(departure);
  });

  it('expects the departure when the last step that holds it is finished, if that is after D', () => {
    const forecast = forecastTurn(anInput({ actualArrivalAt: afterArrival(800) }), afterArrival(800));
    expect(forecast.readyAt).toBe(afterArrival(1320));
    expect(forecast.expectedDepartureAt).toBe(afterArrival(1320));
  });

  it('does not wait for a step that does not hold the departure', () => {
    const steps = [
      aStep({ key: 'work' }),
      aStep({ key: 'sweep', typicalSeconds: 5000, longSeconds: 9000, holdsDeparture: false }),
    ];
    const forecast = forecastTurn(anInput({ steps }), arrival);
    expect(forecast.readyAt).toBe(afterArrival(60));
    expect(stepOf(forecast, 'sweep')).toMatchObject({
      latestFinishAt: afterArrival(120),
      finishAt: afterArrival(5000),
    });
    expect(forecast.criticalSteps).toEqual(['work']);
  });

  it('gives a step that holds nothing itself the latest finish of the step that waits for it', () => {
    const steps = [
      aStep({ key: 'before', holdsDeparture: false }),
      aStep({ key: 'work', after: ['before'] }),
    ];
    const forecast = forecastTurn(anInput({ steps }), arrival);
    expect(stepOf(forecast, 'before').latestFinishAt).toBe(beforeDeparture(60));
    expect(forecast.readyAt).toBe(afterArrival(120));
  });

  it('gives a step that waits for nothing the arrival to start from', () => {
    const steps = [aStep({ key: 'work', after: [] })];
    expect(forecastTurn(anInput({ steps }), arrival).steps[0]).toMatchObject({
      startAt: arrival,
      finishAt: afterArrival(60),
    });
  });

  it('starts a step of a first train out that waits for nothing so that it ends when it is due', () => {
    const steps = stepsFor([aStep({ key: 'work', anchor: 'departure', offsetSeconds: -300 })], {
      kind: 'first-out',
      reverses: null,
    });
    const forecast = forecastTurn(
      anInput({ kind: 'first-out', steps, actualArrivalAt: null }),
      beforeDeparture(3600),
    );
    expect(forecast.steps[0]).toMatchObject({
      startAt: beforeDeparture(360),
      finishAt: beforeDeparture(300),
    });
  });

  it('keeps the order of the plan also where the plan is not in the order of the work', () => {
    const steps = [aStep({ key: 'second', after: ['first'] }), aStep({ key: 'first' })];
    const forecast = forecastTurn(anInput({ steps }), arrival);
    expect(forecast.steps.map(({ key, finishAt }) => [key, finishAt])).toEqual([
      ['second', afterArrival(120)],
      ['first', afterArrival(60)],
    ]);
  });

  it('refuses steps that wait for one another: no such plan gets past its check', () => {
    const steps = [aStep({ key: 'a', after: ['b'] }), aStep({ key: 'b', after: ['a'] })];
    expect(() => forecastTurn(anInput({ steps }), arrival)).toThrow('wait for one another');
  });
});

describe('the slack of a turn', () => {
  const slackAt = (now: Instant, overrides: Partial<ForecastInput> = {}): number | null =>
    forecastTurn(anInput(overrides), now).slackSeconds;

  it('is 680 s for a turn of 20 min that has just come in: 1,200 less the shortest turn of 520', () => {
    expect(slackAt(arrival)).toBe(680);
  });

  it('does not run down while a step takes its typical time', () => {
    expect(slackAt(afterArrival(75))).toBe(680);
    expect(slackAt(afterArrival(76))).toBeLessThan(680);
  });

  it('is exactly 0 when the work just fits, and below it a millisecond later', () => {
    expect(slackAt(afterArrival(680), { actualArrivalAt: afterArrival(680) })).toBe(0);
    expect(slackAt(afterArrival(680), { actualArrivalAt: afterArrival(680) + 1 })).toBe(-1);
  });

  it('is exactly 60 and 59 on the two sides of tight', () => {
    expect(slackAt(afterArrival(620), { actualArrivalAt: afterArrival(620) })).toBe(60);
    expect(slackAt(afterArrival(620), { actualArrivalAt: afterArrival(620) + 1 })).toBe(59);
  });

  it('is cut downwards to whole seconds, so that a third of a second short is short', () => {
    const arrived = afterArrival(680) + 333;
    expect(slackAt(arrived, { actualArrivalAt: arrived })).toBe(-1);
  });

  it('counts a step that only waits for its not-before time as if it began now', () => {
    expect(slackAt(afterArrival(345), { doneAt: endsChanged })).toBe(1200 - 175 - 345);
    expect(slackAt(beforeDeparture(361), { doneAt: endsChanged })).toBe(361 - 175);
    expect(slackAt(beforeDeparture(360), { doneAt: endsChanged })).toBe(185);
    expect(slackAt(beforeDeparture(340), { doneAt: endsChanged })).toBe(185);
    expect(slackAt(beforeDeparture(270), { doneAt: endsChanged })).toBe(115);
  });

  it('runs on in a step that was left out although later ones are done: its own latest finish has passed', () => {
    const doneAt = { 'cab-brake-check': afterArrival(135), 'ends-changed': afterArrival(345) };
    const forecast = forecastTurn(anInput({ doneAt }), beforeDeparture(400));
    expect(forecast.slackSeconds).toBe(-45);
    expect(forecast.criticalSteps[0]).toBe('handbrake-set');
  });

  it('is what is left to the departure when no work is left', () => {
    const doneAt = Object.fromEntries(defaultStepPlanSteps.map(({ key }) => [key, beforeDeparture(90)]));
    const forecast = forecastTurn(anInput({ doneAt }), beforeDeparture(10));
    expect(forecast).toMatchObject({ slackSeconds: 90, criticalSteps: [], readyAt: beforeDeparture(90) });
  });

  it('is 300 s more when the train is held for 5 min', () => {
    expect(slackAt(arrival, { heldUntil: addSeconds(departure, 300) })).toBe(980);
  });

  it('belongs to the chain that has least of it', () => {
    const steps = [
      aStep({ key: 'quick', typicalSeconds: 30 }),
      aStep({ key: 'slow', typicalSeconds: 90 }),
      aStep({ key: 'side', typicalSeconds: 10, after: ['slow'] }),
      aStep({ key: 'last', typicalSeconds: 50, after: ['quick', 'slow'] }),
    ];
    const forecast = forecastTurn(anInput({ steps }), arrival);
    expect(forecast.slackSeconds).toBe(1200 - 140);
    expect(forecast.criticalSteps).toEqual(['slow', 'last']);
    expect(forecast.steps.map(({ key, slackSeconds }) => [key, slackSeconds])).toEqual([
      ['quick', 1200 - 50 - 30],
      ['slow', 1200 - 50 - 90],
      ['side', 1200 - 100],
      ['last', 1200 - 140],
    ]);
  });

  it('names the chain of the default plan from the next step to the departure', () => {
    expect(forecastTurn(anInput({ doneAt: endsChanged }), afterArrival(400)).criticalSteps).toEqual([
      'engineer-in-cab',
      'handbrake-released',
      'brakes-released',
      'leaving-end-test',
    ]);
  });
});

describe('a train that has left', () => {
  const doneAt = { ...endsChanged, 'engineer-in-cab': beforeDeparture(300) };
  const left = { doneAt, actualDepartureAt: addSeconds(departure, 20) };

  it('has no slack any more, and is expected to have left when it did', () => {
    const forecast = forecastTurn(anInput(left), addSeconds(departure, 25));
    expect(forecast).toMatchObject({
      slackSeconds: null,
      criticalSteps: [],
      expectedDepartureAt: addSeconds(departure, 20),
    });
  });

  it('leaves its open steps as they stood then, whatever the hour', () => {
    const soon = forecastTurn(anInput(left), addSeconds(departure, 20));
    const muchLater = forecastTurn(anInput(left), addSeconds(departure, 20_000));
    expect(muchLater.readyAt).toBe(soon.readyAt);
    expect(stepOf(muchLater, 'leaving-end-test')).toEqual(stepOf(soon, 'leaving-end-test'));
  });

  it('has its running test ahead, due 5 min after the departure by the plan', () => {
    const forecast = forecastTurn(anInput(left), addSeconds(departure, 25));
    expect(stepOf(forecast, 'running-test')).toMatchObject({
      startAt: addSeconds(departure, 20),
      dueAt: addSeconds(departure, 300),
      latestFinishAt: addSeconds(departure, 300),
    });
  });
});

describe('turns with one end', () => {
  it('a first train out has no arrival; its slack counts from the engineer in the cab', () => {
    const steps = stepsFor(defaultStepPlanSteps, { kind: 'first-out', reverses: null });
    const forecast = forecastTurn(
      anInput({ kind: 'first-out', steps, scheduledArrivalAt: null, actualArrivalAt: null }),
      beforeDeparture(3600),
    );
    expect(forecast).toMatchObject({
      arrivalAnchorAt: null,
      slackSeconds: 3600 - 175,
      readyAt: beforeDeparture(185),
    });
  });

  it('a tie-up has no departure, so nothing to spare and no time to be ready by', () => {
    const steps = stepsFor(defaultStepPlanSteps, { kind: 'tie-up', reverses: null });
    const forecast = forecastTurn(anInput({ kind: 'tie-up', steps, scheduledDepartureAt: null }), arrival);
    expect(forecast).toMatchObject({
      departureAnchorAt: null,
      readyAt: null,
      expectedDepartureAt: null,
      slackSeconds: null,
      criticalSteps: [],
    });
    expect(forecast.steps).toEqual([
      {
        key: 'handbrake-set',
        dueAt: afterArrival(120),
        startAt: arrival,
        finishAt: afterArrival(75),
        latestFinishAt: afterArrival(120),
        slackSeconds: 45,
      },
    ]);
  });

  it('a pair without steps is ready when it comes in', () => {
    const forecast = forecastTurn(
      anInput({ steps: [], actualArrivalAt: null, expectedArrivalAt: addSeconds(departure, 60) }),
      arrival,
    );
    expect(forecast).toMatchObject({ readyAt: addSeconds(departure, 60), slackSeconds: -60 });
  });
});

describe('the outlook', () => {
  it('is the forecast without its single steps', () => {
    const { steps, ...rest } = forecastTurn(anInput({ doneAt: endsChanged }), afterArrival(400));
    expect(steps).toHaveLength(8);
    expect(outlookOf(anInput({ doneAt: endsChanged }), afterArrival(400))).toEqual(rest);
  });

  it('of one turn leaves nothing behind in that of another, however many steps they have', () => {
    const chain = Array.from({ length: 40 }, (_, index) =>
      aStep({ key: `step-${index}`, after: index === 0 ? ['arrival'] : [`step-${index - 1}`] }),
    );
    const short = forecastTurn(anInput(), arrival);
    const long = forecastTurn(anInput({ steps: chain }), arrival);
    expect(long.readyAt).toBe(afterArrival(2400));
    expect(long.criticalSteps).toHaveLength(40);
    expect(forecastTurn(anInput(), arrival)).toEqual(short);
  });
});
