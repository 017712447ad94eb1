import type { OwnBadge } from '@stubpost/shared';
import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { FakeServer } from '../../../testing/fake-server';
import { aPersonWith, renderApp } from '../../../testing/render-app';
import { OwnPin } from './own-pin';

function open(badge: OwnBadge, server = new FakeServer()) {
  server.on('GET', '/api/session/pin', badge).on('PUT', '/api/session/pin', undefined);
  return renderApp(<OwnPin />, { person: aPersonWith('conductor', 'HBR'), server });
}

describe('one’s own PIN', () => {
  it('is set with the current password', async () => {
    const { user, server } = open({ badge: 'C-12', hasPin: false, hasPassword: true });
    const set = await screen.findByRole('button', { name: 'Set PIN' });
    await user.type(screen.getByLabelText('PIN'), '44a71');
    expect(set).toBeDisabled();
    await user.type(screen.getByLabelText('Current password'), 'five o clock');
    await user.click(set);
    expect(await screen.findByText('PIN is set.')).toBeVisible();
    expect(server.sent('PUT', '/api/session/pin')[0]?.body).toEqual({ current: 'five o clock', pin: '4471' });
  });

  it.each([
    ['123', 'A PIN has 4 to 8 digits.'],
    ['4567', 'One digit repeated, or a run such as 1234, is tried first.'],
  ])('is not %s, and the page says why before anything is sent', async (pin, words) => {
    const { user, server } = open({ badge: 'C-12', hasPin: false, hasPassword: false });
    await user.type(await screen.findByLabelText('PIN'), pin);
    await user.click(screen.getByRole('button', { name: 'Set PIN' }));
    expect(await screen.findByText(words)).toBeVisible();
    expect(server.sent('PUT', '/api/session/pin')).toEqual([]);
  });

  it('can be taken away', async () => {
    const { user, server } = open({ badge: 'C-12', hasPin: true, hasPassword: false });
    await user.click(await screen.findByRole('button', { name: 'Take PIN away' }));
    expect(server.sent('PUT', '/api/session/pin')[0]?.body).toEqual({ pin: null });
  });

  it('needs a badge first', async () => {
    open({ badge: null, hasPin: false, hasPassword: true });
    expect(await screen.findByText(/^No badge yet/)).toBeVisible();
    expect(screen.queryByLabelText('PIN')).toBeNull();
  });
});
