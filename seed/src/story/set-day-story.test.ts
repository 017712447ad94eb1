import {
  defaultStepPlanSteps,
  measureOnTime,
  openingsFor,
  readTimetable,
  type Departure,
} from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { demoTerminals } from '../railroad/geography';
import { groupBy } from '../railroad/group-by';
import { demoTables } from '../testing/demo-tables';
import type { StoryTurn, TurnStory } from './act';
import { demoDay } from './demo-day';
import { storyOfSetDay } from './set-day-story';

const outcome = readTimetable(demoTables({ from: '2026-01-01', to: '2026-12-31' }));
if (!outcome.ok) throw new Error('the demo has no timetable');
const { timetable } = outcome.value;

function turnsOf(serviceDate: string): StoryTurn[] {
  const terminals = demoTerminals.map(({ code, name, stationId }) => ({
    code,
    name,
    stationIds: [stationId],
  }));
  return openingsFor(timetable, { serviceDate, terminals, acceptGuesses: false }).map((opening) => ({
    ...opening,
    id: `${serviceDate} ${opening.terminal} ${opening.pairKey}`,
  }));
}

function storiesOf(serviceDate: string): Array<{ turn: StoryTurn; story: TurnStory }> {
  const byBlock = groupBy(turnsOf(serviceDate), (turn) => turn.block);
  return [...byBlock.entries()].flatMap(([block, turns]) => {
    const shift = { conductor: 'c', engineer: 'e', engineerName: 'E. Name' };
    const stories = storyOfSetDay(
      { set: String(block), cars: ['1', '2', '3'], turns, shifts: [shift, { ...shift, conductor: 'd' }] },
      defaultStepPlanSteps,
      Date.parse(`${serviceDate}T05:00:00Z`),
    );
    return stories.map((story, index) => ({ turn: turns[index] as StoryTurn, story }));
  });
}

function departures(serviceDate: string): Departure[] {
  return storiesOf(serviceDate).flatMap(({ turn, story }) => {
    if (turn.scheduledDepartureAt === null) return [];
    const left = story.acts.find((act) => act.content.kind === 'departure');
    return [
      {
        serviceDate,
        train: turn.outboundTrain ?? '',
        scheduledDepartureAt: turn.scheduledDepartureAt,
        actualDepartureAt: left?.observedAt ?? null,
        annulled: false,
      },
    ];
  });
}

const rule = { thresholdSeconds: 59, inclusive: true, early: 'on-time', annulled: 'left-out' } as const;
const days = ['2026-03-02', '2026-03-03', '2026-03-04', '2026-03-05', '2026-03-06'];

describe('the story of a set’s day', () => {
  it('is the same whenever it is told', () => {
    expect(storiesOf('2026-03-03')).toEqual(storiesOf('2026-03-03'));
  });

  it('tells every act after it was done, and nothing before the set is named', () => {
    for (const { story } of storiesOf('2026-03-03')) {
      for (const act of story.acts) {
        if (act.content.kind === 'step-done' || act.content.kind === 'arrival')
          expect(act.toldAt).toBeGreaterThanOrEqual(act.observedAt);
      }
      expect(story.acts[0]?.content.kind).toBe('set');
    }
  });

  it('lets most trains leave on time, and some late', () => {
    const figures = measureOnTime(days.flatMap(departures), rule);
    expect(figures.share).toBeGreaterThan(0.82);
    expect(figures.share).toBeLessThan(0.97);
    expect(figures.noRecord).toBe(0);
  });

  it('never lets a train leave early', () => {
    for (const departure of departures('2026-03-03'))
      expect(departure.actualDepartureAt ?? 0).toBeGreaterThanOrEqual(departure.scheduledDepartureAt);
  });

  it('has a bad week that is clearly worse than others', () => {
    const weeks = Array.from(
      { length: 9 },
      (_, week) => new Date(Date.parse('2026-02-03') + week * 7 * 86_400_000),
    ).map((date) => date.toISOString().slice(0, 10));
    const bad = weeks.filter((date) => demoDay(date).badWeek);
    expect(bad).toHaveLength(1);
    const shareOf = (dates: string[]): number => measureOnTime(dates.flatMap(departures), rule).share ?? 0;
    expect(shareOf(bad)).toBeLessThan(shareOf(weeks.filter((date) => !demoDay(date).badWeek)));
  });

  it('forgets a running test now and then and hears some acts by radio', () => {
    const acts = days.flatMap((day) => storiesOf(day)).flatMap(({ story }) => story.acts);
    const tests = acts.filter(
      (act) => act.content.kind === 'step-done' && act.content.step === 'running-test',
    ).length;
    const left = acts.filter((act) => act.content.kind === 'departure').length;
    expect(tests).toBeLessThan(left);
    expect(tests).toBeGreaterThan(left * 0.93);
    const byRadio = acts.filter((act) => act.source === 'by-radio');
    expect(byRadio.length).toBeGreaterThan(50);
    expect(byRadio.every((act) => act.saidBy !== undefined)).toBe(true);
  });

  it('answers most of what the desk heard, and asks for a correction now and then after leaving', () => {
    const stories = days.flatMap((day) => storiesOf(day)).map(({ story }) => story.acts);
    const acts = stories.flat();
    const byRadio = acts.filter(
      (act) => act.source === 'by-radio' && act.content.kind === 'step-done',
    ).length;
    const agreed = acts.filter((act) => act.content.kind === 'agreed').length;
    expect(agreed).toBeLessThan(byRadio);
    expect(agreed).toBeGreaterThan(byRadio * 0.7);
    const asked = stories.flatMap((own) => {
      const left = own.find((act) => act.content.kind === 'departure');
      return own.filter((act) => act.content.kind === 'corrected').map((act) => ({ act, left }));
    });
    expect(asked.length).toBeGreaterThan(3);
    for (const { act, left } of asked) expect(act.observedAt).toBeGreaterThan(left?.observedAt ?? Infinity);
  });
});
