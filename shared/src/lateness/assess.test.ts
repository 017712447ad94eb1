import { describe, expect, it } from 'vitest';
import { forecastTurn } from '../forecast/forecast';
import { forecastInputOf } from '../forecast/forecast-input';
import { addSeconds, type Instant } from '../lib/instant';
import { formatClock } from '../lib/zone-time';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { stepsFor } from '../plan/steps-for-turn';
import { aStepDone, aTurn, anEntry, fixedArrival, fixedDeparture, fixedZone } from '../testing/builders';
import type { Entry } from '../turn/entry';
import { turnFrom } from '../turn/evolve';
import type { PlannedTurn } from '../turn/turn';
import { assess } from './assess';
import { assessedTurnOf, type AssessedContext, type AssessedTurn } from './assessed-turn';
import type { AlertCause, Finding } from './finding';
import { shippedLatenessSettings, type LatenessSettings } from './settings';

const at = (seconds: number): Instant => addSeconds(fixedArrival, seconds);
const settings: LatenessSettings = {
  ...shippedLatenessSettings,
  formatTime: (instant) => formatClock(instant, fixedZone),
  formatExactTime: (instant) => formatClock(instant, fixedZone, { seconds: true }),
};

interface Scene {
  entries?: readonly Entry[];
  planned?: Partial<PlannedTurn>;
  context?: AssessedContext;
}

function turnAt(now: Instant, { entries = [], planned = {}, context = {} }: Scene): AssessedTurn {
  const turn = aTurn(planned);
  const facts = turnFrom(turn, stepsFor(defaultStepPlanSteps, turn), entries);
  return assessedTurnOf(facts, forecastTurn(forecastInputOf(facts), now), now, context);
}

function findingsAt(now: Instant, scene: Scene = {}, rules: Partial<LatenessSettings> = {}): Finding[] {
  return assess(turnAt(now, scene), { ...settings, ...rules }, now);
}

const causesAt = (now: Instant, scene: Scene = {}, rules: Partial<LatenessSettings> = {}): AlertCause[] =>
  findingsAt(now, scene, rules).map((finding) => finding.cause);

function findingAt(now: Instant, cause: AlertCause, scene: Scene = {}): Finding {
  const finding = findingsAt(now, scene).find((each) => each.cause === cause);
  if (finding === undefined) throw new Error(`no finding ${cause}`);
  return finding;
}

const conductor = anEntry('crew', {
  as: 'conductor',
  person: { personId: 'c-1', name: 'M. Tolland' },
  observedAt: at(-600),
});
const engineer = anEntry('crew', {
  as: 'engineer',
  person: { personId: 'e-1', name: 'P. Varga' },
  observedAt: at(-600),
});
const arrival = anEntry('arrival');
const untilEndsChanged = [
  conductor,
  engineer,
  arrival,
  aStepDone('handbrake-set', 70, { reading: { count: 2, cars: ['1408', '1412'] } }),
  aStepDone('cab-brake-check', 130),
  aStepDone('ends-changed', 340),
];
const ready = [
  ...untilEndsChanged,
  aStepDone('engineer-in-cab', 880),
  aStepDone('handbrake-released', 940, { reading: { count: 2 } }),
  aStepDone('brakes-released', 1010),
  aStepDone('leaving-end-test', 1080),
];
const departure = anEntry('departure', { observedAt: at(1205) });
const without = (entries: readonly Entry[], ...steps: string[]): Entry[] =>
  entries.filter((entry) => !('step' in entry && steps.includes(entry.step)));

/** Late by so much that every step is: in at 17:15 for 17:20. */
const lateArrival = anEntry('arrival', { observedAt: at(900) });

describe('the horizon', () => {
  const lost = { entries: [anEntry('expected-arrival', { expectedAt: at(1700), observedAt: at(-4000) })] };

  it('begins 30 min before the arrival as scheduled or expected', () => {
    expect(causesAt(at(1700 - 1801), lost)).toEqual([]);
    expect(causesAt(at(1700 - 1800), lost)).toEqual(['late-departure']);
  });

  it('of a first train out begins 60 min before the departure', () => {
    const scene: Scene = {
      planned: { kind: 'first-out', scheduledArrivalAt: null },
      entries: [anEntry('blue-signal-up', { observedAt: at(-4000) })],
    };
    const rules = { blueSignalSeconds: 9999 };
    expect(causesAt(addSeconds(fixedDeparture, -3601), scene, rules)).toEqual([]);
    expect(causesAt(addSeconds(fixedDeparture, -3600), scene, rules)).toEqual(['blue-signal']);
  });

  it('ends when the turn is closed, a day after its departure', () => {
    const scene = { entries: [...without(ready, 'leaving-end-test'), departure] };
    expect(causesAt(at(1205 + 86_399), scene)).toContain('no-required-record');
    expect(causesAt(at(1205 + 86_400), scene)).toEqual([]);
  });

  it('is nowhere for annulled and practice turns', () => {
    const late = [lateArrival, anEntry('blue-signal-up', { observedAt: at(900) })];
    expect(causesAt(at(1000), { entries: late })).not.toEqual([]);
    expect(causesAt(at(1000), { entries: [...late, anEntry('annulled')] })).toEqual([]);
    expect(causesAt(at(1000), { entries: late, context: { practice: true } })).toEqual([]);
  });
});

