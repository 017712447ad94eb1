import { describe, expect, it } from 'vitest';
import { forecastTurn } from '../forecast/forecast';
import { forecastInputOf } from '../forecast/forecast-input';
import { addSeconds, type Instant } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { anEntry, aTurn, fixedArrival, fixedDeparture } from '../testing/builders';
import type { Entry } from '../turn/entry';
import { turnFrom } from '../turn/evolve';
import { HEALTHS, type Health } from '../turn/turn';
import { assessedTurnOf } from './assessed-turn';
import { healthOf } from './health';
import { shippedLatenessSettings } from './settings';

const at = (seconds: number): Instant => addSeconds(fixedArrival, seconds);
const settings = { ...shippedLatenessSettings, formatTime: String, formatExactTime: String };

function healthAt(now: Instant, entries: readonly Entry[]): Health {
  const facts = turnFrom(aTurn(), defaultStepPlanSteps, entries);
  return healthOf(assessedTurnOf(facts, forecastTurn(forecastInputOf(facts), now), now), settings, now);
}

const arrived = (seconds: number): Entry => anEntry('arrival', { observedAt: at(seconds) });
const left = anEntry('departure', { observedAt: addSeconds(fixedDeparture, 300) });

const cases: [name: string, health: Health, entries: Entry[], now: Instant][] = [
  ['slack of exactly 60 s', 'on-plan', [arrived(620)], at(620)],
  ['slack of 59 s', 'tight', [arrived(621)], at(621)],
  ['slack of exactly 0', 'tight', [arrived(680)], at(680)],
  ['slack of −1 s', 'short', [arrived(681)], at(681)],
  ['the very second of the departure', 'short', [arrived(1150)], fixedDeparture],
  ['a moment after the departure', 'late', [arrived(1150)], fixedDeparture + 1],
  [
    'a hold that is still on',
    'no-word',
    [arrived(0), anEntry('hold', { observedAt: at(10) })],
    addSeconds(fixedDeparture, 200),
  ],
  ['silence 3 min after a due time', 'no-word', [arrived(0)], at(300)],
  ['silence just before that', 'on-plan', [arrived(0)], at(299)],
  ['silence past the departure: late wins', 'late', [arrived(0)], addSeconds(fixedDeparture, 600)],
  ['a train that left late', 'on-plan', [arrived(0), left], addSeconds(fixedDeparture, 301)],
  ['an annulled turn', 'on-plan', [anEntry('annulled')], addSeconds(fixedDeparture, 600)],
  ['a turn that was never heard of, a day later', 'on-plan', [], addSeconds(fixedDeparture, 86_400)],
];

describe('the health of a turn', () => {
  it.each(cases)('with %s is %s', (_, health, entries, now) => {
    expect(healthAt(now, entries)).toBe(health);
  });

  it('takes every word', () => {
    expect(new Set(cases.map(([, health]) => health))).toEqual(new Set(HEALTHS));
  });
});
