import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatInstant } from '../lib/instant';
import { aFeed, tablesOf, type FeedParts, type FeedTrain } from '../testing/feed';
import { deriveTurns } from './derive-turns';
import { readTimetable } from './reading';
import { formatServiceTime } from './service-day';
import { shortestGuessSeconds } from './guess-pairs';
import { summarise } from './summarise';
import type { Timetable } from './timetable';

const monday = '2026-03-02';
const friday = '2026-03-06';

function timetableOf(parts: FeedParts): Timetable {
  const outcome = readTimetable(tablesOf(aFeed(parts)));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.error));
  return outcome.value.timetable;
}

const turnsOn = (parts: FeedParts, date = monday) => deriveTurns(timetableOf(parts), date);
const pairsOn = (parts: FeedParts, date = monday): string[] =>
  turnsOn(parts, date).map((turn) => `${turn.inboundTripId}>${turn.outboundTripId}`);

/** A train between two stops without calls on the way. */
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

describe('the example of blocks and service days in the GTFS reference', () => {
  // Source: GTFS Schedule reference, "Blocks and service day"; stops are ours, all trips of the block meet at one.
  const loop = (id: string, service: string, leaves: string, arrives: string): FeedTrain => ({
    id,
    service,
    block: 'red_loop',
    calls: [
      ['mill', leaves],
      ['mill', arrives],
    ],
  });
  const parts: FeedParts = {
    calendar: [
      ['mon-tues-wed-thurs-fri-sat-sun', '1111111', '20260101', '20261231'],
      ['fri-sat-sun', '0000111', '20260101', '20261231'],
      ['fri-sat', '0000110', '20260101', '20261231'],
      ['mon-tues-wed-thurs', '1111000', '20260101', '20261231'],
    ],
    trains: [
      loop('trip_1', 'mon-tues-wed-thurs-fri-sat-sun', '22:00:00', '22:55:00'),
      loop('trip_2', 'fri-sat-sun', '23:00:00', '23:55:00'),
      loop('trip_3', 'fri-sat', '24:00:00', '24:55:00'),
      loop('trip_4', 'mon-tues-wed-thurs', '20:00:00', '20:50:00'),
      loop('trip_5', 'mon-tues-wed-thurs', '21:00:00', '21:50:00'),
    ],
  };

  it.each([
    ['Monday', monday, ['trip_4>trip_5', 'trip_5>trip_1'], [600, 600]],
    ['Friday', friday, ['trip_1>trip_2', 'trip_2>trip_3'], [300, 300]],
    ['Saturday', '2026-03-07', ['trip_1>trip_2', 'trip_2>trip_3'], [300, 300]],
    ['Sunday', '2026-03-08', ['trip_1>trip_2'], [300]],
  ])('comes out for %s', (_, date, pairs, layovers) => {
    const turns = turnsOn(parts, date);
    expect(turns.map((turn) => `${turn.inboundTripId}>${turn.outboundTripId}`)).toEqual(pairs);
    expect(turns.map((turn) => turn.layoverSeconds)).toEqual(layovers);
  });

  it('keeps the night after Friday on Friday', () => {
    expect(turnsOn(parts, friday).map((turn) => formatInstant(turn.departureAt))).toEqual([
      '2026-03-07T04:00:00.000Z',
      '2026-03-07T05:00:00.000Z',
    ]);
  });
});

