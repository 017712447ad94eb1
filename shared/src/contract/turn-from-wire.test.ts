import { describe, expect, it } from 'vitest';
import { forecastTurn } from '../forecast/forecast';
import { forecastInputOf } from '../forecast/forecast-input';
import { assess } from '../lateness/assess';
import { assessedTurnOf } from '../lateness/assessed-turn';
import { healthOf } from '../lateness/health';
import { addSeconds, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { stepsFor } from '../plan/steps-for-turn';
import { aStepDone, aTurn, anEntry, fixedArrival, fixedZone } from '../testing/builders';
import { aWireTurn } from '../testing/wire-turn';
import type { Entry } from '../turn/entry';
import { turnFrom } from '../turn/evolve';
import { stepStateOf } from '../turn/life';
import { holdTimesOf, latenessSettingsOf } from './lateness-settings';
import { shippedThresholds } from './shipped-thresholds';
import { assessedTurnOfWire, forecastInputOfWire, forecastOfWire, stepStatesOfWire } from './turn-from-wire';
import { turnSchema } from './turns';

const at = (seconds: number): Instant => addSeconds(fixedArrival, seconds);
const settings = latenessSettingsOf(shippedThresholds, fixedZone);

const story = [
  anEntry('crew'),
  anEntry('expected-arrival', { expectedAt: at(120), observedAt: at(-300) }),
  anEntry('arrival', { observedAt: at(130) }),
  aStepDone('handbrake-set', 215, { reading: { count: 2 } }),
  anEntry('cannot-do', { step: 'cab-brake-check', reason: 'no air', observedAt: at(260) }),
  aStepDone('cab-brake-check', 420),
  anEntry('hold', { until: at(1260), observedAt: at(500) }),
  aStepDone('ends-changed', 700),
  anEntry('blue-signal-up', { observedAt: at(750) }),
  anEntry('blue-signal-down', { observedAt: at(840) }),
  aStepDone('engineer-in-cab', 960),
  aStepDone('handbrake-released', 1010, { reading: { count: 1 } }),
  aStepDone('handbrake-released', 1050, { reading: { count: 1 } }),
  aStepDone('brakes-released', 1120),
  anEntry('departure', { observedAt: at(1270) }),
];
const stories: [name: string, entries: Entry[], kind: 'turn' | 'first-out' | 'tie-up'][] = [
  ['a turn with a bit of everything', story, 'turn'],
  [
    'a turn without a handbrake record',
    story.filter((entry) => !('step' in entry && entry.step.startsWith('handbrake'))),
    'turn',
  ],
  ['a turn of which nothing is heard', [], 'turn'],
  ['a first train out', story.slice(9), 'first-out'],
  ['a tie-up', story.slice(0, 4), 'tie-up'],
  ['an annulled turn', [...story.slice(0, 5), anEntry('annulled', { observedAt: at(300) })], 'turn'],
];

describe.each(stories)('%s, read from the wire', (_, entries, kind) => {
  const planned = aTurn({
    kind,
    ...(kind === 'first-out' ? { inboundTrain: null, scheduledArrivalAt: null } : {}),
    ...(kind === 'tie-up' ? { outboundTrain: null, scheduledDepartureAt: null } : {}),
  });
  const steps = stepsFor(defaultStepPlanSteps, planned);

  it('gives the browser the forecast, findings, health and step states of the server, at every moment', () => {
    for (let second = -1900; second <= 3000; second += 105) {
      const now = at(second);
      const facts = turnFrom(
        planned,
        steps,
        entries.filter((entry) => entry.receivedAt <= now),
      );
      const wire = aWireTurn(facts, now);
      const forecast = forecastTurn(forecastInputOf(facts), now);
      expect(forecastOfWire(wire, defaultStepPlanSteps, now)).toEqual(forecast);
      const ofServer = assessedTurnOf(facts, forecast, now);
      const ofBrowser = assessedTurnOfWire(wire, defaultStepPlanSteps, forecast);
      const causes = (turn: typeof ofServer) =>
        assess(turn, settings, now).map(({ cause, lines }) => [cause, lines]);
      expect(causes(ofBrowser)).toEqual(causes(ofServer));
      expect(healthOf(ofBrowser, settings, now)).toBe(healthOf(ofServer, settings, now));
      for (const [index, step] of steps.entries()) {
        const times = forecast.steps[index];
        if (times === undefined) throw new Error(`no forecast of ${step.key}`);
        const state = stepStatesOfWire(wire, defaultStepPlanSteps, forecast, now)[step.key];
        expect(state).toBe(stepStateOf(facts, step, times, now));
      }
    }
  });

  it('goes on with the clock between two words of the server', () => {
    const told = at(100);
    const facts = turnFrom(
      planned,
      steps,
      entries.filter((entry) => entry.receivedAt <= told),
    );
    const wire = aWireTurn(facts, told);
    for (let second = 100; second <= 2000; second += 50) {
      const forecast = forecastTurn(forecastInputOf(facts), at(second));
      expect(forecastOfWire(wire, defaultStepPlanSteps, at(second))).toEqual(forecast);
      const states = stepStatesOfWire(wire, defaultStepPlanSteps, forecast, at(second));
      for (const [index, step] of steps.entries()) {
        const times = forecast.steps[index];
        if (times !== undefined) expect(states[step.key]).toBe(stepStateOf(facts, step, times, at(second)));
      }
    }
  });

  it('is what the schema of the wire asks for', () => {
    const wire = aWireTurn(turnFrom(planned, steps, entries), at(1300));
    expect(turnSchema.parse(JSON.parse(JSON.stringify(wire)))).toEqual(JSON.parse(JSON.stringify(wire)));
  });
});

describe('a wire turn', () => {
  it('keeps the list of its steps from one second to the next, so that the plan is worked out once', () => {
    const wire = aWireTurn(turnFrom(aTurn(), defaultStepPlanSteps, story), at(1300));
    const input = forecastInputOfWire(wire, defaultStepPlanSteps);
    expect(forecastInputOfWire({ ...wire }, defaultStepPlanSteps).steps).toBe(input.steps);
  });
});

describe('the thresholds of a terminal', () => {
  it('become the settings of the rules, in seconds and in its zone', () => {
    const own = latenessSettingsOf({ runningTestMinutes: 15, noWordMinutes: 5 }, 'America/Denver');
    expect(own).toMatchObject({ runningTestSeconds: 900, noWordSeconds: 300, engineerAboardSeconds: null });
    expect(own.formatTime(fixedArrival)).toBe('15:00');
    expect(own.formatExactTime(fixedArrival)).toBe('15:00:00');
  });

  it('become the hold times of a late departure', () => {
    expect(holdTimesOf({ raiseHoldSeconds: 45, clearHoldSeconds: 20, clearSlackSeconds: 90 })).toEqual({
      raiseHoldSeconds: 45,
      clearHoldSeconds: 20,
      clearSlackSeconds: 90,
    });
  });
});
