import { ROLES } from '@stubpost/shared';
import { expect, test } from 'vitest';
import { HOME_NAMES, homeOf, homeOfRole } from './home';

test.each(ROLES)('the home of a %s is a page that exists and has a name', (role) => {
  expect(HOME_NAMES[homeOfRole(role)]).toBeTruthy();
});

test('with several roles the one nearest to the trains counts', () => {
  const roles = [
    { role: 'administrator', terminal: '*' },
    { role: 'conductor', terminal: 'HBR' },
  ] as const;
  expect(homeOf({ roles: [...roles] })).toBe('/my');
  expect(homeOf({ roles: [...roles, { role: 'dispatcher', terminal: 'HBR' }] })).toBe('/board');
  expect(homeOf({ roles: [] })).toBe('/help');
});
