import type { WireTaking } from '@stubpost/shared';
import { screen } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeRefusal, FakeServer } from '../../testing/fake-server';
import { renderApp } from '../../testing/render-app';
import { TakingPage } from './taking-page';

const taking: WireTaking = {
  name: 'S. Halloway',
  terminal: 'Harbor',
  zone: 'America/New_York',
  priority: 'act-now',
  subject: 'Track 3, train 1742',
  text: 'No handbrake recorded and nobody at the brakes since 17:25:40',
  action: 'Send somebody to the train.',
  raisedAt: '2026-03-03T22:26:20.000Z',
  clearedAt: null,
  takenBy: null,
  takenAt: null,
  expiresAt: '2026-03-04T00:26:20.000Z',
};

function open(server: FakeServer) {
  return renderApp(<TakingPage />, { server, person: null, route: '/t/:token', path: '/t/the-token' });
}

describe('the page of the link in a message', () => {
  test('shows the alert and one button, and sends nothing until it is pressed', async () => {
    const server = new FakeServer();
    server.on('GET', '/api/takings/:token', () => taking);
    let taken = 0;
    server.on('POST', '/api/takings/:token', () => {
      taken += 1;
      return { ...taking, takenBy: taking.name, takenAt: '2026-03-03T22:27:05.000Z' };
    });
    const { user } = open(server);
    const button = await screen.findByRole('button', { name: 'Take it as S. Halloway' });
    expect(screen.getAllByRole('button')).toEqual([button]);
    expect(screen.getByText(/nobody at the brakes since 17:25:40/)).toBeInTheDocument();
    expect(screen.getByText('Send somebody to the train.')).toBeInTheDocument();
    expect(taken).toBe(0);
    await user.click(button);
    expect(await screen.findByText('Taken by S. Halloway at 17:27:05.')).toBeInTheDocument();
    expect([taken, screen.queryByRole('button')]).toEqual([1, null]);
  });

  test('says who has it already, and that it is over', async () => {
    const server = new FakeServer();
    server.on('GET', '/api/takings/:token', () => ({
      ...taking,
      takenBy: 'R. Brandreth',
      takenAt: '2026-03-03T22:26:30.000Z',
      clearedAt: '2026-03-03T22:28:00.000Z',
    }));
    open(server);
    expect(await screen.findByText(/R. Brandreth has it since 17:26:30/)).toBeInTheDocument();
    expect(screen.getByText(/Cleared at 17:28:00/)).toBeInTheDocument();
  });

  test('has words for a link that has had its use', async () => {
    const server = new FakeServer();
    server.on('GET', '/api/takings/:token', () => new FakeRefusal('alert.link_unknown'));
    open(server);
    expect(await screen.findByText(/This link was used, has run out/)).toBeInTheDocument();
    expect(screen.queryByRole('button')).toBeNull();
  });
});
