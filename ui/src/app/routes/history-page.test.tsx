import { screen, waitFor, within } from '@testing-library/react';
import type { OnTimeAnswer } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { HistoryPage } from './history-page';

const figures = {
  scheduled: 104,
  counted: 100,
  onTime: 92,
  annulled: 3,
  noRecord: 1,
  share: 0.92,
  interval: { low: 0.85, high: 0.959, confidence: 0.95 },
  delaySeconds: { mean: 21.4, p50: 9, p80: 34, p95: 130 },
};

function answer(query: URLSearchParams): OnTimeAnswer {
  const groupBy = query.get('groupBy');
  const group = groupBy === 'hour' ? { key: '17', label: '17:00' } : { key: '2', label: 'Tuesday' };
  return {
    rule: {
      name: 'left within 0:59 of schedule; early is on time; annulled left out',
      thresholdSeconds: Number(query.get('thresholdSeconds')),
      inclusive: query.get('inclusive') === 'true',
      early: 'on-time',
      annulled: 'left-out',
      point: 'departure from the terminal',
    },
    ...figures,
    groups: [{ ...group, ...figures }],
  };
}

function aServer(): FakeServer {
  return new FakeServer()
    .on('GET', '/api/terminals', () => [
      { id: 't1', version: 1, code: 'HBR', name: 'Harbor', zone: 'America/New_York', tracks: [] },
    ])
    .on('GET', '/api/history/on-time', ({ query }: FakeRequest) => answer(query));
}

describe('history page', () => {
  it('shows the share with its counts, interval, rule and what is not in it', async () => {
    renderApp(<HistoryPage />, { server: aServer(), path: '/history?terminal=HBR' });
    expect(await screen.findByText('92.0 %')).toBeVisible();
    expect(screen.getByText(/92 of 100 departures, interval 85.0 to 95.9 %/)).toBeVisible();
    expect(screen.getByText(/3 annulled, 1 without a record of leaving/)).toBeVisible();
    const table = screen.getByRole('table', { name: 'On time by hour of departure' });
    expect(within(table).getByRole('row', { name: /17:00 104 100 92/ })).toBeVisible();
  });

  it('asks anew when the limit changes, and the address carries it', async () => {
    const { user, router } = renderApp(<HistoryPage />, { server: aServer(), path: '/history?terminal=HBR' });
    const limit = await screen.findByLabelText('On time up to, min:s');
    await user.clear(limit);
    await user.type(limit, '5:59');
    await waitFor(() => expect(router.state.location.search).toContain('limit=359'));
  });

  it('says in words why it has no figures', async () => {
    const server = aServer().refuse('GET', '/api/history/on-time', 'history.range');
    renderApp(<HistoryPage />, { server, path: '/history?terminal=HBR' });
    expect(await screen.findByRole('alert')).toBeVisible();
  });

  it('offers loading of tables only to those who may', async () => {
    const server = aServer().on('GET', '/api/history/imports', () => [
      {
        id: 'i1',
        state: 'refused',
        fileName: 'old.csv',
        rows: 0,
        problems: [{ line: 6, message: 'train is empty' }],
      },
    ]);
    renderApp(<HistoryPage />, { server, path: '/history?terminal=HBR', person: aPersonWith('analyst') });
    expect(await screen.findByText('line 6: train is empty')).toBeVisible();
  });

  it('does not show the loading of tables to a dispatcher', async () => {
    renderApp(<HistoryPage />, { server: aServer(), path: '/history?terminal=HBR' });
    await screen.findByText('92.0 %');
    expect(screen.queryByText('Load past departures')).not.toBeInTheDocument();
  });
});
