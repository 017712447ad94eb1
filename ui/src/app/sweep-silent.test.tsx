import { screen } from '@testing-library/react';
import { expect, test } from 'vitest';
import { FakeServer } from '../testing/fake-server';
import { renderApp } from '../testing/render-app';
import { SweepSilent } from './sweep-silent';

const health = { status: 'ok', version: '1', schema: 's', lastSweepAt: '2026-03-03T22:26:20.000Z' } as const;

test('a silent sweep is said in words, with its last time and what to do', async () => {
  const server = new FakeServer();
  server.on('GET', '/api/health', () => ({
    ...health,
    status: 'unwell',
    problems: ['the alert sweep is silent'],
  }));
  renderApp(<SweepSilent zone="America/New_York" />, { server });
  const words = await screen.findByText('No alerts are raised.');
  expect(words.closest('p')).toHaveTextContent(
    /No alerts are raised\. There was no alert sweep since 17:26:20\. Watch the turns by radio/,
  );
});

test('a sweep that runs says nothing', async () => {
  const server = new FakeServer();
  server.on('GET', '/api/health', () => health);
  const { client } = renderApp(<SweepSilent zone="America/New_York" />, { server });
  await expect.poll(() => client.isFetching()).toBe(0);
  expect(screen.queryByText('No alerts are raised.')).toBeNull();
});
