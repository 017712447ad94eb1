import {
  deriveTurns,
  openingsFor,
  readTimetable,
  shortestTurnSeconds,
  defaultStepPlanSteps,
} from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { demoTables } from '../testing/demo-tables';
import { demoTerminals } from './geography';
import { groupBy } from './group-by';
import { tripsOfDay } from './rotation';

const period = { from: '2026-01-01', to: '2026-12-31' };
const tuesday = '2026-03-03';

function timetable() {
  const outcome = readTimetable(demoTables(period));
  if (!outcome.ok) throw new Error(outcome.error.map((problem) => problem.message).join('; '));
  return outcome.value;
}

describe('the demo’s rotation', () => {
  it.each(['weekday', 'weekend'] as const)(
    'on a %s every set leaves from where, and on the track on which, it came in',
    (pattern) => {
      for (const chain of groupBy(tripsOfDay(pattern), (trip) => trip.block).values()) {
        const ordered = [...chain].sort((a, b) => a.departsMinute - b.departsMinute);
        ordered.slice(1).forEach((outbound, index) => {
          const inbound = ordered[index];
          expect(outbound.fromStation).toBe(inbound?.toStation);
          expect(outbound.fromTrack).toBe(inbound?.toTrack);
          expect(outbound.departsMinute).toBeGreaterThanOrEqual((inbound?.arrivesMinute ?? 0) + 10);
        });
      }
    },
  );

  it('is a feed that the importer reads without a single problem', () => {
    expect(timetable().problems).toEqual([]);
  });

  it('gives about 180 turns a weekday at three terminals, all of which go back the way they came', () => {
    const pairs = deriveTurns(timetable().timetable, tuesday);
    expect(pairs.length).toBeGreaterThan(150);
    expect(pairs.every((pair) => pair.reverses)).toBe(true);
    const openings = openingsFor(timetable().timetable, {
      serviceDate: tuesday,
      terminals: demoTerminals.map(({ code, name, stationId }) => ({ code, name, stationIds: [stationId] })),
      acceptGuesses: false,
    });
    expect(openings.length).toBeGreaterThan(170);
    expect(openings.length).toBeLessThan(225);
    expect(openings.filter((opening) => opening.kind === 'first-out').length).toBeGreaterThan(5);
    expect(openings.every((opening) => opening.track !== null)).toBe(true);
  });

  it('has one weak turn in the evening rush and none that is short by design', () => {
    const layovers = deriveTurns(timetable().timetable, tuesday).map((pair) => pair.layoverSeconds);
    expect(Math.min(...layovers)).toBe(600);
    expect(layovers.filter((seconds) => seconds === 600)).toHaveLength(1);
    expect(Math.min(...layovers)).toBeGreaterThan(shortestTurnSeconds(defaultStepPlanSteps));
  });

  it('never puts two sets on one track at the same time', () => {
    const stays = openingsFor(timetable().timetable, {
      serviceDate: tuesday,
      terminals: demoTerminals.map(({ code, name, stationId }) => ({ code, name, stationIds: [stationId] })),
      acceptGuesses: false,
    }).filter((opening) => opening.kind === 'turn');
    for (const track of groupBy(stays, (stay) => `${stay.terminal} ${stay.track}`).values()) {
      const ordered = [...track].sort((a, b) => (a.scheduledArrivalAt ?? 0) - (b.scheduledArrivalAt ?? 0));
      ordered.slice(1).forEach((stay, index) => {
        expect(stay.scheduledArrivalAt ?? 0).toBeGreaterThanOrEqual(
          ordered[index]?.scheduledDepartureAt ?? 0,
        );
      });
    }
  });
});
