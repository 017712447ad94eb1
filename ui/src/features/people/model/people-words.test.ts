import type { WirePerson } from '@stubpost/shared';
import { describe, expect, test } from 'vitest';
import { findPeople } from './find-people';
import { rolesInWords, tidyGrants } from './role-words';

describe('roles in words', () => {
  test('name a role once, with its terminals', () => {
    expect(
      rolesInWords([
        { role: 'supervisor', terminal: '*' },
        { role: 'conductor', terminal: 'HBR' },
        { role: 'conductor', terminal: 'CAM' },
      ]),
    ).toBe('Conductor at CAM, HBR; Supervisor everywhere');
    expect(rolesInWords([])).toBe('No role');
  });

  test('are tidied: no doubles, no single terminal of a role held everywhere', () => {
    expect(
      tidyGrants([
        { role: 'conductor', terminal: 'HBR' },
        { role: 'conductor', terminal: 'HBR' },
        { role: 'engineer', terminal: 'HBR' },
        { role: 'engineer', terminal: '*' },
      ]),
    ).toEqual([
      { role: 'conductor', terminal: 'HBR' },
      { role: 'engineer', terminal: '*' },
    ]);
  });
});

describe('finding people', () => {
  const person = (name: string, role: WirePerson['roles'][number]['role']): WirePerson => ({
    id: name,
    version: 1,
    email: `${name.toLowerCase()}@example.com`,
    name,
    active: true,
    hasPassword: true,
    badge: null,
    hasPin: false,
    phone: null,
    roles: [{ role, terminal: 'HBR' }],
    sessions: 0,
    lastSeenAt: null,
  });
  const people = [person('Zola', 'conductor'), person('Amund', 'engineer'), person('Zeno', 'engineer')];
  const names = (text: string): string[] => findPeople(people, text).map(({ name }) => name);

  test('sorts by name and takes every word into account', () => {
    expect(names('')).toEqual(['Amund', 'Zeno', 'Zola']);
    expect(names('ENGINEER z')).toEqual(['Zeno']);
    expect(names('zola@example')).toEqual(['Zola']);
    expect(names('nobody')).toEqual([]);
  });
});
