import { describe, expect, it } from 'vitest';
import { formatInstant } from '../lib/instant';
import { aFeed, tablesOf, type FeedParts, type FeedTrain } from '../testing/feed';
import { openingsFor, type OpeningsQuestion } from './openings';
import { readTimetable } from './reading';
import { terminalTracks } from './terminal-tracks';
import type { Timetable } from './timetable';

const monday = '2026-03-02';
const harbor = { code: 'HBR', name: 'Harbor Terminal', stationIds: ['harbor'] };

function timetableOf(parts: FeedParts = {}): Timetable {
  const outcome = readTimetable(tablesOf(aFeed(parts)));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.error));
  return outcome.value.timetable;
}

const openings = (parts: FeedParts = {}, question: Partial<OpeningsQuestion> = {}) =>
  openingsFor(timetableOf(parts), {
    serviceDate: monday,
    terminals: [harbor],
    acceptGuesses: false,
    ...question,
  });

const shape = (parts: FeedParts = {}, question: Partial<OpeningsQuestion> = {}): string[] =>
  openings(parts, question).map(
    ({ terminal, kind, pairKey, track }) => `${terminal} ${kind} ${pairKey} ${track ?? '-'}`,
  );

const train = (id: string, from: string, to: string, more: Partial<FeedTrain> = {}): FeedTrain => {
  const [start = '', leaves = ''] = from.split(' ');
  const [end = '', arrives = ''] = to.split(' ');
  return {
    id,
    block: 'B',
    calls: [
      [start, leaves],
      [end, arrives],
    ],
    ...more,
  };
};

