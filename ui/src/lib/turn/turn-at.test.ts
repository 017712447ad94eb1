import {
  forecastInputOf,
  forecastTurn,
  formatInstant,
  healthOf,
  assessedTurnOf,
  stepsFor,
  turnFrom,
  type Entry,
} from '@stubpost/shared';
import { aTurn } from '@stubpost/shared/testing';
import { aWireTurn, clockAt, entryAt, fixedSettings, wirePlan } from '../../testing/wire-turn';
import { turnAt } from './turn-at';

const context = { plan: wirePlan, settings: fixedSettings };

const entries: Entry[] = [
  entryAt('arrival', '17:04:10'),
  entryAt('step-done', '17:05:30', { step: 'handbrake-set', reading: { count: 2 } }),
  entryAt('step-done', '17:07:05', { step: 'cab-brake-check', source: 'by-radio' }),
];

const moments = [
  '16:20:00',
  '16:59:59',
  '17:04:12',
  '17:05:00',
  '17:06:30',
  '17:09:41',
  '17:14:00',
  '17:19:59',
  '17:20:01',
  '17:31:07',
];

describe('a turn worked out in the browser', () => {
  it.each(moments)(
    'has the service’s slack, ready time, health and step states at %s, to the second',
    (clock) => {
      const now = clockAt(clock);
      const known = entries.filter((entry) => entry.receivedAt <= now);
      const facts = turnFrom(aTurn(), stepsFor(wirePlan.steps, aTurn()), known);
      const forecast = forecastTurn(forecastInputOf(facts), now);
      // The wire turn is as old as the last entry; only the clock went on since.
      const heardAt = Math.max(clockAt('16:00'), ...known.map((entry) => entry.receivedAt));
      const live = turnAt(aWireTurn({ entries: known, crew: [] }, heardAt), context, now);
      expect(live.slackSeconds).toBe(forecast.slackSeconds);
      expect(live.readyAt).toBe(forecast.readyAt);
      expect(live.expectedDepartureAt).toBe(forecast.expectedDepartureAt);
      expect(live.health).toBe(healthOf(assessedTurnOf(facts, forecast, now), fixedSettings, now));
      const fresh = aWireTurn({ entries: known, crew: [] }, now);
      expect(live.state).toBe(fresh.state);
      expect(live.steps.map((step) => step.state)).toEqual(fresh.steps.map((step) => step.state));
      expect(live.steps.map((step) => step.dueAt)).toEqual(
        fresh.steps.map((step) => Date.parse(step.dueAt ?? '')),
      );
    },
  );

  it('loses slack second by second while nothing is recorded', () => {
    const wire = aWireTurn({ entries: entries.slice(0, 1) }, clockAt('17:04:12'));
    const slack = (clock: string) => turnAt(wire, context, clockAt(clock)).slackSeconds ?? NaN;
    expect(slack('17:10:00') - slack('17:10:01')).toBe(1);
  });

  it('keeps the comb of due times at the timetable when the train is late', () => {
    const live = turnAt(aWireTurn({ entries }, clockAt('17:08:00')), context, clockAt('17:08:00'));
    const handbrake = live.steps[0];
    expect(handbrake?.plannedDueAt).toBe(clockAt('17:02'));
    expect(handbrake?.dueAt).toBe(clockAt('17:06:10'));
  });

  it('stands by the service’s figures until the plan is there', () => {
    const wire = aWireTurn({ entries }, clockAt('17:08:00'));
    const live = turnAt(wire, { ...context, plan: undefined }, clockAt('17:15:00'));
    expect(live.slackSeconds).toBe(wire.forecast.slackSeconds);
  });

  it('has nothing to spare once it left or was annulled', () => {
    const left = [...entries, entryAt('departure', '17:21:30')];
    expect(
      turnAt(aWireTurn({ entries: left }, clockAt('17:22')), context, clockAt('17:25')).slackSeconds,
    ).toBeNull();
    const annulled = [entryAt('annulled', '16:55')];
    const live = turnAt(aWireTurn({ entries: annulled }, clockAt('17:00')), context, clockAt('17:00'));
    expect([live.slackSeconds, live.state]).toEqual([null, 'annulled']);
    expect(live.annulled?.at).toBe(clockAt('16:55'));
    expect(formatInstant(live.annulled?.at ?? 0)).toBe('2026-03-03T21:55:00.000Z');
  });
});
