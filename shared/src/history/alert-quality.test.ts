import { describe, expect, it } from 'vitest';
import { measureAlertQuality, type WatchedTurnSpan } from './alert-quality';
import { leftLate, measurePrecision, precisionVerdict, type PrecisionVerdict } from './alert-precision';
import { isStale, measureRepeaters, measureUntaken } from './alert-attention';
import { priorityMix, topSources } from './alert-sources';
import { measureWarning } from './alert-warning';
import { measureLoad } from './load-figures';
import type { PastAlert, PastDepartureOfTurn } from './past-alert';

const noon = Date.parse('2026-03-03T17:00:00Z');
const minute = (minutes: number): number => noon + minutes * 60_000;

const aDeparture = (parts: Partial<PastDepartureOfTurn> = {}): PastDepartureOfTurn => ({
  scheduledAt: minute(15),
  heldUntil: null,
  leftAt: minute(15),
  annulled: false,
  ...parts,
});

const anAlert = (parts: Partial<PastAlert> = {}): PastAlert => ({
  cause: 'late-departure',
  priority: 'watch',
  subjectId: 'turn-1',
  train: '1742',
  raisedAt: minute(0),
  takenAt: null,
  clearedAt: minute(10),
  departure: aDeparture(),
  ...parts,
});

const many = (count: number, parts: Partial<PastAlert> = {}): PastAlert[] =>
  Array.from({ length: count }, (_, index) => anAlert({ subjectId: `turn-${index}`, ...parts }));

describe('the verdict about an alert of a late departure', () => {
  it.each<[why: string, parts: Partial<PastAlert>, verdict: PrecisionVerdict]>([
    ['60 s late is late', { departure: aDeparture({ leftAt: minute(16) }) }, 'left-late'],
    ['59 s late is on time', { departure: aDeparture({ leftAt: minute(16) - 1000 }) }, 'needless'],
    [
      'late is late, whoever took it',
      { takenAt: minute(1), departure: aDeparture({ leftAt: minute(20) }) },
      'left-late',
    ],
    ['on time after somebody had taken it', { takenAt: minute(1) }, 'taken'],
    ['taken only after the train had left', { takenAt: minute(16) }, 'needless'],
    ['on time nobody knows why', {}, 'needless'],
    [
      'left with the end of its hold',
      { departure: aDeparture({ heldUntil: minute(25), leftAt: minute(25) }) },
      'held',
    ],
    [
      'later than its hold',
      { departure: aDeparture({ heldUntil: minute(25), leftAt: minute(27) }) },
      'left-late',
    ],
    [
      'a hold that was over before the schedule moves nothing',
      { departure: aDeparture({ heldUntil: minute(10) }) },
      'needless',
    ],
    ['an annulled train proves nothing', { departure: aDeparture({ annulled: true }) }, 'annulled'],
    ['nor does one that nobody saw leaving', { departure: aDeparture({ leftAt: null }) }, 'no-departure'],
    ['nor an alert about no departure', { departure: null }, 'no-departure'],
  ])('%s', (_why, parts, verdict) => {
    expect(precisionVerdict(anAlert(parts), 59)).toBe(verdict);
  });

  it('goes by the threshold of the terminal', () => {
    expect(leftLate(aDeparture({ leftAt: minute(17) }), 120)).toBe(false);
    expect(leftLate(aDeparture({ leftAt: minute(17) + 1 }), 120)).toBe(true);
  });
});

