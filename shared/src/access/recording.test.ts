import { describe, expect, test } from 'vitest';
import { ENTRY_KINDS, type EntryKind } from '../turn/entry';
import {
  barredAtTheControls,
  type ControlsQuestion,
  mayRecord,
  recordableKinds,
  withdrawalReach,
} from './recording';
import { ROLES, type Role } from './roles';

const person = (role: Role, terminal = 'HBR') => ({ id: 'p', roles: [{ role, terminal }] });

describe('which entries a role may record', () => {
  const train = [
    'arrival',
    'departure',
    'step-done',
    'withdrawn',
    'corrected',
    'cannot-do',
    'crew',
    'relief',
    'briefing',
    'note',
    'defect',
    'tied-up',
  ];
  const crew = [...train, 'agreed', 'disagreed'];
  test.each<[Role, string[]]>([
    ['conductor', crew],
    ['engineer', crew],
    ['dispatcher', [...train, 'expected-arrival', 'track', 'set', 'hold', 'annulled', 'ruled']],
    ['supervisor', ['note', 'corrected', 'withdrawn', 'ruled', 'correction-approved', 'correction-declined']],
    ['inspector', ['blue-signal-up', 'blue-signal-down', 'note', 'defect']],
    ['planner', []],
    ['analyst', []],
    ['auditor', []],
    ['administrator', []],
  ])('%s: %j', (role, kinds) => {
    expect([...recordableKinds(person(role), 'HBR')].sort()).toEqual([...kinds].sort());
    for (const kind of ENTRY_KINDS) expect(mayRecord(person(role), kind, 'HBR')).toBe(kinds.includes(kind));
    expect(recordableKinds(person(role), 'CAM')).toEqual([]);
  });

  test('every kind can be recorded by somebody', () => {
    const orphans: EntryKind[] = ENTRY_KINDS.filter(
      (kind) => !ROLES.some((role) => mayRecord(person(role), kind, 'HBR')),
    );
    expect(orphans).toEqual([]);
  });

  test('two roles at one terminal add up', () => {
    const both = {
      id: 'p',
      roles: [
        { role: 'conductor', terminal: 'HBR' },
        { role: 'inspector', terminal: '*' },
      ] as const,
    };
    expect(mayRecord(both, 'blue-signal-up', 'HBR')).toBe(true);
    expect(mayRecord(both, 'arrival', 'HBR')).toBe(true);
  });

  test.each<[Role, string]>([
    ['conductor', 'own'],
    ['engineer', 'own'],
    ['dispatcher', 'anyone'],
    ['supervisor', 'anyone'],
    ['inspector', 'nobody'],
    ['administrator', 'nobody'],
  ])('%s may take back entries of: %s', (role, reach) => {
    expect(withdrawalReach(person(role), 'HBR')).toBe(reach);
  });
});

describe('the engineer at the controls', () => {
  const question = (change: Partial<ControlsQuestion>): ControlsQuestion => ({
    isEngineerOfTurn: true,
    step: 'ends-changed',
    source: 'by-hand',
    observedAt: 1000,
    receivedAt: 1000,
    atControls: null,
    ...change,
  });
  const inCab = { from: 500, until: null };

  test.each<[string, Partial<ControlsQuestion>, boolean]>([
    ['before the leaving cab, an ordinary step', {}, false],
    ['the running test by hand', { step: 'running-test' }, true],
    ['the running test by radio', { step: 'running-test', source: 'by-radio' }, true],
    [
      'the running test entered later, after the next arrival',
      {
        step: 'running-test',
        source: 'entered-later',
        receivedAt: 9000,
        atControls: { from: 500, until: 8000 },
      },
      false,
    ],
    [
      'the running test entered later, still under way',
      {
        step: 'running-test',
        source: 'entered-later',
        atControls: inCab,
      },
      true,
    ],
    ['that they are in the cab, from the cab', { step: 'engineer-in-cab' }, true],
    ['that they were in the cab, entered later', { step: 'engineer-in-cab', source: 'entered-later' }, false],
    ['anything while in the leaving cab', { step: undefined, atControls: inCab }, true],
    ['at the very moment of entering it', { observedAt: 500, atControls: inCab }, true],
    ['an act by hand from before, held up on the phone', { observedAt: 499, atControls: inCab }, false],
    [
      'by radio while in the cab, of something before',
      { observedAt: 499, source: 'by-radio', atControls: inCab },
      true,
    ],
    ['after the next arrival', { observedAt: 8000, atControls: { from: 500, until: 8000 } }, false],
  ])('%s', (_title, change, barred) => {
    expect(barredAtTheControls(question(change))).toBe(barred);
    expect(barredAtTheControls(question({ ...change, isEngineerOfTurn: false }))).toBe(false);
  });
});
