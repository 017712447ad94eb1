import type { ListedCorrection } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { FakeRefusal, FakeServer } from '../../testing/fake-server';
import { aPersonWith, renderRoutes, type RenderAppOptions } from '../../testing/render-app';
import { aWireTurn, clockAt } from '../../testing/wire-turn';
import { CorrectionsPage } from './corrections-page';

const terminal = {
  ...{ id: 'terminal-1', version: 1, code: 'VAR', name: 'Varrow Street Terminal' },
  ...{ zone: 'America/New_York', tracks: [] },
};
const iso = (clock: string): string => new Date(clockAt(clock)).toISOString();

function aCorrection(overrides: Partial<ListedCorrection> = {}): ListedCorrection {
  return {
    ...{ entryId: 'c-1', target: 'e-1', turnId: 'turn-1', terminal: 'VAR', zone: terminal.zone },
    ...{ serviceDate: '2026-03-03', track: '3', inboundTrain: '1741', outboundTrain: '1742' },
    ...{ kind: 'corrected', what: 'cab-brake-check', whatLabel: 'Cab brake check', state: 'waiting' },
    ...{ oldAt: iso('17:25:00'), newAt: iso('17:22:41'), oldReading: null, newReading: null },
    ...{ by: { personId: 'p-ortiz', name: 'A. Ortiz' }, reason: 'misread', askedAt: iso('18:02:10') },
    ...overrides,
  };
}

function serverOf(list: ListedCorrection[]): FakeServer {
  return new FakeServer()
    .on('GET', '/api/terminals', [terminal])
    .on('GET', '/api/records/corrections', list)
    .on('POST', '/api/turns/:id/entries', {
      ...{ sequence: 7, hash: 'h' },
      turn: aWireTurn({ planned: { id: 'turn-1' } }, clockAt('18:10')),
    });
}

const open = (server: FakeServer, options: RenderAppOptions = {}) =>
  renderRoutes([{ path: '/records/corrections', element: <CorrectionsPage /> }], {
    path: '/records/corrections',
    person: aPersonWith('supervisor'),
    server,
    ...options,
  });
const card = () => screen.findByRole('article', { name: 'Train 1742, track 3: cab brake check' });
const decisions = (server: FakeServer) =>
  server.sent('POST', '/api/turns/:id/entries').map((request) => request.body as Record<string, unknown>);

describe('the page of corrections', () => {
  it('shows old and new side by side, who asked and why', async () => {
    open(serverOf([aCorrection()]));
    const row = within(await card()).getByRole('row', { name: /^Time/ });
    expect(
      within(row)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    ).toEqual(['17:25:00', '17:22:41']);
    expect(within(await card()).getByText('misread')).toBeVisible();
    expect(within(await card()).getByText(/Correction asked for .* by A. Ortiz/)).toBeVisible();
  });

  it('says of a withdrawal that the record is not to stand', async () => {
    open(serverOf([aCorrection({ kind: 'withdrawn', newAt: null, oldReading: { count: 2 } })]));
    expect(within(await card()).getAllByText('not to stand')).toHaveLength(2);
  });

  it('sends a supervisor’s yes, and asks for the list again', async () => {
    const server = serverOf([aCorrection()]);
    const { user } = open(server);
    await user.click(within(await card()).getByRole('button', { name: 'Approve' }));
    await waitFor(() => expect(decisions(server)).toHaveLength(1));
    expect(decisions(server)[0]).toMatchObject({ kind: 'correction-approved', target: 'c-1' });
    await waitFor(() =>
      expect(server.sent('GET', '/api/records/corrections').length).toBeGreaterThanOrEqual(2),
    );
  });

  it('takes a no only with its reason', async () => {
    const server = serverOf([aCorrection()]);
    const { user } = open(server);
    await user.click(within(await card()).getByRole('button', { name: 'Decline' }));
    await user.click(screen.getByRole('button', { name: 'Decline it' }));
    expect(screen.getByText('Give the reason')).toBeVisible();
    await user.type(screen.getByLabelText('Why it is declined'), 'the recorder agrees');
    await user.click(screen.getByRole('button', { name: 'Decline it' }));
    await waitFor(() => expect(decisions(server)).toHaveLength(1));
    expect(decisions(server)[0]).toMatchObject({
      ...{ kind: 'correction-declined', target: 'c-1', reason: 'the recorder agrees' },
    });
  });

  it('leaves an own request to somebody else', async () => {
    const supervisor = aPersonWith('supervisor');
    open(serverOf([aCorrection({ by: { personId: supervisor.id, name: supervisor.name } })]), {
      person: supervisor,
    });
    expect(within(await card()).getByText(/somebody else has to decide/)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Approve' })).not.toBeInTheDocument();
  });

  it('names who decides to those who read only', async () => {
    open(serverOf([aCorrection()]), { person: aPersonWith('dispatcher') });
    expect(
      await screen.findByText('Only the supervisor of Varrow Street Terminal can approve this.'),
    ).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Approve' })).not.toBeInTheDocument();
  });

  it('says what was decided, in the list of all', async () => {
    const declined = aCorrection({
      ...{ state: 'declined', decidedAt: iso('18:10:00'), declinedBecause: 'the recorder agrees' },
      decidedBy: { personId: 'p-2', name: 'L. Reyes' },
    });
    const { user, router } = open(serverOf([declined]));
    await user.click(await screen.findByText('All'));
    expect(router.state.location.search).toBe('?state=all');
    expect(within(await card()).getByText(/^Declined .* by L. Reyes: the recorder agrees$/)).toBeVisible();
  });

  it('says that none waits, and why one could not be decided', async () => {
    const { unmount } = open(serverOf([]));
    expect(await screen.findByText('No correction waits at Varrow Street Terminal.')).toBeVisible();
    unmount();
    const server = serverOf([aCorrection()]).on(
      'POST',
      '/api/turns/:id/entries',
      new FakeRefusal('entry.own_request'),
    );
    const { user } = open(server);
    await user.click(within(await card()).getByRole('button', { name: 'Approve' }));
    expect(await screen.findByText(/Somebody else has to decide on it/)).toBeVisible();
  });
});
