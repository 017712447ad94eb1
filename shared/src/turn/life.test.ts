import { describe, expect, it } from 'vitest';
import { forecastTurn } from '../forecast/forecast';
import { forecastInputOf } from '../forecast/forecast-input';
import { addSeconds, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { stepsFor } from '../plan/steps-for-turn';
import { aStepDone, aTurn, anEntry, fixedArrival, fixedDeparture } from '../testing/builders';
import type { Entry } from './entry';
import { turnFrom } from './evolve';
import type { TurnFacts } from './facts';
import { lifeOf, stepStateOf } from './life';
import { STEP_STATES, TURN_STATES, type PlannedTurn, type StepState, type TurnState } from './turn';

const at = (seconds: number): Instant => addSeconds(fixedArrival, seconds);
const leavingAt = addSeconds(fixedDeparture, 20);
const day = 86_400;

function factsOf(entries: readonly Entry[], planned: Partial<PlannedTurn> = {}): TurnFacts {
  const turn = aTurn(planned);
  return turnFrom(turn, stepsFor(defaultStepPlanSteps, turn), entries);
}

const story = [
  anEntry('arrival'),
  aStepDone('handbrake-set', 70),
  aStepDone('cab-brake-check', 130),
  aStepDone('ends-changed', 340),
  aStepDone('engineer-in-cab', 880),
  aStepDone('handbrake-released', 940),
  aStepDone('brakes-released', 1010),
  aStepDone('leaving-end-test', 1080),
  anEntry('departure', { observedAt: leavingAt }),
  aStepDone('running-test', 1400),
];
const without = (...steps: string[]): Entry[] =>
  story.filter((entry) => !('step' in entry && steps.includes(entry.step)));
const twoTimes = aStepDone('cab-brake-check', 300, { source: 'by-radio' });
const firstOut = { kind: 'first-out', inboundTrain: null, scheduledArrivalAt: null } as const;
const tieUp = { kind: 'tie-up', outboundTrain: null, scheduledDepartureAt: null } as const;

type Case = [name: string, state: TurnState, entries: Entry[], now: Instant, planned?: Partial<PlannedTurn>];

const cases: Case[] = [
  ['more than 30 min before its arrival', 'scheduled', [], at(-1801)],
  ['from 30 min before its arrival', 'inbound', [], at(-1800)],
  [
    'not yet when it is expected later',
    'scheduled',
    [anEntry('expected-arrival', { expectedAt: at(1), observedAt: at(-1900) })],
    at(-1800),
  ],
  ['with its arrival recorded', 'arrived', story.slice(0, 1), at(5)],
  ['with its handbrake set', 'secured', story.slice(0, 2), at(80)],
  ['with the cab brake checked besides', 'secured', story.slice(0, 3), at(140)],
  ['with its ends changed', 'ends-changed', story.slice(0, 4), at(350)],
  ['with the engineer in the leaving cab', 'crew-in-cab', story.slice(0, 5), at(900)],
  ['with the brakes released but not tested', 'crew-in-cab', story.slice(0, 7), at(1020)],
  ['with all that holds the departure', 'ready', story.slice(0, 8), at(1090)],
  ['with its departure recorded', 'departed', story.slice(0, 9), at(1230)],
  ['with its running test and something in question', 'tested', [...story, twoTimes], at(1410)],
  ['with its running test and nothing open', 'closed', story, at(1410)],
  ['a day after it left, whatever is open', 'closed', story.slice(0, 9), addSeconds(leavingAt, day)],
  ['a second before that', 'departed', story.slice(0, 9), addSeconds(leavingAt, day - 1)],
  ['a day after it was to leave and nobody said that it did', 'closed', [], addSeconds(fixedDeparture, day)],
  [
    'a day after it was to leave, but it is held for five minutes',
    'arrived',
    [story[0], anEntry('hold')].filter((e) => e !== undefined),
    addSeconds(fixedDeparture, day),
  ],
  ['annulled', 'annulled', [...story, anEntry('annulled')], at(1410)],
  ['without a handbrake record, whatever else is ticked', 'arrived', without('handbrake-set'), at(1410)],
  ['without its ends changed', 'secured', without('ends-changed'), at(1410)],
  ['without the test that holds the departure', 'crew-in-cab', without('leaving-end-test'), at(1410)],
  ['a first train out with nothing recorded', 'scheduled', [], at(1000), firstOut],
  ['a first train out with its engineer in the cab', 'crew-in-cab', story.slice(4, 5), at(1000), firstOut],
  ['a first train out with all recorded', 'ready', story.slice(4, 8), at(1100), firstOut],
  ['a first train out under way', 'departed', story.slice(4, 9), at(1250), firstOut],
  ['a first train out that was tested', 'closed', story.slice(4), at(1410), firstOut],
  ['a tie-up that came in', 'arrived', story.slice(0, 1), at(30), tieUp],
  [
    'a tie-up secured with two times in question',
    'secured',
    [...story.slice(0, 2), aStepDone('handbrake-set', 300, { source: 'by-radio' })],
    at(400),
    tieUp,
  ],
  ['a tie-up that is secured', 'closed', story.slice(0, 2), at(80), tieUp],
  ['a tie-up a day after it came in', 'closed', story.slice(0, 1), at(day), tieUp],
  ['a pair without steps that stands', 'arrived', story.slice(0, 1), at(30), { reverses: false }],
  [
    'a pair without steps that left',
    'closed',
    [anEntry('arrival'), anEntry('departure', { observedAt: leavingAt })],
    at(1230),
    { reverses: false },
  ],
];

describe('the life of a turn', () => {
  it.each(cases)('%s: %s', (_, state, entries, now, planned) => {
    expect(lifeOf(factsOf(entries, planned), now)).toBe(state);
  });

  it('reaches every word', () => {
    expect(new Set(cases.map(([, state]) => state))).toEqual(new Set(TURN_STATES));
  });

  it('goes on in one go when a missing record comes in late', () => {
    const late = aStepDone('handbrake-set', 70, { source: 'entered-later', receivedAt: at(9000) });
    expect(lifeOf(factsOf(without('handbrake-set')), at(9000))).toBe('arrived');
    expect(lifeOf(factsOf([...without('handbrake-set'), late]), at(9000))).toBe('closed');
  });
});

describe('the state of a step', () => {
  const stateAt = (
    key: string,
    entries: readonly Entry[],
    now: Instant,
    planned: Partial<PlannedTurn> = {},
  ): StepState => {
    const facts = factsOf(entries, planned);
    const index = facts.steps.findIndex((step) => step.key === key);
    const step = facts.steps[index];
    const times = forecastTurn(forecastInputOf(facts), now).steps[index];
    if (step === undefined || times === undefined) throw new Error(`no step ${key}`);
    return stepStateOf(facts, step, times, now);
  };
  const tick = aStepDone('handbrake-set', 70);
  const arrived = story.slice(0, 1);

  const states: [name: string, state: StepState, key: string, entries: Entry[], now: Instant][] = [
    ['not due before the train is in', 'not-due', 'handbrake-set', [], at(60)],
    ['due from the arrival on', 'due', 'handbrake-set', arrived, at(0)],
    ['due until its tolerance is over', 'due', 'handbrake-set', arrived, at(180)],
    ['overdue a minute after its due time', 'overdue', 'handbrake-set', arrived, at(180) + 1],
    ['not due while the one before it is open', 'not-due', 'cab-brake-check', arrived, at(100)],
    ['due as soon as the one before it is done', 'due', 'cab-brake-check', story.slice(0, 2), at(70)],
    ['due at its due time although the one before it is open', 'due', 'cab-brake-check', arrived, at(360)],
    ['not due before its not-before time', 'not-due', 'engineer-in-cab', story.slice(0, 4), at(839)],
    ['due from its not-before time on', 'due', 'engineer-in-cab', story.slice(0, 4), at(840)],
    ['done when it is recorded', 'done', 'handbrake-set', [...arrived, tick], at(9000)],
    [
      'in question when two accounts differ',
      'in-question',
      'cab-brake-check',
      [...story, twoTimes],
      at(1410),
    ],
    [
      'withdrawn when its record is taken back, also past its due time',
      'withdrawn',
      'handbrake-set',
      [...arrived, tick, anEntry('withdrawn', { target: tick.id })],
      at(9000),
    ],
    [
      'blocked when somebody said that it cannot be done',
      'blocked',
      'cab-brake-check',
      [...story.slice(0, 2), anEntry('cannot-do')],
      at(200),
    ],
    [
      'blocked by a blue signal when it is counted from the departure',
      'blocked',
      'engineer-in-cab',
      [...story.slice(0, 4), anEntry('blue-signal-up')],
      at(900),
    ],
    [
      'not blocked by a blue signal when it is counted from the arrival',
      'due',
      'cab-brake-check',
      [...story.slice(0, 2), anEntry('blue-signal-up')],
      at(200),
    ],
    [
      'not needed on an annulled turn',
      'not-needed',
      'handbrake-set',
      [...arrived, anEntry('annulled')],
      at(9000),
    ],
    [
      'not due after the departure before the train has left',
      'not-due',
      'running-test',
      story.slice(0, 8),
      at(9000),
    ],
    ['due after the departure once it has left', 'due', 'running-test', story.slice(0, 9), leavingAt],
    [
      'overdue after the departure, counted from when it left',
      'overdue',
      'running-test',
      story.slice(0, 9),
      addSeconds(leavingAt, 361),
    ],
    [
      'due after the departure until then',
      'due',
      'running-test',
      story.slice(0, 9),
      addSeconds(leavingAt, 360),
    ],
  ];

  it.each(states)('is %s: %s', (_, state, key, entries, now) => {
    expect(stateAt(key, entries, now)).toBe(state);
  });

  it('reaches every token', () => {
    expect(new Set(states.map(([, state]) => state))).toEqual(new Set(STEP_STATES));
  });
});