describe('a late departure', () => {
  it('is none while there is time to spare, although a step is past its plan time', () => {
    expect(
      causesAt(at(500), { entries: [conductor, arrival, anEntry('note', { observedAt: at(400) })] }),
    ).toEqual([]);
  });

  it('is none at a slack of exactly 0 and one below it', () => {
    expect(causesAt(at(680), { entries: [anEntry('arrival', { observedAt: at(680) })] })).toEqual([]);
    expect(causesAt(at(681), { entries: [anEntry('arrival', { observedAt: at(681) })] })).toEqual([
      'late-departure',
    ]);
  });

  it('says what is wrong, by when, what to do and who acts', () => {
    const scene = { entries: [...without(untilEndsChanged, 'cab-brake-check', 'ends-changed')] };
    expect(findingAt(at(900), 'late-departure', scene)).toEqual({
      cause: 'late-departure',
      priority: 'watch',
      text: 'Cab brake check not recorded, latest 17:13; ready about 17:21, leaves 17:20, 1 min short',
      action:
        'Call engineer P. Varga. If it is done, record it by radio; if not, send help or arrange a later departure.',
      actor: 'dispatcher, engineer P. Varga',
      byWhen: addSeconds(fixedDeparture, -385),
      lines: [
        'Cab brake check: due 17:06, latest 17:13, about 17:15',
        'Ends changed: due 17:10, latest 17:17, about 17:18',
        'In leaving cab: due 17:15, latest 17:17, about 17:18',
        'Handbrake off: due 17:16, latest 17:18, about 17:19',
        'Air charged: due 17:18, latest 17:19, about 17:20',
        'Leaving-end test: due 17:19, latest 17:20, about 17:21',
      ],
    });
  });

  it('calls people by their role where no name is known', () => {
    const finding = findingAt(at(910), 'late-departure', { entries: [lateArrival] });
    expect(finding.action).toMatch(/^Call the conductor\./);
    expect(finding.actor).toBe('dispatcher, conductor');
  });

  it('is one finding with a line for each late step, however many they are', () => {
    const findings = findingsAt(at(910), { entries: [lateArrival] });
    expect(findings.map(({ cause }) => cause)).toEqual(['late-departure']);
    expect(findings[0]?.lines).toHaveLength(7);
  });

  it('of a train that is not in yet names the arrival', () => {
    const scene = {
      entries: [conductor, anEntry('expected-arrival', { expectedAt: at(900), observedAt: at(0) })],
    };
    const finding = findingAt(at(10), 'late-departure', scene);
    expect(finding.text).toBe('Not in yet, expected 17:15; ready about 17:23, leaves 17:20, 3 min short');
    expect(finding.action).not.toContain('record it by radio');
  });

  it('names why a step cannot be done', () => {
    const cannot = anEntry('cannot-do', { step: 'ends-changed', reason: 'no engineer', observedAt: at(400) });
    const scene = { entries: [...without(untilEndsChanged, 'ends-changed'), cannot] };
    expect(findingAt(at(1100), 'late-departure', scene).text).toContain('cannot be done (no engineer)');
  });

  it('asks to act soon when it is short by 6 min or more', () => {
    const arrivedAt = (seconds: number): Finding =>
      findingAt(at(seconds), 'late-departure', {
        entries: [anEntry('arrival', { observedAt: at(seconds) })],
      });
    expect(arrivedAt(680 + 359).priority).toBe('watch');
    expect(arrivedAt(680 + 360).priority).toBe('act-soon');
  });

  it('is none once the train has left', () => {
    const entries = [lateArrival, anEntry('departure', { observedAt: at(1500) })];
    expect(causesAt(at(1499), { entries: [lateArrival] })).toContain('late-departure');
    expect(causesAt(at(1500), { entries })).not.toContain('late-departure');
  });

  it('still stands when all is done after the departure time', () => {
    const entries = [...without(ready, 'leaving-end-test'), aStepDone('leaving-end-test', 1260)];
    const finding = findingAt(at(1300), 'late-departure', { entries });
    expect(finding.text).toBe('Ready late; ready about 17:21, leaves 17:20, 1 min short');
    expect(finding.lines).toEqual([]);
  });

  it('is counted against the hold while the train is held', () => {
    const entries = [lateArrival, anEntry('hold', { until: at(1600), observedAt: at(900) })];
    expect(causesAt(at(910), { entries })).toEqual([]);
  });
});