describe('turns opened at a chosen terminal', () => {
  it('are its turns, its first departures and its last arrivals', () => {
    expect(shape()).toEqual(['HBR turn T1>T2 1', 'HBR tie-up T3> 2']);
    const stonecrop = { code: 'STC', name: 'Stonecrop', stationIds: ['stonecrop'] };
    expect(shape({}, { terminals: [stonecrop] })).toEqual(['STC first-out >T1 -', 'STC turn T2>T3 -']);
  });

  it('carry times, block and the hint whether the train goes back', () => {
    const [turn] = openings();
    expect(turn).toMatchObject({ inboundTrain: 'T1', outboundTrain: 'T2', block: 'B 1', reverses: true });
    expect(formatInstant(turn?.scheduledArrivalAt ?? 0)).toBe('2026-03-02T11:40:00.000Z');
    expect(formatInstant(turn?.scheduledDepartureAt ?? 0)).toBe('2026-03-02T12:00:00.000Z');
  });

  it('name a train by its number where it has one', () => {
    const trains = [
      train('x1', 'mill 06:00:00', 'harbor-1 06:30:00', { shortName: '1741' }),
      train('x2', 'harbor-1 07:00:00', 'mill 07:30:00'),
    ];
    expect(shape({ trains })).toEqual(['HBR turn 1741>x2 1']);
  });

  it('may pair at two stations that are one real place', () => {
    const stops = [
      ['upper', 'Harbor upper', '', 'U', '', '0'],
      ['lower', 'Harbor lower', '', 'L', '', '0'],
      ['mill', 'Mill Road', '', '', '', '0'],
    ];
    const trains = [
      train('A', 'mill 06:00:00', 'upper 06:30:00'),
      train('B', 'lower 07:00:00', 'mill 07:30:00'),
    ];
    const joined = { ...harbor, stationIds: ['upper', 'lower'] };
    expect(shape({ stops, trains }, { terminals: [joined] })).toEqual(['HBR turn A>B U']);
    const apart = [
      { ...harbor, stationIds: ['upper'] },
      { code: 'LOW', name: 'Lower', stationIds: ['lower'] },
    ];
    expect(shape({ stops, trains }, { terminals: apart })).toEqual(['HBR tie-up A> U', 'LOW first-out >B L']);
  });

  it('an empty run leaves a tie-up at one end and a first-out at the other', () => {
    const trains = [
      train('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
      train('B', 'stonecrop 08:00:00', 'harbor-1 08:30:00'),
      train('C', 'harbor-1 09:00:00', 'mill 09:30:00'),
    ];
    expect(shape({ trains })).toEqual(['HBR tie-up A> 1', 'HBR turn B>C 1']);
  });

  it('a train that stays over night is one turn, of the day it comes in', () => {
    const trains = [
      train('L', 'mill 24:30:00', 'harbor-1 25:00:00', { block: 'l' }),
      train('E', 'harbor-1 05:00:00', 'mill 05:30:00', { block: 'e' }),
    ];
    const parts = { trains, transfers: [['L', 'E', '4']] };
    expect(shape(parts)).toEqual(['HBR first-out >E 1', 'HBR turn L>E 1']);
    // Monday's first train has no Sunday to come from, Tuesday's comes from Monday.
    expect(shape(parts, { serviceDate: '2026-03-03' })).toEqual(['HBR turn L>E 1']);
    expect(shape(parts, { serviceDate: '2026-03-06' })).toEqual(['HBR tie-up L> 1']);
  });

  it('trains without a block are opened only when their guesses are accepted', () => {
    const trains = [
      train('A', 'mill 06:00:00', 'harbor-1 06:30:00', { block: '' }),
      train('B', 'harbor-1 07:00:00', 'mill 07:30:00', { block: '' }),
      train('C', 'mill 08:00:00', 'harbor-1 08:30:00', { block: '' }),
    ];
    expect(shape({ trains })).toEqual([]);
    expect(shape({ trains }, { acceptGuesses: true })).toEqual(['HBR turn A>B 1', 'HBR tie-up C> 1']);
  });

  it('trains of one name on one day are told apart', () => {
    const shuttle = (id: string, hour: string): FeedTrain[] => [
      train(`${id}a`, `mill ${hour}:00:00`, `harbor-1 ${hour}:10:00`, { shortName: 'Shuttle' }),
      train(`${id}b`, `harbor-1 ${hour}:30:00`, `mill ${hour}:40:00`, { shortName: 'Shuttle' }),
    ];
    expect(shape({ trains: [...shuttle('x', '06'), ...shuttle('y', '07')] })).toEqual([
      'HBR turn Shuttle>Shuttle 1',
      'HBR turn Shuttle>Shuttle 2 1',
    ]);
  });

  it('there are none on a day without service', () => {
    expect(shape({}, { serviceDate: '2026-03-07' })).toEqual([]);
  });
});

describe('the tracks of a terminal', () => {
  const call = (...ids: string[]): FeedTrain[] =>
    ids.map((id, index) => train(`T${index}`, 'mill 06:00:00', `${id} 06:30:00`, { block: '' }));
  const under = (id: string, platform = '', code = '', type = '0'): string[] => [
    id,
    'Harbor',
    'harbor',
    platform,
    code,
    type,
  ];
  const station = ['harbor', 'Harbor', '', '', '', '1'];
  const mill = ['mill', 'Mill Road', '', '', '', '0'];
  const labels = (stops: string[][], trains: FeedTrain[]): string[] =>
    terminalTracks(timetableOf({ stops: [station, mill, ...stops], trains }), ['harbor']).labels;

  it('are labelled by platform code, in the order of numbers', () => {
    expect(
      labels([under('p10', '10'), under('p2', '2'), under('p3a', '3A'), under('p3', '3')], call('p2')),
    ).toEqual(['2', '3', '3A', '10']);
  });

  it('else by stop code', () => {
    expect(labels([under('p1', '', 'N'), under('p2', '', 'S')], call('p1'))).toEqual(['N', 'S']);
  });

  it('else by a running number that no code has taken', () => {
    expect(labels([under('p9'), under('p1', '', '1'), under('p10')], call('p9'))).toEqual(['1', '2', '3']);
  });

  it('are not made of entrances, and not of bays that only buses use', () => {
    const stops = [under('p1', '1'), under('door', '', '', '2'), under('bay', 'A')];
    const bus: FeedTrain = {
      id: 'X',
      route: 'BUS',
      calls: [
        ['bay', '06:00:00'],
        ['mill', '07:00:00'],
      ],
    };
    expect(labels(stops, [...call('p1'), bus])).toEqual(['1']);
  });

  it('are none where the station has no platforms', () => {
    expect(terminalTracks(timetableOf(), ['stonecrop']).labels).toEqual([]);
  });

  it('hold the boarding areas of a platform', () => {
    const area = ['area', 'Harbor', 'p1', '', 'East', '4'];
    expect(labels([under('p1', '1'), area], call('area'))).toEqual(['1', 'East']);
  });

  it('have labels that fit the board', () => {
    expect(labels([under('p1', 'a very long platform code')], call('p1'))).toEqual(['a very long ']);
  });
});
