import type { WireStationSummary } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import {
  activationFrom,
  draftFrom,
  setChosen,
  setCode,
  setName,
  suggestCode,
  terminalsOf,
  type StationDraft,
} from './terminal-draft';

const station = (stationId: string, name: string): WireStationSummary => ({
  stationId,
  name,
  turns: 10,
  guessedTurns: 0,
  medianLayoverSeconds: 600,
  shortByDesign: 0,
  platforms: [],
  turnsOnBusiestDay: 2,
  layovers: [],
});

const stations = [station('up', 'Harbor upper'), station('low', 'Harbor lower'), station('stc', 'Stonecrop')];
const fresh = draftFrom(stations, []);
const choose = (draft: StationDraft[], ...ids: string[]): StationDraft[] =>
  ids.reduce((current, id) => setChosen(current, id, true), draft);

describe('the choice of terminals', () => {
  it('begins with nothing chosen', () => {
    expect(terminalsOf(fresh)).toEqual([]);
  });

  it('begins with the stations of the terminals that run', () => {
    const known = [{ code: 'HBR', name: 'Harbor Terminal', stationIds: ['low', 'up', 'gone'] }];
    expect(terminalsOf(draftFrom(stations, known))).toEqual([
      { code: 'HBR', name: 'Harbor Terminal', stationIds: ['up', 'low'] },
    ]);
  });

  it('gives a chosen station a code of its own', () => {
    expect(terminalsOf(choose(fresh, 'up', 'low'))).toEqual([
      { code: 'HAR', name: 'Harbor upper', stationIds: ['up'] },
      { code: 'HAR2', name: 'Harbor lower', stationIds: ['low'] },
    ]);
  });

  it('joins stations that get the same code under one name', () => {
    const joined = setCode(choose(fresh, 'up', 'low'), 'low', 'HAR');
    expect(terminalsOf(joined)).toEqual([{ code: 'HAR', name: 'Harbor upper', stationIds: ['up', 'low'] }]);
    expect(terminalsOf(setName(joined, 'low', 'Harbor Terminal'))[0]?.name).toBe('Harbor Terminal');
  });

  it('forgets a station that is taken out, and knows its code when it comes back', () => {
    const chosen = setCode(choose(fresh, 'up'), 'up', 'H');
    const out = setChosen(chosen, 'up', false);
    expect(terminalsOf(out)).toEqual([]);
    expect(terminalsOf(setChosen(out, 'up', true))[0]?.code).toBe('H');
  });

  it.each([
    ['Union Station', [], 'UNI'],
    ['St. Ann', [], 'STA'],
    ['Union Station', ['UNI'], 'UNI2'],
    ['Union Station', ['UNI', 'UNI2'], 'UNI3'],
    ['东站', [], 'T'],
  ])('suggests a code for %s', (name, taken, code) => expect(suggestCode(name, taken)).toBe(code));
});

describe('the request to make a timetable active', () => {
  const draft = { stations: choose(fresh, 'up', 'stc'), from: '2026-03-09', acceptGuesses: false };

  it('carries the date, the terminals and the word about guesses', () => {
    expect(activationFrom(draft)).toEqual({
      request: {
        from: '2026-03-09',
        terminals: [
          { code: 'HAR', name: 'Harbor upper', stationIds: ['up'] },
          { code: 'STO', name: 'Stonecrop', stationIds: ['stc'] },
        ],
        acceptGuesses: false,
      },
      problems: [],
    });
  });

  it.each([
    ['nothing chosen', { ...draft, stations: fresh }, [['choice-of-terminals', 'No terminal is chosen.']]],
    ['no date', { ...draft, from: null }, [['active-from', 'Active from: no date that exists.']]],
    [
      'a code with a blank',
      { ...draft, stations: setCode(draft.stations, 'up', 'H B') },
      [['code-up', 'Harbor upper: a code is 1 to 12 letters, digits or dashes.']],
    ],
    [
      'no code',
      { ...draft, stations: setCode(draft.stations, 'stc', ' ') },
      [['code-stc', 'Stonecrop: a code is 1 to 12 letters, digits or dashes.']],
    ],
    [
      'no name',
      { ...draft, stations: setName(draft.stations, 'stc', '') },
      [['name-stc', 'Terminal STO has no name.']],
    ],
  ])('is not made with %s, and says at which field', (_, wrong, problems) => {
    const { request, problems: found } = activationFrom(wrong);
    expect(request).toBeNull();
    expect(found.map(({ fieldId, words }) => [fieldId, words])).toEqual(problems);
  });
});
