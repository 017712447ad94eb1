import { screen, waitFor } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeServer } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { safeBack, SignInPage } from './sign-in-page';

function aServer(): FakeServer {
  return new FakeServer()
    .on('GET', '/api/setup', { needed: false })
    .on('GET', '/api/demo', { demo: false })
    .refuse('GET', '/api/session', 'session.missing');
}

const open = (server: FakeServer, path = '/sign-in') =>
  renderApp(<SignInPage />, { person: null, server, path, route: '/sign-in' });

describe('the sign-in page', () => {
  test('signs in by e-mail and password and goes to the person’s own page', async () => {
    const server = aServer().on('POST', '/api/session', { person: aPersonWith('dispatcher') });
    const { user, router } = open(server);
    await user.type(screen.getByLabelText('E-mail'), 'sam@example.com');
    await user.type(screen.getByLabelText('Password'), 'a long enough phrase');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/board'));
    expect(server.sent('POST', '/api/session')[0]?.body).toEqual({
      email: 'sam@example.com',
      password: 'a long enough phrase',
    });
  });

  test('goes back to the page that asked for it', async () => {
    const server = aServer().on('POST', '/api/session', { person: aPersonWith('dispatcher') });
    const { user, router } = open(server, '/sign-in?back=%2Fturns%2F7%3Fterminal%3DHBR');
    await user.type(screen.getByLabelText('E-mail'), 'sam@example.com');
    await user.type(screen.getByLabelText('Password'), 'a long enough phrase{Enter}');
    await waitFor(() => expect(router.state.location.pathname).toBe('/turns/7'));
    expect(router.state.location.search).toBe('?terminal=HBR');
  });

  test('keeps the e-mail after a wrong pair, empties the password and says why', async () => {
    const server = aServer().refuse('POST', '/api/session', 'session.wrong_credentials');
    const { user } = open(server);
    await user.type(screen.getByLabelText('E-mail'), 'sam@example.com');
    await user.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect(await screen.findByText('E-mail and password do not fit together.')).toHaveRole('alert');
    expect(screen.getByLabelText('E-mail')).toHaveValue('sam@example.com');
    expect(screen.getByLabelText('Password')).toHaveValue('');
    expect(screen.getByLabelText('Password')).toHaveFocus();
  });

  test('says how long to wait after too many tries', async () => {
    const server = aServer().refuse('POST', '/api/session', 'session.too_many_tries', {
      retryAfterSeconds: 40,
    });
    const { user } = open(server);
    await user.type(screen.getByLabelText('E-mail'), 'sam@example.com');
    await user.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect(await screen.findByText('Too many tries. Try again in 40 s.')).toBeInTheDocument();
  });

  test('offers nobody of a demo where there is none', async () => {
    const { server } = open(aServer());
    await waitFor(() => expect(server.sent('GET', '/api/demo')).toHaveLength(1));
    expect(screen.queryByText('This is a demo. Sign in as')).not.toBeInTheDocument();
  });

  test('signs in as one of the demo’s people with one click', async () => {
    const people = [{ id: 'p-1', name: 'A. Marlow', role: 'conductor', terminal: '*' }];
    const server = aServer()
      .on('GET', '/api/demo', { demo: true, state: 'filling', message: 'Three weeks to go', people })
      .on('POST', '/api/demo/session', { person: aPersonWith('conductor') });
    const { user, router } = open(server);
    expect(await screen.findByText('Three weeks to go')).toHaveRole('status');
    expect(screen.getByRole('row', { name: /Conductor A. Marlow My turns/ })).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Sign in as Conductor A. Marlow' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/my'));
    expect(server.sent('POST', '/api/demo/session')[0]?.body).toEqual({ personId: 'p-1' });
  });

  test('leads to the set-up of an empty installation', async () => {
    const { router } = open(aServer().on('GET', '/api/setup', { needed: true }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/welcome'));
  });
});

test.each([
  ['/turns/7?terminal=HBR', '/turns/7?terminal=HBR'],
  ['//evil.example', null],
  ['/\\evil.example', null],
  ['https://evil.example', null],
  ['board', null],
  [null, null],
])('an address to go back to is one of this app: %s', (back, safe) => {
  expect(safeBack(back)).toBe(safe);
});
