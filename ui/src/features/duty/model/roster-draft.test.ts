import { shippedEscalation } from '@stubpost/shared';
import { describe, expect, test } from 'vitest';
import {
  quietProblem,
  requestOf,
  type RosterDraft,
  type ShiftDraft,
  shiftsOf,
  toldLines,
  withShifts,
} from './roster-draft';

const zone = 'America/New_York';
const form = (fields: Partial<ShiftDraft> = {}): ShiftDraft => ({
  personId: 'p',
  as: 'desk',
  date: '2026-03-03',
  from: '06:00',
  until: '14:00',
  days: '1',
  ...fields,
});

describe('a time on duty as it is typed', () => {
  test('is one shift a day in the terminal’s zone, also across the night the clocks change', () => {
    expect(shiftsOf(form({ date: '2026-03-07', days: '2' }), zone)).toEqual([
      { personId: 'p', as: 'desk', from: '2026-03-07T11:00:00.000Z', until: '2026-03-07T19:00:00.000Z' },
      { personId: 'p', as: 'desk', from: '2026-03-08T10:00:00.000Z', until: '2026-03-08T18:00:00.000Z' },
    ]);
  });

  test('ends the next morning when its end is not after its beginning', () => {
    expect(shiftsOf(form({ from: '2200', until: '6:00' }), zone)).toEqual([
      { personId: 'p', as: 'desk', from: '2026-03-04T03:00:00.000Z', until: '2026-03-04T11:00:00.000Z' },
    ]);
  });

  test.each([
    [{ personId: '' }, 'Choose a person.'],
    [{ date: '' }, 'Day: choose a date.'],
    [{ from: 'six' }, 'Times are typed as 06:00.'],
    [{ days: '0' }, 'Days: a whole number from 1 to 31.'],
    [{ days: '1.5' }, 'Days: a whole number from 1 to 31.'],
    [{ until: '35:00' }, 'At most 24 h in one piece.'],
  ] as [Partial<ShiftDraft>, string][])('%j: %s', (fields, words) => {
    expect(shiftsOf(form(fields), zone)).toBe(words);
  });
});

const draft: RosterDraft = {
  shifts: [{ personId: 'd', as: 'desk', from: '2026-03-03T20:00:00Z', until: '2026-03-04T02:00:00Z' }],
  people: [
    { id: 'd', name: 'Dee', isSupervisor: false, hasPhone: true, quiet: null },
    { id: 's', name: 'Sue', isSupervisor: true, hasPhone: true, quiet: { from: '22:00', until: '05:00' } },
  ],
  steps: shippedEscalation.map((step) => ({ ...step, channels: [...step.channels] })),
};

test('the page tells by the same rule as the service who would be told', () => {
  const now = Date.parse('2026-03-03T22:00:00Z');
  expect(toldLines(draft, zone, 'act-now', now)).toEqual([
    { afterSeconds: 0, name: 'Dee', channels: ['e-mail', 'sms'] },
    { afterSeconds: 60, name: 'Sue', channels: ['e-mail', 'sms'] },
  ]);
  expect(toldLines(draft, zone, 'watch', now)).toEqual([
    { afterSeconds: 300, name: 'Dee', channels: ['e-mail'] },
  ]);
});

test('what is kept names quiet hours only where there are some', () => {
  expect(requestOf(draft, 4)).toMatchObject({
    version: 4,
    quietHours: [{ personId: 's', from: '22:00', until: '05:00' }],
  });
});

test('quiet hours are two times of day, or none', () => {
  const dee = (quiet: { from: string; until: string } | null): string | null =>
    quietProblem({
      ...draft,
      people: draft.people.map((person) => (person.id === 'd' ? { ...person, quiet } : person)),
    });
  expect([dee(null), dee({ from: '22:00', until: '05:00' })]).toEqual([null, null]);
  expect(dee({ from: '22:00', until: '' })).toBe('Quiet hours of Dee: both times, such as 22:00 and 05:00.');
  expect(dee({ from: '24:00', until: '05:00' })).not.toBeNull();
});

test('shifts come in the order of their beginning, the same one once', () => {
  const later = { ...draft.shifts[0], from: '2026-03-03T21:00:00Z' } as RosterDraft['shifts'][number];
  expect(withShifts([later], [...draft.shifts, ...draft.shifts])).toEqual([...draft.shifts, later]);
});