describe('a turn', () => {
  it('is made where the two platforms belong to one station', () => {
    const [turn] = turnsOn({
      trains: [
        train('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
        train('B', 'harbor-2 06:42:00', 'mill 07:00:00'),
      ],
    });
    expect(turn).toMatchObject({ stationId: 'harbor', layoverSeconds: 720, blockId: 'B', guessed: false });
  });

  it('is not made across two stations', () => {
    expect(
      pairsOn({
        trains: [
          train('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
          train('B', 'stonecrop 07:00:00', 'mill 07:30:00'),
        ],
      }),
    ).toEqual([]);
  });

  it('may have no layover at all', () => {
    const trains = [
      train('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
      train('B', 'harbor-1 06:30:00', 'mill 07:00:00'),
    ];
    expect(turnsOn({ trains })[0]?.layoverSeconds).toBe(0);
  });

  it('is left out and named when the second leaves before the first is in', () => {
    const trains = [
      train('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
      train('B', 'harbor-1 06:29:59', 'mill 07:00:00'),
    ];
    const timetable = timetableOf({ trains, calendar: [['WKD', '1111100', '20260302', '20260303']] });
    expect(deriveTurns(timetable, monday)).toEqual([]);
    expect(summarise(timetable, 520).problems).toEqual([
      {
        severity: 'left-out',
        file: 'trips.txt',
        line: 3,
        code: 'block.overlap',
        message: 'Block “B”: train B leaves before A is in, on 2 dates. No turn on those dates.',
      },
    ]);
  });

  it('joins only neighbours: by departure, then arrival, then trip id', () => {
    const trains = [
      train('Z', 'harbor-1 07:00:00', 'harbor-1 07:00:00'),
      train('Y', 'harbor-1 07:00:00', 'harbor-1 07:00:00'),
      train('X', 'harbor-1 07:00:00', 'mill 07:30:00'),
      train('W', 'mill 06:00:00', 'harbor-1 06:30:00'),
    ];
    expect(pairsOn({ trains })).toEqual(['W>Y', 'Y>Z', 'Z>X']);
  });

  it('knows no block of the same name on another service day', () => {
    const calendar = [
      ['SAT', '0000010', '20260101', '20261231'],
      ['SUN', '0000001', '20260101', '20261231'],
    ] as const;
    const trains = [
      train('A', 'mill 22:00:00', 'harbor-1 23:00:00', { service: 'SAT' }),
      train('B', 'harbor-1 23:30:00', 'mill 23:50:00', { service: 'SUN' }),
    ];
    expect(pairsOn({ calendar, trains }, '2026-03-07')).toEqual([]);
    expect(pairsOn({ calendar, trains }, '2026-03-08')).toEqual([]);
  });

  it.each([
    ['goes back over the same station', train('B', 'harbor-1 07:00:00', 'mill 07:30:00'), true],
    ['goes on to another one', train('B', 'harbor-1 07:00:00', 'stonecrop 07:30:00'), false],
    [
      'goes on in the other direction',
      train('B', 'harbor-1 07:00:00', 'stonecrop 07:30:00', { direction: '1' }),
      true,
    ],
    [
      'goes on in the same direction',
      train('B', 'harbor-1 07:00:00', 'stonecrop 07:30:00', { direction: '0' }),
      false,
    ],
  ])('tells whether the train %s', (_, second, reverses) => {
    const first = train('A', 'mill 06:00:00', 'harbor-1 06:30:00', { direction: '0' });
    expect(turnsOn({ trains: [first, second] })[0]?.reverses).toBe(reverses);
  });

  it.each([
    ['the spring night', '2026-03-07', '2026-03-08T06:30:00.000Z', '2026-03-08T07:10:00.000Z'],
    ['the autumn night', '2026-10-31', '2026-11-01T05:30:00.000Z', '2026-11-01T06:10:00.000Z'],
  ])('keeps its seconds over %s', (_, date, arrival, departure) => {
    const calendar = [['WKD', '1111111', '20260101', '20261231']] as const;
    const trains = [
      train('A', 'mill 24:50:00', 'harbor-1 25:30:00'),
      train('B', 'harbor-1 26:10:00', 'mill 26:50:00'),
    ];
    const [turn] = turnsOn({ calendar, trains }, date);
    expect(turn && [formatInstant(turn.arrivalAt), formatInstant(turn.departureAt)]).toEqual([
      arrival,
      departure,
    ]);
    expect(turn?.layoverSeconds).toBe(2400);
  });
});

describe('a link between trips', () => {
  const a = train('A', 'mill 06:00:00', 'harbor-1 06:30:00');
  const b = train('B', 'harbor-1 07:00:00', 'mill 07:30:00');
  const c = train('C', 'harbor-1 07:10:00', 'mill 07:40:00', { block: 'other' });

  it.each(['4', '5'])('of type %s wins over the block', (type) => {
    expect(pairsOn({ trains: [a, b, c], transfers: [['A', 'C', type]] })).toEqual(['A>C']);
  });

  it('of another type says nothing', () => {
    expect(pairsOn({ trains: [a, b, c], transfers: [['A', 'C', '0']] })).toEqual(['A>B']);
  });

  it('and a block that say the same make one turn', () => {
    expect(pairsOn({ trains: [a, b], transfers: [['A', 'B', '4']] })).toEqual(['A>B']);
  });

  it('splits a train in two', () => {
    expect(
      pairsOn({
        trains: [a, b, c],
        transfers: [
          ['A', 'B', '4'],
          ['A', 'C', '5'],
        ],
      }),
    ).toEqual(['A>B', 'A>C']);
  });

  it('couples two trains', () => {
    const d = train('D', 'stonecrop 06:00:00', 'harbor-2 06:40:00', { block: 'third' });
    expect(
      pairsOn({
        trains: [a, b, d],
        transfers: [
          ['A', 'B', '4'],
          ['D', 'B', '4'],
        ],
      }),
    ).toEqual(['A>B', 'D>B']);
  });

  it('takes the block pair of its second train away too', () => {
    const d = train('D', 'stonecrop 06:00:00', 'harbor-2 06:40:00', { block: 'third' });
    expect(pairsOn({ trains: [a, b, d], transfers: [['D', 'B', '4']] })).toEqual(['D>B']);
  });

  it('holds only on days on which both trains run', () => {
    const calendar = [
      ['WKD', '1111100', '20260101', '20261231'],
      ['MON', '1000000', '20260101', '20261231'],
    ] as const;
    const trains = [a, b, { ...c, service: 'MON' }];
    const parts = { calendar, trains, transfers: [['A', 'C', '4']] };
    expect(pairsOn(parts, monday)).toEqual(['A>C']);
    expect(pairsOn(parts, friday)).toEqual(['A>B']);
  });

  it('needs no block', () => {
    const [first, second] = [
      { ...a, block: '' },
      { ...c, block: '' },
    ];
    expect(turnsOn({ trains: [first, second], transfers: [['A', 'C', '4']] })).toMatchObject([
      { blockId: null, guessed: false },
    ]);
  });

  it('reaches the next service day when the second train leaves earlier in its day', () => {
    const late = train('L', 'mill 24:30:00', 'harbor-1 25:00:00', { block: 'late' });
    const early = train('E', 'harbor-1 05:00:00', 'mill 05:30:00', { block: 'early' });
    const parts = { trains: [late, early], transfers: [['L', 'E', '4']] };
    const [turn] = turnsOn(parts, monday);
    expect(turn && [turn.serviceDate, formatInstant(turn.departureAt)]).toEqual([
      monday,
      '2026-03-03T10:00:00.000Z',
    ]);
    expect(turn?.layoverSeconds).toBe(4 * 3600);
    // Saturday has no early train.
    expect(pairsOn(parts, friday)).toEqual([]);
  });

  it('over the spring night is an hour shorter', () => {
    const calendar = [['WKD', '1111111', '20260101', '20261231']] as const;
    const late = train('L', 'mill 22:30:00', 'harbor-1 23:00:00');
    const early = train('E', 'harbor-1 05:00:00', 'mill 05:30:00', { block: 'early' });
    const parts = { calendar, trains: [late, early], transfers: [['L', 'E', '4']] };
    expect(turnsOn(parts, '2026-03-06')[0]?.layoverSeconds).toBe(6 * 3600);
    expect(turnsOn(parts, '2026-03-07')[0]?.layoverSeconds).toBe(5 * 3600);
  });
});

describe('runs at a spacing', () => {
  const there = train('F', 'mill 08:00:00', 'harbor-1 08:20:00');
  const back = train('G', 'harbor-1 09:00:00', 'mill 09:20:00');

  it('are as many as fit before the end of the window', () => {
    const parts = { trains: [there, back], frequencies: [['F', '06:00:00', '07:00:00', '1800', '1']] };
    expect(timetableOf(parts).trips.map((trip) => formatServiceTime(trip.departureSeconds))).toEqual([
      '06:00:00',
      '06:30:00',
      '09:00:00',
    ]);
  });

  it('turn like other trains of their block', () => {
    const parts = {
      trains: [there, back],
      frequencies: [
        ['F', '06:00:00', '07:30:00', '3600', '1'],
        ['G', '06:30:00', '08:00:00', '3600', '1'],
      ],
    };
    expect(
      turnsOn(parts).map((turn) => [turn.inboundTrain, turn.outboundTrain, turn.layoverSeconds]),
    ).toEqual([
      ['F 06:00', 'G 06:30', 600],
      ['G 06:30', 'F 07:00', 600],
      ['F 07:00', 'G 07:30', 600],
    ]);
  });

  it('are refused when they are beyond all measure', () => {
    const outcome = readTimetable(
      tablesOf(aFeed({ trains: [there], frequencies: [['F', '00:00:00', '24:00:00', '1', '1']] })),
    );
    expect(outcome.ok ? [] : outcome.error.map((problem) => problem.code)).toEqual(['limit.runs']);
  });
});

describe('trains without a block', () => {
  const loose = (id: string, from: string, to: string): FeedTrain => train(id, from, to, { block: '' });

  it('give guesses, first in, first out', () => {
    const trains = [
      loose('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
      loose('B', 'mill 06:10:00', 'harbor-2 06:35:00'),
      loose('C', 'harbor-1 06:45:00', 'mill 07:00:00'),
      loose('D', 'harbor-1 06:50:00', 'mill 07:05:00'),
    ];
    const turns = turnsOn({ trains });
    expect(turns.map((turn) => [turn.inboundTripId, turn.outboundTripId, turn.guessed])).toEqual([
      ['A', 'C', true],
      ['B', 'D', true],
    ]);
  });

  it('are not guessed below the shortest layover', () => {
    const leaving = (seconds: number): string => formatServiceTime(6 * 3600 + 1800 + seconds);
    const guess = (seconds: number): string[] =>
      pairsOn({
        trains: [
          loose('A', 'mill 06:00:00', 'harbor-1 06:30:00'),
          loose('C', `harbor-1 ${leaving(seconds)}`, 'mill 08:00:00'),
        ],
      });
    expect(guess(shortestGuessSeconds)).toEqual(['A>C']);
    expect(guess(shortestGuessSeconds - 1)).toEqual([]);
  });
});

describe('for any timetable', () => {
  const stops = ['harbor-1', 'harbor-2', 'mill', 'stonecrop'];
  const anyTrain = fc.record({
    block: fc.constantFrom('', 'B1', 'B2', 'B3'),
    from: fc.constantFrom(...stops),
    to: fc.constantFrom(...stops),
    leaves: fc.integer({ min: 0, max: 27 * 3600 }),
    runs: fc.integer({ min: 0, max: 3 * 3600 }),
  });
  const anyTrains = fc
    .array(anyTrain, { minLength: 1, maxLength: 14 })
    .map((trains) =>
      trains.map(({ block, from, to, leaves, runs }, index) =>
        train(
          `T${index}`,
          `${from} ${formatServiceTime(leaves)}`,
          `${to} ${formatServiceTime(leaves + runs)}`,
          { block },
        ),
      ),
    );

  it('no train leaves before it is in, and none is in two turns on the same side', () => {
    fc.assert(
      fc.property(anyTrains, (trains) => {
        const turns = turnsOn({ trains });
        expect(turns.every((turn) => turn.layoverSeconds >= 0)).toBe(true);
        expect(new Set(turns.map((turn) => turn.inboundTripId)).size).toBe(turns.length);
        expect(new Set(turns.map((turn) => turn.outboundTripId)).size).toBe(turns.length);
      }),
      { seed: 61 },
    );
  });

  it('the order of rows does not matter', () => {
    const shuffled = anyTrains.chain((trains) =>
      fc.tuple(fc.constant(trains), fc.shuffledSubarray(trains, { minLength: trains.length })),
    );
    fc.assert(
      fc.property(shuffled, ([trains, others]) => {
        expect(turnsOn({ trains: others })).toEqual(turnsOn({ trains }));
      }),
      { seed: 62 },
    );
  });

  it('a service day that repeats gives the same turns, times shifted', () => {
    fc.assert(
      fc.property(anyTrains, (trains) => {
        const timetable = timetableOf({ trains });
        const layovers = (date: string): number[] =>
          deriveTurns(timetable, date).map((turn) => turn.layoverSeconds);
        expect(layovers('2026-03-09')).toEqual(layovers(monday));
      }),
      { seed: 63, numRuns: 40 },
    );
  });

  it('survives being kept as JSON', () => {
    fc.assert(
      fc.property(anyTrains, (trains) => {
        const timetable = timetableOf({ trains });
        const kept = JSON.parse(JSON.stringify(timetable)) as Timetable;
        expect(deriveTurns(kept, monday)).toEqual(deriveTurns(timetable, monday));
      }),
      { seed: 64, numRuns: 40 },
    );
  });
});
