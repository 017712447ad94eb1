import { act, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { lockPhone } from '../lib/lock/phone-lock';
import { keepUnlockCheck } from '../lib/lock/unlock-check';
import { createOutboxStore } from '../lib/outbox/outbox-store';
import { anOutboxEntry } from '../testing/an-outbox';
import { FakeServer } from '../testing/fake-server';
import { aPersonWith, renderRoutes } from '../testing/render-app';
import { SignedInOnly } from './guards';

const conductor = aPersonWith('conductor', 'HBR');

function open(server = new FakeServer()) {
  const pages = [{ path: '/my', element: <p>Train 1742 and all its steps</p> }];
  return renderRoutes(
    [
      { element: <SignedInOnly />, children: pages },
      { path: '/sign-in', element: <p>Sign-in page</p> },
    ],
    { person: conductor, path: '/my', server: server.on('GET', '/api/demo', { demo: false }) },
  );
}

/** Lets so many minutes pass. */
const pass = (minutes: number): void => {
  act(() => {
    vi.advanceTimersByTime(minutes * 60_000);
  });
};

const page = () => screen.queryByText('Train 1742 and all its steps');

describe('a locked phone', () => {
  test('shows nothing of what was on it, and opens with the PIN its person signed in with', async () => {
    await keepUnlockCheck(conductor.id, 'pin', '4471');
    lockPhone(conductor.id);
    const { user } = open();
    expect(screen.getByRole('heading', { name: 'Locked' })).toBeVisible();
    expect(page()).toBeNull();
    await user.type(screen.getByLabelText('PIN'), '4472');
    await user.click(screen.getByRole('button', { name: 'Unlock' }));
    expect(await screen.findByText('That is not the PIN. 9 tries left.')).toBeVisible();
    for (const digit of '4471') await user.click(screen.getByRole('button', { name: digit }));
    await user.click(screen.getByRole('button', { name: 'Unlock' }));
    expect(await screen.findByText('Train 1742 and all its steps')).toBeVisible();
  });

  test('goes to another person with what waits kept, and not without a signal', async () => {
    lockPhone(conductor.id);
    await createOutboxStore().add(anOutboxEntry({ personId: conductor.id }));
    const server = new FakeServer().refuse('DELETE', '/api/session', 'server.busy');
    const { user } = open(server);
    const other = screen.getByRole('button', { name: 'Sign in again, or as another person' });
    await user.click(other);
    expect(await screen.findByText(/Another person can sign in only with a signal/)).toBeVisible();
    expect(page()).toBeNull();
    server.on('DELETE', '/api/session', undefined);
    await user.click(other);
    expect(await screen.findByText('Sign-in page')).toBeVisible();
    expect(await createOutboxStore().countOthers(null)).toBe(1);
  });

  test('is not locked for people of the desk', () => {
    const dispatcher = aPersonWith('dispatcher', 'HBR');
    lockPhone(dispatcher.id);
    renderRoutes([{ element: <SignedInOnly />, children: [{ path: '/board', element: <p>The board</p> }] }], {
      person: dispatcher,
      path: '/board',
    });
    expect(screen.getByText('The board')).toBeVisible();
  });
});

describe('ten minutes without a touch', () => {
  beforeEach(() => {
    vi.useFakeTimers({
      now: Date.parse('2026-03-03T22:22:41Z'),
      toFake: ['setInterval', 'clearInterval', 'Date'],
    });
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  test('lock the phone; a touch before that begins them anew', () => {
    open();
    expect(page()).not.toBeNull();
    pass(9);
    document.dispatchEvent(new Event('pointerdown'));
    pass(9);
    expect(page()).not.toBeNull();
    pass(1.1);
    expect(screen.getByRole('heading', { name: 'Locked' })).toBeVisible();
  });

  test('lock a phone that was off meanwhile, at the first look', () => {
    localStorage.setItem('stubpost.touched', String(Date.now() - 11 * 60_000));
    open();
    expect(screen.getByRole('heading', { name: 'Locked' })).toBeVisible();
  });
});
