import { describe, expect, test } from 'vitest';
import { addSeconds } from '../lib/instant';
import type { Priority } from '../lateness/finding';
import { type DutyRoster, isQuiet, onDuty, shippedEscalation } from './roster';
import { type ToldAlert, whoIsTold } from './who-is-told';

/** 17:20 in New York on 3 March 2026. */
const raisedAt = Date.parse('2026-03-03T22:20:00Z');
const zone = 'America/New_York';

const person = (id: string, fields: Partial<DutyRoster['people'][number]> = {}) => ({
  id,
  name: id,
  isSupervisor: false,
  quiet: null,
  ...fields,
});
const shift = (personId: string, as: 'desk' | 'deputy', fromSeconds = -3600, untilSeconds = 3600) => ({
  personId,
  as,
  from: addSeconds(raisedAt, fromSeconds),
  until: addSeconds(raisedAt, untilSeconds),
});
const roster = (fields: Partial<DutyRoster> = {}): DutyRoster => ({
  zone,
  people: [person('desk'), person('deputy'), person('boss', { isSupervisor: true })],
  shifts: [shift('desk', 'desk'), shift('deputy', 'deputy')],
  steps: shippedEscalation,
  ...fields,
});
const alert = (priority: Priority, fields: Partial<ToldAlert> = {}): ToldAlert => ({
  priority,
  state: 'raised',
  raisedAt,
  takenAt: null,
  ...fields,
});
const told = (priority: Priority, seconds: number, from = roster()) =>
  whoIsTold(alert(priority), from, addSeconds(raisedAt, seconds)).map(
    ({ personId, channel, afterSeconds }) => `${afterSeconds} ${personId} ${channel}`,
  );

describe('who is told of an alert that nobody takes', () => {
  test.each<[Priority, number, string[]]>([
    ['act-now', 0, ['0 desk e-mail', '0 desk sms']],
    ['act-now', 59, ['0 desk e-mail', '0 desk sms']],
    ['act-now', 60, ['0 desk e-mail', '0 desk sms', '60 deputy e-mail', '60 deputy sms']],
    ['act-soon', 179, ['0 desk e-mail']],
    ['act-soon', 180, ['0 desk e-mail', '180 deputy e-mail', '180 deputy sms']],
    ['watch', 299, []],
    ['watch', 300, ['300 desk e-mail']],
    ['watch', 86_400, ['300 desk e-mail']],
  ])('%s after %i s', (priority, seconds, expected) => {
    expect(told(priority, seconds)).toEqual(expected);
  });

  test('the list only grows, second by second', () => {
    let before: string[] = [];
    for (let seconds = 0; seconds <= 700; seconds += 1) {
      const now = told('act-now', seconds);
      expect(now.slice(0, before.length)).toEqual(before);
      before = now;
    }
    expect(before).toHaveLength(6);
  });

  test.each([
    ['taken', { state: 'taken', takenAt: raisedAt + 1 }],
    ['taken, then set aside', { state: 'set-aside', takenAt: raisedAt + 1 }],
    ['set aside', { state: 'set-aside' }],
    ['cleared', { state: 'cleared' }],
    ['closed', { state: 'closed' }],
  ] as [string, Partial<ToldAlert>][])('an alert that is %s climbs no further', (_title, fields) => {
    expect(whoIsTold(alert('act-now', fields), roster(), addSeconds(raisedAt, 900))).toEqual([]);
  });

  test('an empty rung passes on at once, and an empty roster tells nobody', () => {
    expect(told('act-now', 0, roster({ shifts: [shift('deputy', 'deputy')] }))).toEqual([
      '0 deputy e-mail',
      '0 deputy sms',
    ]);
    expect(told('act-now', 0, roster({ shifts: [] }))).toEqual(['0 boss e-mail', '0 boss sms']);
    expect(told('act-now', 900, roster({ shifts: [], people: [] }))).toEqual([]);
  });

  test('a step tells those who are on when it is due, not those of the raising', () => {
    const shifts = [shift('desk', 'desk'), shift('early', 'deputy', -3600, 60), shift('late', 'deputy', 60)];
    const people = [person('desk'), person('early'), person('late')];
    expect(told('act-now', 60, roster({ shifts, people })).slice(2)).toEqual([
      '60 late e-mail',
      '60 late sms',
    ]);
  });

  test('somebody on two rungs is told once by each way', () => {
    const shifts = [shift('desk', 'desk'), shift('desk', 'deputy')];
    const people = [person('desk', { isSupervisor: true })];
    expect(told('act-now', 900, roster({ shifts, people }))).toEqual(['0 desk e-mail', '0 desk sms']);
  });

  test('somebody on a shift without the right to act is passed over', () => {
    expect(told('act-now', 0, roster({ people: [person('boss', { isSupervisor: true })] }))).toEqual([
      '0 boss e-mail',
      '0 boss sms',
    ]);
  });
});

describe('quiet hours', () => {
  const quiet = { from: '17:00', until: '18:00' };
  const people = (who: string[]) =>
    roster().people.map((each) => (who.includes(each.id) ? { ...each, quiet } : each));

  test('pass over a deputy, never the desk', () => {
    expect(told('act-now', 60, roster({ people: people(['desk', 'deputy']) }))).toEqual([
      '0 desk e-mail',
      '0 desk sms',
      '60 boss e-mail',
      '60 boss sms',
    ]);
  });

  test('do not count for Act now when nobody else is left', () => {
    const asleep = roster({ shifts: [], people: people(['boss']) });
    expect(told('act-now', 0, asleep)).toEqual(['0 boss e-mail', '0 boss sms']);
    expect(told('act-soon', 900, asleep)).toEqual([]);
  });

  test.each([
    ['22:00', '06:00', '2026-03-04T03:00:00Z', true],
    ['22:00', '06:00', '2026-03-04T10:59:59Z', true],
    ['22:00', '06:00', '2026-03-04T11:00:00Z', false],
    ['22:00', '06:00', '2026-03-04T02:59:59Z', false],
    ['12:00', '13:00', '2026-03-03T17:30:00Z', true],
    ['12:00', '12:00', '2026-03-03T17:00:00Z', false],
    // 8 March 2026 has no 02:30 in New York: 01:59:59 is followed by 03:00.
    ['02:00', '03:00', '2026-03-08T07:00:00Z', false],
  ])('from %s to %s at %s: %s', (from, until, at, expected) => {
    expect(isQuiet({ from, until }, zone, Date.parse(at))).toBe(expected);
  });
});

test('a shift begins at its first instant and is over at its last', () => {
  const shifts = [shift('desk', 'desk', 0, 10)];
  const on = (seconds: number) => onDuty(shifts, 'desk', addSeconds(raisedAt, seconds));
  expect([on(-0.001), on(0), on(9.999), on(10)]).toEqual([[], ['desk'], ['desk'], []]);
});