describe('a turn that is short by design', () => {
  const planned = { scheduledDepartureAt: at(480) };
  const arrivedAfter = (seconds: number): Scene => ({
    planned,
    entries: [anEntry('arrival', { observedAt: at(seconds) })],
  });

  it('raises nothing while it is no worse than its own schedule', () => {
    expect(turnAt(at(0), arrivedAfter(0)).forecast.slackSeconds).toBe(-40);
    expect(causesAt(at(0), arrivedAfter(0))).toEqual([]);
  });

  it('raises when it is', () => {
    expect(causesAt(at(1), arrivedAfter(1))).toEqual(['late-departure']);
  });
});

describe('an unsecured train', () => {
  const scene = { entries: without(untilEndsChanged, 'handbrake-set') };

  it('is raised at once, act now, with the gap in seconds', () => {
    expect(causesAt(at(339), scene)).not.toContain('unsecured');
    expect(findingAt(at(400), 'unsecured', scene)).toMatchObject({
      priority: 'act-now',
      text: 'No handbrake recorded and nobody at the brakes since 17:05:40',
      actor: 'dispatcher, conductor M. Tolland',
      lines: ['Gap so far: 60 s'],
    });
  });

  it('comes before everything else', () => {
    expect(causesAt(at(900), scene)[0]).toBe('unsecured');
  });

  it('is over with a handbrake, an engineer or a relief', () => {
    const ends = [
      aStepDone('handbrake-set', 395),
      aStepDone('engineer-in-cab', 395),
      anEntry('relief', {
        as: 'engineer',
        out: { personId: 'e-1', name: 'P. Varga' },
        in: { personId: 'e-2', name: 'K. Dahl' },
        observedAt: at(395),
      }),
    ];
    for (const end of ends)
      expect(causesAt(at(400), { entries: [...scene.entries, end] })).not.toContain('unsecured');
  });
});

describe('a missing required record', () => {
  it('is raised when the train left without a brake test or a securement step, one line for each', () => {
    const entries = [...without(ready, 'leaving-end-test', 'handbrake-set'), departure];
    expect(findingAt(at(1206), 'no-required-record', { entries })).toMatchObject({
      priority: 'act-now',
      text: 'Left at 17:20:05, not recorded: Handbrake set; Brake test from the leaving end',
      lines: ['Handbrake set: no record, due 17:02', 'Leaving-end test: no record, due 17:19'],
    });
  });

  it('is none for other steps that were left out', () => {
    expect(
      causesAt(at(1206), { entries: [...without(ready, 'ends-changed', 'brakes-released'), departure] }),
    ).toEqual([]);
  });

  it('is over when the record is entered later', () => {
    const later = aStepDone('leaving-end-test', 1090, { source: 'entered-later', receivedAt: at(2000) });
    const entries = [...without(ready, 'leaving-end-test'), departure];
    expect(causesAt(at(2000), { entries })).toEqual(['no-required-record']);
    expect(causesAt(at(2000), { entries: [...entries, later] })).toEqual([]);
  });

  it('stands before the departure while fewer handbrakes are released than set', () => {
    const half = aStepDone('handbrake-released', 940, { reading: { count: 1, cars: ['1408'] } });
    const entries = [...without(ready, 'handbrake-released'), half];
    expect(findingAt(at(1090), 'no-required-record', { entries })).toMatchObject({
      priority: 'act-now',
      text: '1 of 2 handbrakes released. Still set: car 1412.',
      action: 'Call conductor M. Tolland: release the rest, or correct the count.',
      byWhen: fixedDeparture,
    });
  });
});

describe('the running test', () => {
  const entries = [...ready, departure];

  it('is asked for 20 min after the departure', () => {
    expect(causesAt(at(1205 + 1199), { entries })).toEqual([]);
    expect(findingAt(at(1205 + 1200), 'running-test', { entries }).text).toBe(
      'Running brake test not recorded 20 min after it left at 17:20:05',
    );
  });

  it('is asked for at the next recorded stop when that is earlier', () => {
    const context = { nextStopAt: at(1205 + 420) };
    expect(causesAt(at(1205 + 419), { entries, context })).toEqual([]);
    expect(findingAt(at(1205 + 420), 'running-test', { entries, context }).text).toContain(
      'at its next stop',
    );
  });

  it('is never an alert before the train has left, and none once it is recorded', () => {
    expect(causesAt(at(9000), { entries: ready })).not.toContain('running-test');
    expect(causesAt(at(9000), { entries: [...entries, aStepDone('running-test', 1500)] })).toEqual([]);
  });
});

