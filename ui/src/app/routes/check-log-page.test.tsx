import type { WireDailyHead, WireLogState } from '@stubpost/shared';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { CheckLogPage } from './check-log-page';

const hash = (letter: string): string => letter.repeat(64);
const whole: WireLogState = {
  chain: {
    state: 'whole',
    checkedTo: 48_377,
    checkedAt: '2026-03-03T22:20:04.000Z',
    tookMilliseconds: 1800,
    faults: [],
    faultCount: 0,
    runningTo: null,
  },
  entries: 48_377,
  head: { sequence: 48_377, hash: hash('d'), receivedAt: '2026-03-03T22:19:00.000Z' },
};
const heads: WireDailyHead[] = [
  {
    date: '2026-03-02',
    sequence: 48_311,
    hash: hash('a'),
    entries: 624,
    publishedAt: '2026-03-03T00:05:00.000Z',
  },
  { date: '2026-03-03', sequence: 48_377, hash: hash('d'), entries: 66, publishedAt: null },
];

function aServer(state: WireLogState | ((request: FakeRequest) => WireLogState) = whole): FakeServer {
  return new FakeServer()
    .on('GET', '/api/terminals', [
      { id: 't1', version: 1, code: 'HBR', name: 'Harbor', zone: 'America/New_York', tracks: [] },
    ])
    .on('GET', '/api/records/state', state)
    .on('GET', '/api/records/heads', heads);
}

const open = (server: FakeServer, path = '/records/check?from=2026-03-01&to=2026-03-02') =>
  renderApp(<CheckLogPage />, { server, path, person: aPersonWith('auditor') });

describe('the page that checks the log', () => {
  it('says in plain words how the chain stands, and gives the newest head in full', async () => {
    open(aServer());
    expect(await screen.findByText('Chain whole')).toBeVisible();
    expect(
      screen.getByText('48,377 entries from no. 1, checked Tue 3 Mar 17:20:04 EST in 1.8 s.'),
    ).toBeVisible();
    expect(screen.getAllByText(`${hash('d')}@48377`)[0]).toBeVisible();
  });

  it('lists the heads of the days, the newest first, and which one still moves', async () => {
    open(aServer());
    const rows = within(await screen.findByRole('table'))
      .getAllByRole('row')
      .slice(1);
    expect(rows.map((row) => within(row).getByRole('rowheader').textContent)).toEqual([
      'Tue 3 Mar 2026no. 48,312 to 48,377',
      'Mon 2 Mar 2026no. 47,688 to 48,311',
    ]);
    expect(within(rows[0] as HTMLElement).getByText('still running, moves on')).toBeVisible();
    expect(within(rows[1] as HTMLElement).getByText('aaaa aaaa aaaa')).toBeVisible();
    expect(within(rows[1] as HTMLElement).getByText('Mon 2 Mar 19:05:00 EST')).toBeVisible();
  });

  it('names what is wrong, and where', async () => {
    const faults = [{ sequence: 1204, words: 'No. 1,204 (e-1): what the entry says was changed.' }];
    open(aServer({ ...whole, chain: { ...whole.chain, state: 'broken', faults, faultCount: 3 } }));
    expect(await screen.findByText('Chain broken at no. 1,204')).toBeVisible();
    const list = screen.getByRole('list', { name: 'What is wrong' });
    expect(
      within(list)
        .getAllByRole('listitem')
        .map((item) => item.textContent),
    ).toEqual(['No. 1,204 (e-1): what the entry says was changed.', 'and 2 more']);
  });

  it('has the server check again, and follows it', async () => {
    const server = aServer(({ query }) => ({
      ...whole,
      chain: { ...whole.chain, runningTo: query.get('again') === 'true' ? 100 : null },
    }));
    const { user } = open(server);
    await user.click(await screen.findByRole('button', { name: 'Check again' }));
    expect(await screen.findByText('A check is running: no. 100 of 48,377.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Checking' })).toBeDisabled();
    expect(server.sent('GET', '/api/records/state').at(-1)?.query.get('again')).toBe('true');
  });

  it('offers log, heads and checker of the chosen days, with the command that checks them', async () => {
    const { router } = open(aServer());
    const addressOf = (name: string) => screen.getByRole('link', { name }).getAttribute('href');
    await screen.findByText('Chain whole');
    expect(addressOf('Log of these days')).toBe('/api/records/log?from=2026-03-01&to=2026-03-02');
    expect(addressOf('Daily heads')).toBe('/api/records/heads?to=2026-03-02');
    expect(addressOf('Checker')).toBe('/api/records/checker');
    fireEvent.change(screen.getByLabelText('Last day, UTC'), { target: { value: '2026-03-03' } });
    await waitFor(() => expect(router.state.location.search).toBe('?from=2026-03-01&to=2026-03-03'));
    expect(addressOf('Log of these days')).toBe('/api/records/log?from=2026-03-01&to=2026-03-03');
    expect(screen.getByLabelText('Command')).toHaveTextContent(
      'node check-log.mjs stubpost-log-2026-03-01-2026-03-03.ndjson --heads stubpost-heads.json --to 2026-03-03',
    );
  });

  it('says what a seal does not prove', async () => {
    open(aServer());
    expect(await screen.findByText(/that what somebody wrote is true/)).toBeVisible();
    expect(screen.getByText(/safe to move/)).toBeVisible();
  });

  it('says in words why it cannot show the state', async () => {
    open(aServer().refuse('GET', '/api/records/state', 'server.busy'));
    expect(await screen.findByRole('alert')).toBeVisible();
  });
});
