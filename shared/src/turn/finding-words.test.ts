import { describe, expect, it } from 'vitest';
import { addSeconds } from '../lib/instant';
import { formatClock } from '../lib/zone-time';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aStepDone, aTurn, anEntry, fixedArrival, fixedDeparture, fixedZone } from '../testing/builders';
import type { Entry } from './entry';
import { turnFrom } from './evolve';
import { formatEntryFinding, stepRemarks } from './finding-words';

const exact = (instant: number): string => formatClock(instant, fixedZone, { seconds: true });
const at = (seconds: number): number => addSeconds(fixedArrival, seconds);

function wordsOf(...entries: Entry[]): string[] {
  const facts = turnFrom(aTurn(), defaultStepPlanSteps, entries);
  return facts.findings.map((finding) => formatEntryFinding(finding, facts.steps, exact));
}

const arrival = anEntry('arrival');
const set = aStepDone('handbrake-set', 70, { reading: { count: 2, cars: ['1408', '1412'] } });
const check = aStepDone('cab-brake-check', 130);

describe('findings about entries in words', () => {
  it.each<[words: string, entries: Entry[]]>([
    [
      'Two times for cab brake check: 17:02:10 by hand (M. Tolland), 17:05:00 by radio (desk). Which one?',
      [arrival, set, check, aStepDone('cab-brake-check', 300, { source: 'by-radio', saidBy: 'desk' })],
    ],
    [
      'Two times for arrival: 17:00:00 by feed, 17:02:00 by radio (R. Hallam). Which one?',
      [
        anEntry('arrival', { source: 'by-feed', by: null }),
        anEntry('arrival', {
          source: 'by-radio',
          observedAt: at(120),
          by: { personId: 'd', name: 'R. Hallam' },
        }),
      ],
    ],
    ['Cab brake check recorded at 17:02:10, handbrake set not recorded.', [arrival, check]],
    [
      'Cab brake check at 17:02:10, before handbrake set at 17:03:20.',
      [arrival, aStepDone('handbrake-set', 200), check],
    ],
    [
      'Handbrake set at 17:01:10, before the arrival at 17:02:00.',
      [anEntry('arrival', { observedAt: at(120) }), set],
    ],
    [
      'In leaving cab at 17:08:20, not before 17:14:00 by the plan.',
      [arrival, set, check, aStepDone('ends-changed', 340), aStepDone('engineer-in-cab', 500)],
    ],
    ['"lunch" is recorded and is no step of this turn.', [aStepDone('lunch', 0)]],
    [
      'Handbrake set recorded with a count of 0. The step stays open.',
      [arrival, aStepDone('handbrake-set', 70, { reading: { count: 0 } })],
    ],
    [
      'An entry speaks of another entry that is not on this turn.',
      [anEntry('withdrawn', { target: 'elsewhere' })],
    ],
    [
      'An entry claims 17:05:00 and came in at 17:00:00. Check the clock of the device.',
      [anEntry('note', { observedAt: at(300), receivedAt: at(0) })],
    ],
  ])('%s', (words, entries) => {
    expect(wordsOf(...entries)).toEqual([words]);
  });

  it.each<[words: string, entries: Entry[]]>([
    [
      '1 of 2 handbrakes released. Car 1412 still set.',
      [set, aStepDone('handbrake-released', 900, { reading: { count: 1, cars: ['1408'] } })],
    ],
    ['1 of 2 handbrakes released.', [set, aStepDone('handbrake-released', 900, { reading: { count: 1 } })]],
    ['3 handbrakes released, 2 set.', [set, aStepDone('handbrake-released', 900, { reading: { count: 3 } })]],
    ['Handbrake off recorded without a count, 2 set.', [set, aStepDone('handbrake-released', 900)]],
    [
      'Left at 17:20:00, leaving-end test not recorded.',
      [anEntry('departure', { observedAt: fixedDeparture })],
    ],
    [
      'Leaving-end test at 17:21:40, after the train left at 17:20:00.',
      [anEntry('departure', { observedAt: fixedDeparture }), aStepDone('leaving-end-test', 1300)],
    ],
    [
      'Departure at 17:20:00, blue signal of E. Abara up.',
      [
        anEntry('departure', { observedAt: fixedDeparture }),
        anEntry('blue-signal-up', { saidBy: 'E. Abara' }),
      ],
    ],
  ])('%s', (words, entries) => {
    expect(wordsOf(arrival, ...entries)).toContain(words);
  });
});

describe('the remarks on a step', () => {
  it('say why it cannot be done, and what is wrong with its records', () => {
    const facts = turnFrom(aTurn(), defaultStepPlanSteps, [
      arrival,
      anEntry('cannot-do', { step: 'cab-brake-check', reason: 'no air', observedAt: at(90) }),
      set,
      aStepDone('handbrake-released', 900, { reading: { count: 1 } }),
    ]);
    expect(stepRemarks(facts, 'cab-brake-check', exact)).toEqual(['Cannot be done: no air (M. Tolland)']);
    expect(stepRemarks(facts, 'handbrake-released', exact)).toEqual(['1 of 2 handbrakes released.']);
    expect(stepRemarks(facts, 'ends-changed', exact)).toEqual([]);
  });
});