describe('precision', () => {
  it('lies between what is sure and what is possible, each with its n and interval', () => {
    const late = { departure: aDeparture({ leftAt: minute(20) }) };
    const figures = measurePrecision(
      [
        ...many(9, late),
        ...many(4, { takenAt: minute(2) }),
        ...many(1),
        ...many(3, { departure: aDeparture({ annulled: true }) }),
        ...many(5, { cause: 'running-test' }),
      ],
      59,
    );
    expect(figures.verdicts).toEqual({
      'left-late': 9,
      held: 0,
      taken: 4,
      needless: 1,
      annulled: 3,
      'no-departure': 0,
    });
    // Newcombe, Statistics in Medicine 17 (1998), table I, method 3, recomputed: 9 of 14.
    expect(figures.atLeast).toMatchObject({ count: 9, counted: 14 });
    expect(figures.atLeast.interval?.low).toBeCloseTo(0.3876, 4);
    expect(figures.atLeast.interval?.high).toBeCloseTo(0.8366, 4);
    expect(figures.atMost).toMatchObject({ count: 13, counted: 14 });
  });

  it('of nothing is nothing, not 0 %', () => {
    expect(measurePrecision([], 59).atLeast).toEqual({ count: 0, counted: 0, share: null, interval: null });
  });
});

describe('warning', () => {
  it('is the time from raising to the scheduled departure', () => {
    const raised = [-20, 5, 10, 14, 15, 16].map((at) => anAlert({ raisedAt: minute(at) }));
    expect(measureWarning([...raised, anAlert({ cause: 'no-word' }), anAlert({ departure: null })])).toEqual({
      counted: 6,
      // Minutes −1, 0, 1, 5, 10, 35: type 7 puts the half at 3 min and the tenth at −0.5 min.
      median: 180,
      nineInTen: -30,
      afterDeparture: 2,
      histogram: [2, 1, 1, 1, 0, 0, 1],
    });
  });
});

describe('load', () => {
  it('counts only periods with a turn on hand or an alert', () => {
    const load = measureLoad({
      alerts: [0, 0, 3, 0, 1, 0],
      turnsOnHand: [0, 1, 4, 4, 0, 2],
      bursts: [],
    });
    expect(load.all).toEqual({
      periods: 5,
      alerts: 4,
      histogram: [3, 1, 0, 1],
      mean: 0.8,
      median: 0,
      ninetyFifth: expect.closeTo(2.6, 12) as number,
      most: 3,
      shareInBurst: 0,
    });
    // Turns 0, 1, 2, 4, 4: the 75th percentile is 4.
    expect(load.peakFromTurns).toBe(4);
    expect(load.peak).toMatchObject({ periods: 2, histogram: [1, 0, 0, 1], median: 1.5, most: 3 });
  });

  it('says what share of the watched periods lies in a burst', () => {
    const load = measureLoad({
      alerts: [11, 6, 2, 0],
      turnsOnHand: [1, 1, 1, 1],
      bursts: [{ firstPeriod: 0, endPeriod: 2, alerts: 17, isOpen: false }],
    });
    expect(load.all.shareInBurst).toBe(0.5);
  });

  it('of a desk without trains is nothing, not calm', () => {
    const { all, peak, peakFromTurns } = measureLoad({ alerts: [0, 0], turnsOnHand: [0, 0], bursts: [] });
    expect([all.mean, all.median, all.shareInBurst, peak.periods, peakFromTurns]).toEqual([
      null,
      null,
      null,
      0,
      null,
    ]);
  });
});

describe('sources and priorities', () => {
  it('name the ten busiest by cause and train, whatever the day', () => {
    const trains = Array.from({ length: 12 }, (_, index) => String(100 + index));
    const alerts = [
      ...trains.map((train) => anAlert({ train })),
      ...many(5, { train: '103', raisedAt: minute(30) }),
      ...many(2, { train: '103', cause: 'no-word' }),
    ];
    const { sources, sourceCount, share } = topSources(alerts);
    expect(sources).toHaveLength(10);
    expect(sources[0]).toEqual({
      cause: 'late-departure',
      train: '103',
      count: 6,
      share: 6 / 19,
      lastRaisedAt: minute(30),
    });
    expect(sources[1]).toMatchObject({ cause: 'no-word', train: '103', count: 2 });
    expect([sourceCount, share]).toEqual([13, 16 / 19]);
  });

  it('hold the priorities against 5, 15 and 80 in 100', () => {
    const mix = priorityMix([...many(3), ...many(1, { priority: 'act-now' })]);
    expect(mix.map(({ priority, share, target }) => [priority, share, target])).toEqual([
      ['act-now', 0.25, 0.05],
      ['act-soon', 0, 0.15],
      ['watch', 0.75, 0.8],
    ]);
  });
});

