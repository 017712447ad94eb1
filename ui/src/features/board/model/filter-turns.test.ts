import {
  aWireAlert,
  aWireTurn,
  clockAt,
  entryAt,
  fixedSettings,
  wirePlan,
  type WireTurnParts,
} from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { noFilter, type TurnFilter } from './board-search';
import { filterSaid, filterTurns } from './filter-turns';

const now = clockAt('17:08');
const turn = (id: string, parts: WireTurnParts = {}) =>
  turnAt(
    aWireTurn({ ...parts, planned: { id, ...parts.planned } }, now),
    { plan: wirePlan, settings: fixedSettings },
    now,
  );

const arrived = entryAt('arrival', '17:06:30');
const turns = [
  turn('calm', { entries: [arrived], planned: { outboundTrain: '1742' } }),
  turn('alerted', {
    entries: [arrived],
    alerts: [aWireAlert({ state: 'taken' })],
    planned: { outboundTrain: '1850', track: '7', set: '52' },
  }),
  turn('left', { entries: [arrived, entryAt('departure', '17:07')], planned: { outboundTrain: '1660' } }),
  turn('named', {
    entries: [arrived],
    crew: [{ as: 'conductor', personId: 'x', name: 'K. Fenn' }],
    cars: ['7777'],
    planned: { outboundTrain: '1990' },
  }),
];
const found = (filter: Partial<TurnFilter>) =>
  filterTurns(turns, { ...noFilter, ...filter }).map((one) => one.id);

describe('the filter', () => {
  it.each<[Partial<TurnFilter>, string[]]>([
    [{}, ['calm', 'alerted', 'left', 'named']],
    [{ text: '1850' }, ['alerted']],
    [{ text: 'track 7' }, ['alerted']],
    [{ text: 'SET 52 18' }, ['alerted']],
    [{ text: 'fenn' }, ['named']],
    [{ text: '7777' }, ['named']],
    [{ text: '9999' }, []],
    [{ needsAction: true }, ['alerted']],
    [{ states: ['departed', 'tested'] }, []],
    [{ states: ['arrived'] }, ['calm', 'alerted', 'left', 'named']],
  ])('%j finds %j', (filter, ids) => {
    expect(found(filter)).toEqual(ids);
  });

  it.each<[Partial<TurnFilter>, string]>([
    [{}, 'Filter: none'],
    [{ needsAction: true, states: ['ready'] }, 'Filter: needs action, 1 state'],
    [{ text: ' 17 ', states: ['ready', 'arrived'] }, 'Filter: 2 states, “17”'],
  ])('%j is said as "%s"', (filter, words) => {
    expect(filterSaid({ ...noFilter, ...filter })).toBe(words);
  });
});
