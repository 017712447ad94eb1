import type { WirePerson, WireTerminal } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeRefusal, FakeServer } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { PeoplePage } from './people-page';

const terminals: WireTerminal[] = [
  { id: 't-1', version: 1, code: 'HBR', name: 'Quarry Street', zone: 'America/New_York', tracks: [] },
  { id: 't-2', version: 1, code: 'CAM', name: 'Camden Pier', zone: 'America/New_York', tracks: [] },
];

function aPerson(change: Partial<WirePerson> = {}): WirePerson {
  return {
    id: 'p-1',
    version: 1,
    email: 'am@example.com',
    name: 'A. Marlow',
    active: true,
    hasPassword: true,
    badge: null,
    hasPin: false,
    phone: null,
    roles: [{ role: 'conductor', terminal: 'HBR' }],
    sessions: 2,
    lastSeenAt: null,
    ...change,
  };
}

const link = { url: 'https://stubpost.example/link/secret', expiresAt: '2026-03-04T22:00:00.000Z' };

function open(server: FakeServer, path = '/people') {
  server.on('GET', '/api/terminals', terminals);
  return renderApp(<PeoplePage />, { person: aPersonWith('administrator'), server, path, route: '/people' });
}

describe('the people page', () => {
  test('lists everybody with roles in words', async () => {
    const people = [
      aPerson({ id: 'p-2', name: 'Z. Last', active: false, roles: [] }),
      aPerson({
        roles: [
          { role: 'conductor', terminal: 'HBR' },
          { role: 'supervisor', terminal: '*' },
        ],
      }),
    ];
    open(new FakeServer().on('GET', '/api/people', people));
    const rows = within(await screen.findByRole('table')).getAllByRole('row');
    expect(rows[1]).toHaveTextContent(
      /A\. Marlow.*Conductor at HBR; Supervisor everywhere.*2 sessions.*never/,
    );
    expect(rows[2]).toHaveTextContent(/Z\. Last.*No role.*may not sign in/);
  });

  test('adds a person with a role and shows the one-time link once', async () => {
    const server = new FakeServer()
      .on('GET', '/api/people', [])
      .on('POST', '/api/people', { ...aPerson({ hasPassword: false, sessions: 0 }), link });
    const { user } = open(server);
    await user.type(screen.getByLabelText(/^Name/), 'A. Marlow');
    await user.type(screen.getByLabelText(/^E-mail/), 'am@example.com');
    await waitFor(() => expect(server.sent('GET', '/api/terminals')).not.toHaveLength(0));
    await user.click(screen.getByRole('button', { name: 'Add a role' }));
    await user.selectOptions(screen.getByLabelText('Role 1'), 'Engineer');
    await user.selectOptions(screen.getByLabelText('Terminal of role 1'), 'Camden Pier');
    await user.click(screen.getByRole('button', { name: 'Add and make a link' }));
    expect(await screen.findByLabelText('One-time link')).toHaveValue(link.url);
    expect(server.sent('POST', '/api/people')[0]?.body).toEqual({
      name: 'A. Marlow',
      email: 'am@example.com',
      roles: [{ role: 'engineer', terminal: 'CAM' }],
    });
    expect(screen.getByLabelText(/^Name/)).toHaveValue('');
  });

  test('does not send a person without a role', async () => {
    const server = new FakeServer().on('GET', '/api/people', []);
    const { user } = open(server);
    await user.type(screen.getByLabelText(/^Name/), 'A. Marlow');
    await user.type(screen.getByLabelText(/^E-mail/), 'am@example.com');
    await user.click(screen.getByRole('button', { name: 'Add and make a link' }));
    expect(await screen.findByRole('link', { name: /^No role/ })).toBeInTheDocument();
    expect(server.sent('POST', '/api/people')).toHaveLength(0);
  });

  test('changes a person with the version that was seen', async () => {
    const server = new FakeServer()
      .on('GET', '/api/people', [aPerson({ version: 4 })])
      .on('PUT', '/api/people/:id', aPerson({ version: 5, active: false, sessions: 0 }));
    const { user } = open(server, '/people?person=p-1');
    await user.click(await screen.findByLabelText(/May sign in/));
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Saved.')).toHaveRole('status');
    expect(server.sent('PUT', '/api/people/:id')[0]).toMatchObject({
      params: { id: 'p-1' },
      body: { version: 4, active: false },
    });
  });

  /** The field of the person that is open; the form for a new one has such a field, too. */
  const badgeField = async (): Promise<HTMLElement> => {
    const form = (await screen.findByRole('button', { name: 'Save' })).closest('form');
    if (form === null) throw new Error('The button stands in no form');
    return within(form).getByLabelText(/^Badge/);
  };

  test.each([
    ['gives a badge', null, 'c-12', 'c-12'],
    ['takes a badge away where the field is empty', 'C-12', ' ', null],
  ])('%s', async (_name, before, typed, sent) => {
    const server = new FakeServer()
      .on('GET', '/api/people', [aPerson({ badge: before })])
      .on('PUT', '/api/people/:id', aPerson({ version: 2 }));
    const { user } = open(server, '/people?person=p-1');
    const field = await badgeField();
    await user.clear(field);
    await user.type(field, typed);
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Saved.')).toHaveRole('status');
    expect(server.sent('PUT', '/api/people/:id')[0]?.body).toMatchObject({ badge: sent });
  });

  test('says who has a badge that is already given out', async () => {
    const server = new FakeServer()
      .on('GET', '/api/people', [aPerson()])
      .refuse('PUT', '/api/people/:id', 'people.badge_taken', { badge: 'C-12' });
    const { user } = open(server, '/people?person=p-1');
    await user.type(await badgeField(), 'C-12');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Somebody else has badge C-12.')).toHaveRole('alert');
  });

  test('shows the newer state when somebody else was faster, and does not overwrite it', async () => {
    let version = 4;
    const server = new FakeServer()
      .on('GET', '/api/people', () => [
        aPerson({ version, name: version === 4 ? 'A. Marlow' : 'A. Marlowe' }),
      ])
      .on('PUT', '/api/people/:id', () => {
        version = 5;
        return new FakeRefusal('people.changed');
      });
    const { user } = open(server, '/people?person=p-1');
    await user.click(await screen.findByRole('button', { name: 'Save' }));
    expect(await screen.findByText(/Somebody changed this person meanwhile/)).toBeInTheDocument();
    expect(screen.getByLabelText(/^Name/)).toHaveValue('A. Marlowe');
  });

  test('makes a new link, ends sessions and gives a password', async () => {
    const server = new FakeServer()
      .on('GET', '/api/people', [aPerson()])
      .on('POST', '/api/people/:id/link', link)
      .on('DELETE', '/api/people/:id/sessions', undefined)
      .on('PUT', '/api/people/:id/password', undefined);
    const { user } = open(server, '/people?person=p-1');
    await user.click(await screen.findByRole('button', { name: 'Make a one-time link' }));
    expect(await screen.findByLabelText('One-time link')).toHaveValue(link.url);
    await user.click(screen.getByRole('button', { name: 'End 2 sessions' }));
    expect(await screen.findByText('All sessions of A. Marlow have ended.')).toBeInTheDocument();
    await user.type(screen.getByLabelText('New password'), 'a long enough phrase');
    await user.click(screen.getByRole('button', { name: 'Give this password' }));
    expect(await screen.findByText(/New password given/)).toBeInTheDocument();
    expect(server.sent('PUT', '/api/people/:id/password')[0]?.body).toEqual({
      password: 'a long enough phrase',
    });
  });
});