describe('repeaters', () => {
  const times = (seconds: number[], parts: Partial<PastAlert> = {}): PastAlert[] =>
    seconds.map((at) =>
      anAlert({ raisedAt: noon + at * 1000, clearedAt: noon + (at + 10) * 1000, ...parts }),
    );

  it('chatter from three times within a minute on', () => {
    expect(measureRepeaters(times([60, 0, 30])).chattering).toBe(1);
    expect(measureRepeaters(times([0, 30, 61])).chattering).toBe(0);
    expect(measureRepeaters([...times([0, 30]), ...times([40], { cause: 'no-word' })]).chattering).toBe(0);
  });

  it('come back within 10 minutes of their clearing', () => {
    expect(measureRepeaters(times([0, 610])).cameBack).toBe(1);
    expect(measureRepeaters(times([0, 611])).cameBack).toBe(0);
    expect(measureRepeaters([...times([0]), ...times([20], { subjectId: 'other' })]).cameBack).toBe(0);
  });

  it('are fleeting when they are gone within a minute, untaken', () => {
    const gone = anAlert({ clearedAt: noon + 59_999 });
    expect(measureRepeaters([gone, { ...gone, takenAt: minute(0.5) }, anAlert()]).fleeting).toBe(1);
  });
});

describe('untaken and stale', () => {
  it('is what nobody took, by priority, and how long the others waited', () => {
    const untaken = measureUntaken([
      ...many(1, { priority: 'act-now' }),
      ...many(2, { takenAt: minute(2) }),
      ...many(1, { takenAt: minute(6) }),
    ]);
    expect(untaken).toMatchObject({ count: 1, counted: 4, share: 0.25 });
    expect(untaken.byPriority.map(({ priority, count, counted }) => [priority, count, counted])).toEqual([
      ['act-now', 1, 1],
      ['act-soon', 0, 0],
      ['watch', 0, 3],
    ]);
    expect(untaken.secondsToTake).toEqual({ counted: 3, median: 120, ninetyFifth: 336 });
  });

  it('stands too long after 24 h, also while it stands', () => {
    const day = 24 * 60;
    expect(isStale(anAlert({ clearedAt: minute(day) }), minute(9 * day))).toBe(false);
    expect(isStale(anAlert({ clearedAt: minute(day + 1) }), minute(9 * day))).toBe(true);
    expect(isStale(anAlert({ clearedAt: null }), minute(day + 1))).toBe(true);
  });
});

describe('the quality of a desk’s alerts', () => {
  const aTurn = (parts: Partial<WatchedTurnSpan> = {}): WatchedTurnSpan => ({
    span: { from: minute(0), to: minute(15) },
    departure: aDeparture(),
    firstAlertAt: null,
    ...parts,
  });
  const late = aDeparture({ leftAt: minute(20) });

  it('puts everything together from the same facts', () => {
    const quality = measureAlertQuality({
      alerts: [...many(11, { raisedAt: minute(1) }), ...many(6, { raisedAt: minute(11) })],
      turns: [
        aTurn(),
        aTurn({ departure: late, firstAlertAt: minute(3) }),
        aTurn({ departure: late }),
        aTurn({ departure: late, firstAlertAt: minute(21) }),
        aTurn({ departure: null, span: { from: minute(20), to: minute(40) } }),
      ],
      range: { from: noon, to: minute(60) },
      thresholdSeconds: 59,
      now: minute(60),
    });
    expect(quality).toMatchObject({ watchedTurns: 5, alerts: 17, stale: 0 });
    expect(quality.load.all).toMatchObject({ periods: 4, alerts: 17, most: 11, shareInBurst: 0.5 });
    expect(quality.bursts).toEqual([{ firstPeriod: 0, endPeriod: 2, alerts: 17, isOpen: false }]);
    expect(quality.warned).toMatchObject({ count: 1, counted: 3 });
  });
});
