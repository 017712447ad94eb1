import { describe, expect, test } from 'vitest';
import { may, mayEverywhere, PERMISSIONS, type Permission, rolesWith, terminalsWhere } from './permissions';
import { ROLES, type Role, type RoleGrant } from './roles';

const person = (...roles: RoleGrant[]) => ({ id: 'p', roles });
const at = (role: Role, terminal: string): RoleGrant => ({ role, terminal });

describe('the policy', () => {
  // Written out once more by hand: a slip in the table must not pass because the test reads the same table.
  test.each<[Permission, Role[]]>([
    ['people.manage', ['administrator']],
    ['terminals.manage', ['administrator']],
    ['settings.edit', ['supervisor']],
    ['plans.edit', ['supervisor']],
    ['timetables.import', ['administrator']],
    ['entries.record', ['conductor', 'engineer', 'dispatcher', 'supervisor', 'inspector']],
    ['turns.create', ['dispatcher']],
    ['alerts.act', ['dispatcher', 'supervisor']],
    ['crew.read', ['conductor', 'engineer', 'dispatcher', 'supervisor']],
    ['records.read', ['supervisor', 'auditor', 'administrator']],
    ['history.import', ['analyst', 'administrator']],
    ['sets.edit', ['dispatcher', 'inspector', 'administrator']],
  ])('%s is for %j and nobody else', (permission, roles) => {
    const allowed = ROLES.filter((role) => may(person(at(role, '*')), permission, 'HBR'));
    expect(allowed).toEqual(roles);
  });

  test('the administrator of the system never records about operations', () => {
    expect(may(person(at('administrator', '*')), 'entries.record')).toBe(false);
  });

  test('an auditor changes nothing', () => {
    const changing = PERMISSIONS.filter(
      (permission) => !permission.endsWith('.read') && permission !== 'session',
    );
    expect(changing.filter((permission) => rolesWith(permission).includes('auditor'))).toEqual([]);
  });
});

describe('may', () => {
  test('a role counts at its own terminal only', () => {
    const dispatcher = person(at('dispatcher', 'HBR'));
    expect(may(dispatcher, 'turns.create', 'HBR')).toBe(true);
    expect(may(dispatcher, 'turns.create', 'CAM')).toBe(false);
    expect(may(dispatcher, 'turns.create', 'hbr')).toBe(false);
    expect(may(dispatcher, 'turns.create')).toBe(true);
  });

  test('a role everywhere counts at every terminal', () => {
    expect(may(person(at('dispatcher', '*')), 'turns.create', 'ANY')).toBe(true);
  });

  test('roles do not lend each other their terminals', () => {
    const two = person(at('conductor', 'HBR'), at('dispatcher', 'CAM'));
    expect(may(two, 'turns.create', 'HBR')).toBe(false);
  });

  test('somebody without a role is signed in and no more', () => {
    expect(PERMISSIONS.filter((permission) => may(person(), permission))).toEqual(['session']);
  });

  test('for all terminals at once a role at some is not enough', () => {
    expect(mayEverywhere(person(at('administrator', 'HBR')), 'people.manage')).toBe(false);
    expect(mayEverywhere(person(at('administrator', '*')), 'people.manage')).toBe(true);
  });
});

describe('terminalsWhere', () => {
  test('names each terminal once, or all', () => {
    const crew = person(at('conductor', 'HBR'), at('engineer', 'HBR'), at('planner', 'CAM'));
    expect(terminalsWhere(crew, 'entries.record')).toEqual(['HBR']);
    expect(terminalsWhere(crew, 'board.read')).toEqual(['HBR', 'CAM']);
    expect(terminalsWhere(person(at('conductor', 'HBR'), at('engineer', '*')), 'entries.record')).toEqual([
      '*',
    ]);
  });
});