describe('a blue signal', () => {
  const up = anEntry('blue-signal-up', { by: { personId: 'i-1', name: 'E. Abara' }, observedAt: at(300) });

  it('is an alert from 10 min before the departure', () => {
    const entries = [...untilEndsChanged, up];
    expect(causesAt(at(599), { entries })).toEqual([]);
    expect(findingAt(at(600), 'blue-signal', { entries })).toMatchObject({
      priority: 'act-now',
      text: 'Blue signal up since 17:05:00 (E. Abara), leaves 17:20',
      actor: 'dispatcher, inspector E. Abara',
      byWhen: fixedDeparture,
    });
  });

  it('goes with the hold', () => {
    const hold = anEntry('hold', { until: at(1500), observedAt: at(400) });
    expect(causesAt(at(600), { entries: [...untilEndsChanged, up, hold] })).toEqual([]);
  });

  it('is one after the departure too, until it is down', () => {
    expect(findingAt(at(1300), 'blue-signal', { entries: [...ready, up, departure] }).text).toBe(
      'Left at 17:20:05 with the blue signal on record, up since 17:05:00 (E. Abara)',
    );
    const down = anEntry('blue-signal-down', {
      by: { personId: 'i-1', name: 'E. Abara' },
      observedAt: at(1250),
    });
    expect(causesAt(at(1300), { entries: [...ready, up, departure, down] })).toEqual([]);
  });
});

describe('no word', () => {
  it('begins 3 min after the arrival was due with nothing heard since', () => {
    const entries = [anEntry('note', { observedAt: at(-60), receivedAt: at(-60) })];
    expect(causesAt(at(179), { entries })).toEqual([]);
    expect(findingAt(at(180), 'no-word', { entries })).toMatchObject({
      priority: 'watch',
      text: 'Nothing heard since 16:59:00; arrival due 17:00',
    });
    expect(findingAt(at(180), 'no-word').text).toBe('Nothing heard yet; arrival due 17:00');
  });

  it('is over with any entry, and with an arrival expected later', () => {
    expect(causesAt(at(200), { entries: [anEntry('note', { receivedAt: at(190) })] })).toEqual([]);
    const expected = anEntry('expected-arrival', {
      expectedAt: at(300),
      observedAt: at(-60),
      receivedAt: at(-60),
    });
    expect(causesAt(at(200), { entries: [expected] })).toEqual([]);
  });

  it('begins 3 min after the next step was due', () => {
    expect(causesAt(at(299), { entries: [arrival] })).toEqual([]);
    expect(findingAt(at(300), 'no-word', { entries: [arrival] }).text).toBe(
      'Nothing heard since 17:00:02; handbrake set due 17:02',
    );
  });

  it('counts what was heard since, also about another step', () => {
    const entries = [arrival, aStepDone('cab-brake-check', 200)];
    expect(causesAt(at(700), { entries })).toEqual([]);
  });

  it('begins again when a later step falls silent', () => {
    const entries = without(untilEndsChanged, 'ends-changed');
    expect(causesAt(at(779), { entries })).toEqual([]);
    expect(findingAt(at(780), 'no-word', { entries }).text).toContain('ends changed due 17:10');
  });

  it('asks for the departure of a train that is ready, and for nothing once it has left', () => {
    expect(causesAt(at(1379), { entries: ready })).toEqual([]);
    expect(findingAt(at(1380), 'no-word', { entries: ready }).text).toContain('departure due 17:20');
    expect(causesAt(at(1380), { entries: [...ready, departure] })).toEqual([]);
  });
});

describe('the crew rule', () => {
  it('is off as shipped', () => {
    expect(causesAt(at(1000), { entries: untilEndsChanged })).toEqual([]);
  });

  it('asks for the engineer in the leaving cab by the time the terminal sets', () => {
    const rules = { engineerAboardSeconds: 300 };
    expect(causesAt(at(899), { entries: untilEndsChanged }, rules)).toEqual([]);
    expect(causesAt(at(900), { entries: untilEndsChanged }, rules)).toEqual(['crew']);
    expect(causesAt(at(900), { entries: ready }, rules)).toEqual([]);
  });
});

describe('a turn worked by the book', () => {
  it('never raises anything', () => {
    const story = [...ready, departure, aStepDone('running-test', 1400)];
    for (let second = -2400; second <= 3600; second += 20) {
      const known = story.filter((entry) => entry.receivedAt <= at(second));
      expect([second, causesAt(at(second), { entries: known })]).toEqual([second, []]);
    }
  });
});
