import type { OwnSession } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeServer } from '../../testing/fake-server';
import { readPreferences } from '../../lib/preferences';
import { aPersonWith, renderRoutes } from '../../testing/render-app';
import { SignedInOnly } from '../guards';
import { MePage } from './me-page';

const session = (change: Partial<OwnSession>): OwnSession => ({
  id: 's-1',
  startedAt: '2026-03-03T12:00:00.000Z',
  lastSeenAt: '2026-03-03T22:00:00.000Z',
  endsAt: '2026-03-04T12:00:00.000Z',
  device: 'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 Chrome/156.0.0.0 Safari/537.36',
  current: true,
  ...change,
});

function open(server = new FakeServer()) {
  server.on('GET', '/api/terminals', []).on('GET', '/api/session/list', [
    session({}),
    session({
      id: 's-2',
      current: false,
      device: 'Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) Version/19.0 Mobile Safari/604.1',
    }),
  ]);
  const behindTheGuard = { element: <SignedInOnly />, children: [{ path: '/me', element: <MePage /> }] };
  const elsewhere = { path: '*', element: <p>Elsewhere</p> };
  return renderRoutes([behindTheGuard, elsewhere], {
    person: aPersonWith('dispatcher', 'HBR'),
    server,
    path: '/me',
  });
}

describe('one’s own page', () => {
  test('says who one is and what one may do', () => {
    open();
    expect(screen.getByRole('heading', { name: 'R. Dispatcher' })).toBeInTheDocument();
    expect(screen.getByText('Dispatcher, terminal HBR')).toBeInTheDocument();
  });

  test('ends a session on another device, not this one', async () => {
    const server = new FakeServer().on('DELETE', '/api/session/list/:id', undefined);
    const { user } = open(server);
    const here = await screen.findByRole('row', { name: /Chrome on Linux/ });
    expect(within(here).queryByRole('button')).not.toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: /End the session on Safari on iPhone/ }));
    await waitFor(() =>
      expect(server.sent('DELETE', '/api/session/list/:id')[0]?.params).toEqual({ id: 's-2' }),
    );
  });

  test('changes the password and says that other sessions ended', async () => {
    const server = new FakeServer().on('PUT', '/api/session/password', undefined);
    const { user } = open(server);
    await user.type(screen.getByLabelText('Current password'), 'the old one');
    await user.type(screen.getByLabelText('New password'), 'a long enough phrase');
    await user.click(screen.getByRole('button', { name: 'Change password' }));
    expect(await screen.findByText(/Password changed/)).toHaveRole('status');
    expect(server.sent('PUT', '/api/session/password')[0]?.body).toEqual({
      current: 'the old one',
      password: 'a long enough phrase',
    });
  });

  test('keeps look and announcements on this device', async () => {
    const { user } = open();
    await user.click(screen.getByLabelText(/^Night/));
    expect(document.documentElement).toHaveClass('bp6-dark');
    await user.click(screen.getByLabelText(/No colour/));
    expect(document.documentElement).toHaveClass('no-colour');
    await user.click(screen.getByLabelText('60 s'));
    await user.click(screen.getByLabelText('Only “Act now”'));
    expect(readPreferences()).toMatchObject({
      theme: 'dark',
      noColour: true,
      announceSeconds: 60,
      announce: 'act-now',
    });
  });

  test('signs out', async () => {
    const server = new FakeServer().on('DELETE', '/api/session', undefined);
    const { user, router } = open(server);
    await user.click(screen.getByRole('button', { name: 'Sign out' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/sign-in'));
    expect(server.sent('DELETE', '/api/session')).toHaveLength(1);
  });
});
