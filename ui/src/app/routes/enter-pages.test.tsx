import { screen, waitFor } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeServer } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { LinkPage } from './link-page';
import { WelcomePage } from './welcome-page';

describe('the first administrator’s page', () => {
  const open = (server: FakeServer) =>
    renderApp(<WelcomePage />, { person: null, server, path: '/welcome', route: '/welcome' });

  test('makes the first administrator and goes on to the people', async () => {
    const server = new FakeServer()
      .on('GET', '/api/setup', { needed: true })
      .on('POST', '/api/setup', { person: aPersonWith('administrator') });
    const { user, router } = open(server);
    await user.type(await screen.findByLabelText('Name, as it will stand in the record'), 'E. Vanter');
    await user.type(screen.getByLabelText('E-mail, to sign in with'), 'ev@example.com');
    await user.type(screen.getByLabelText('Password'), 'a long enough phrase');
    await user.click(screen.getByRole('button', { name: 'Make the first administrator' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/people'));
    expect(server.sent('POST', '/api/setup')[0]?.body).toEqual({
      name: 'E. Vanter',
      email: 'ev@example.com',
      password: 'a long enough phrase',
    });
  });

  test('lists what is wrong, with links to the fields, and sends nothing', async () => {
    const server = new FakeServer().on('GET', '/api/setup', { needed: true });
    const { user } = open(server);
    await user.type(await screen.findByLabelText('E-mail, to sign in with'), 'no address');
    await user.type(screen.getByLabelText('Password'), 'short');
    await user.click(screen.getByRole('button', { name: 'Make the first administrator' }));
    const summary = (await screen.findByText('3 things to mend')).parentElement;
    expect(summary).toHaveRole('alert');
    expect(summary).toHaveFocus();
    await user.click(screen.getByRole('link', { name: 'E-mail is not an address.' }));
    expect(screen.getByLabelText('E-mail, to sign in with')).toHaveFocus();
    expect(server.sent('POST', '/api/setup')).toHaveLength(0);
  });

  test('leads away once there is one', async () => {
    const { router } = open(new FakeServer().on('GET', '/api/setup', { needed: false }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/'));
  });
});

describe('a one-time link', () => {
  const link = { name: 'A. Marlow', email: 'am@example.com', expiresAt: '2026-03-04T22:00:00.000Z' };
  const open = (server: FakeServer) =>
    renderApp(<LinkPage />, { person: null, server, path: '/link/abc', route: '/link/:token' });

  test('shows whom it is for, uses nothing up by being opened, and signs in', async () => {
    const server = new FakeServer()
      .on('GET', '/api/links/:token', link)
      .on('POST', '/api/links/:token', { person: aPersonWith('conductor') });
    const { user, router } = open(server);
    expect(await screen.findByText('A. Marlow')).toBeInTheDocument();
    expect(server.sent('POST', '/api/links/:token')).toHaveLength(0);
    await user.type(screen.getByLabelText('New password'), 'a long enough phrase');
    await user.click(screen.getByRole('button', { name: 'Set password and sign in' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/my'));
    expect(server.sent('POST', '/api/links/:token')[0]).toMatchObject({
      params: { token: 'abc' },
      body: { password: 'a long enough phrase' },
    });
  });

  test('that was used says so and leads to the sign-in page', async () => {
    open(new FakeServer().refuse('GET', '/api/links/:token', 'link.unknown'));
    expect(await screen.findByText(/This link was used, has run out/)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'To the sign-in page' })).toHaveAttribute('href', '/sign-in');
  });

  test('shows the password when asked to, and refuses a short one before sending', async () => {
    const server = new FakeServer().on('GET', '/api/links/:token', link);
    const { user } = open(server);
    const field = await screen.findByLabelText('New password');
    await user.type(field, 'short');
    expect(field).toHaveAttribute('type', 'password');
    await user.click(screen.getByRole('button', { name: 'Show new password' }));
    expect(field).toHaveAttribute('type', 'text');
    await user.click(screen.getByRole('button', { name: 'Set password and sign in' }));
    expect(screen.getByText('Too short: at least 8 characters.')).toBeInTheDocument();
    expect(server.sent('POST', '/api/links/:token')).toHaveLength(0);
  });
});
