import type { WireAlert, WireBoard, WireTurn } from '@stubpost/shared';
import { QueryClient } from '@tanstack/react-query';
import { beforeEach, describe, expect, test } from 'vitest';
import { aWireTurn, clockAt, type WireTurnParts } from '../testing/wire-turn';
import { belongsTo, boardWithTurn, listWithAlert, patchAlert, patchTurn } from './live-patch';
import { queryKeys } from './query-keys';

const now = clockAt('16:55');
const turnOf = (parts: WireTurnParts = {}, at = now): WireTurn =>
  aWireTurn({ terminal: 'HBR', ...parts }, at);
const boardOf = (...turns: WireTurn[]): WireBoard => ({
  now: new Date(now).toISOString(),
  terminal: 'HBR',
  turns,
});

function anAlert(change: Partial<WireAlert> = {}): WireAlert {
  return {
    id: 'alert-1',
    version: 1,
    cause: 'late-departure',
    priority: 'act-soon',
    state: 'raised',
    terminal: 'HBR',
    turnId: 'turn-1',
    subject: 'Track 3, train 1742',
    raisedAt: new Date(now).toISOString(),
    takenAt: null,
    takenBy: null,
    setAsideUntil: null,
    setAsideReason: null,
    clearedAt: null,
    closedAt: null,
    closedCause: null,
    text: 'Cab brake check not recorded',
    action: 'Call the conductor',
    actor: 'Conductor',
    byWhen: null,
    lines: [],
    previousId: null,
    ...change,
  };
}

describe('a board list', () => {
  test('asked by service date holds the turns of that day and terminal', () => {
    const question = { terminal: 'HBR', serviceDate: '2026-03-03' };
    expect(belongsTo(question, turnOf(), now)).toBe(true);
    expect(belongsTo({ ...question, serviceDate: '2026-03-04' }, turnOf(), now)).toBe(false);
    expect(belongsTo({ ...question, terminal: 'CAM' }, turnOf(), now)).toBe(false);
  });

  test.each([
    ['16:55', true],
    ['17:39', true],
    ['17:41', false],
    ['12:59', false],
    ['13:01', true],
  ])('asked without a span at %s holds the 17:00 turn: %s', (clock, isHeld) => {
    expect(belongsTo({ terminal: 'HBR' }, turnOf(), clockAt(clock))).toBe(isHeld);
  });

  test('takes a later version and leaves an earlier one', () => {
    const known = turnOf({ version: 3 });
    const board = boardOf(known);
    expect(boardWithTurn(board, turnOf({ version: 4 }), true).turns[0]?.version).toBe(4);
    expect(boardWithTurn(board, turnOf({ version: 2 }), true)).toBe(board);
  });

  test('takes the same version when it was worked out later', () => {
    const board = boardOf(turnOf({ version: 3 }));
    const later = turnOf({ version: 3 }, clockAt('16:56'));
    expect(boardWithTurn(board, later, true).turns[0]).toBe(later);
  });

  test('puts a new turn in the order of time', () => {
    const [first, second, third] = ['16:30', '17:00', '17:30'].map((clock) =>
      turnOf({
        planned: {
          id: clock,
          scheduledArrivalAt: clockAt(clock),
          scheduledDepartureAt: clockAt(clock) + 1_200_000,
        },
      }),
    ) as [WireTurn, WireTurn, WireTurn];
    expect(boardWithTurn(boardOf(first, third), second, true).turns.map(({ id }) => id)).toEqual([
      '16:30',
      '17:00',
      '17:30',
    ]);
    expect(boardWithTurn(boardOf(first, second), third, true).turns.at(-1)?.id).toBe('17:30');
    expect(boardWithTurn(boardOf(first), second, false).turns).toHaveLength(1);
  });
});

describe('an alert list', () => {
  test('takes, replaces and drops, and never goes back', () => {
    const raised = anAlert();
    expect(listWithAlert([], raised, true)).toEqual([raised]);
    const taken = anAlert({ version: 2, state: 'taken' });
    expect(listWithAlert([raised], taken, true)).toEqual([taken]);
    expect(listWithAlert([taken], raised, true)).toEqual([taken]);
    expect(listWithAlert([taken], anAlert({ version: 3, state: 'cleared' }), false)).toEqual([]);
  });
});

describe('the cache', () => {
  let client: QueryClient;
  beforeEach(() => {
    client = new QueryClient();
  });

  test('shows a turn of the stream in its detail and in every board that holds it', () => {
    const detail = queryKeys.turns.detail('turn-1');
    const today = queryKeys.turns.board({ terminal: 'HBR', serviceDate: '2026-03-03' });
    const other = queryKeys.turns.board({ terminal: 'CAM' });
    client.setQueryData(detail, turnOf({ version: 1 }));
    client.setQueryData(today, boardOf(turnOf({ version: 1 })));
    client.setQueryData(other, { ...boardOf(), terminal: 'CAM' });
    patchTurn(client, turnOf({ version: 2 }), now);
    expect(client.getQueryData<WireTurn>(detail)?.version).toBe(2);
    expect(client.getQueryData<WireBoard>(today)?.turns.map(({ version }) => version)).toEqual([2]);
    expect(client.getQueryData<WireBoard>(other)?.turns).toEqual([]);
  });

  test('asks for the entries of a turn again only when it has new ones', () => {
    client.setQueryData(queryKeys.turns.detail('turn-1'), turnOf({ version: 1 }));
    client.setQueryData(queryKeys.turns.entries('turn-1'), []);
    const isStale = () => client.getQueryState(queryKeys.turns.entries('turn-1'))?.isInvalidated;
    patchTurn(client, turnOf({ version: 1 }, clockAt('16:56')), now);
    expect(isStale()).toBe(false);
    patchTurn(client, turnOf({ version: 2 }), now);
    expect(isStale()).toBe(true);
  });

  test('shows an alert of the stream in the lists that hold it and on its turn', () => {
    const standing = queryKeys.alerts.list({ terminal: 'HBR' });
    const all = queryKeys.alerts.list({ terminal: 'HBR', state: 'all' });
    const board = queryKeys.turns.board({ terminal: 'HBR' });
    client.setQueryData(standing, []);
    client.setQueryData(all, []);
    client.setQueryData(board, boardOf(turnOf()));
    patchAlert(client, anAlert());
    expect(client.getQueryData(standing)).toHaveLength(1);
    expect(client.getQueryData<WireBoard>(board)?.turns[0]?.alerts).toHaveLength(1);
    patchAlert(client, anAlert({ version: 2, state: 'cleared' }));
    expect(client.getQueryData(standing)).toHaveLength(0);
    expect(client.getQueryData(all)).toHaveLength(1);
    expect(client.getQueryData<WireBoard>(board)?.turns[0]?.alerts).toHaveLength(0);
  });
});
