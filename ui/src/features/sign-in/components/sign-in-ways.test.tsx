import { screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { unlockKind } from '../../../lib/lock/unlock-check';
import { createOutboxStore } from '../../../lib/outbox/outbox-store';
import { anOutboxEntry } from '../../../testing/an-outbox';
import { FakeServer } from '../../../testing/fake-server';
import { aPersonWith, renderApp } from '../../../testing/render-app';
import { SignInWays } from './sign-in-ways';

const conductor = aPersonWith('conductor', 'HBR');

function open(server: FakeServer) {
  const signedIn = vi.fn();
  const app = renderApp(<SignInWays onSignedIn={signedIn} />, { person: null, server });
  return { ...app, signedIn };
}

describe('signing in by badge', () => {
  it('takes the PIN from its own keys, and keeps what opens the phone again', async () => {
    const server = new FakeServer().on('POST', '/api/session', { person: conductor });
    const { user, signedIn } = open(server);
    await user.click(screen.getByRole('button', { name: 'Sign in with badge and PIN' }));
    await user.type(screen.getByLabelText('Badge'), '4401');
    for (const digit of '44719') await user.click(screen.getByRole('button', { name: digit }));
    await user.click(screen.getByRole('button', { name: 'Erase' }));
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    await vi.waitFor(() => expect(signedIn).toHaveBeenCalledWith(conductor));
    expect(server.sent('POST', '/api/session')[0]?.body).toEqual({ badge: '4401', pin: '4471' });
    await vi.waitFor(() => expect(unlockKind(conductor.id)).toBe('pin'));
  });

  it('with the password instead, and says when the two do not fit, leaving the badge', async () => {
    const server = new FakeServer().refuse('POST', '/api/session', 'session.wrong_credentials');
    localStorage.setItem('stubpost.sign-in-way', 'badge');
    const { user } = open(server);
    await user.click(screen.getByRole('button', { name: 'No PIN: use the password' }));
    await user.type(screen.getByLabelText('Badge'), '4401');
    await user.type(screen.getByLabelText('Password'), 'five o clock');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Badge and password do not fit together.')).toHaveRole('alert');
    expect(screen.getByLabelText('Badge')).toHaveValue('4401');
    expect(screen.getByLabelText('Password')).toHaveValue('');
  });

  it('says how many entries wait on this phone, and nothing of what is in them', async () => {
    localStorage.setItem('stubpost.sign-in-way', 'badge');
    const store = createOutboxStore();
    for (const id of ['a', 'b']) await store.add(anOutboxEntry({ label: 'Their secret' }, id));
    open(new FakeServer());
    expect(await screen.findByText(/2 entries wait here to be sent/)).toBeVisible();
    expect(screen.queryByText('Their secret')).toBeNull();
  });
});
