import type { WireAlert } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { onTestFinished } from 'vitest';
import { replaceDeviceClock } from '../../lib/use-now';
import { FakeRefusal, FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderApp, type RenderAppOptions } from '../../testing/render-app';
import { aWireAlert, clockAt } from '../../testing/wire-turn';
import { AlertsPage } from './alerts-page';

const iso = (clock: string): string => new Date(clockAt(clock)).toISOString();
const terminal = {
  id: 't',
  version: 1,
  code: 'VAR',
  name: 'Varrow Street Terminal',
  zone: 'America/New_York',
  tracks: [],
};

const alerts: WireAlert[] = [
  aWireAlert({ id: 'a-1', turnId: null, lines: ['ends changed about 17:33, latest 17:31'] }),
  aWireAlert({
    id: 'a-2',
    turnId: 'turn-4',
    subject: 'Track 4, train 1644',
    state: 'taken',
    takenBy: 'R. Dispatcher',
    takenAt: iso('17:24'),
  }),
  aWireAlert({
    id: 'a-3',
    turnId: null,
    subject: 'Track 2, train 1628',
    state: 'cleared',
    clearedAt: iso('16:55'),
    text: 'Air charged not recorded',
  }),
  aWireAlert({
    id: 'a-4',
    turnId: null,
    subject: 'Track 5, train 1610',
    state: 'closed',
    closedAt: iso('15:50'),
    closedCause: 'late relief',
  }),
  aWireAlert({
    id: 'a-5',
    turnId: null,
    subject: 'Track 5, train 1500',
    state: 'closed',
    closedAt: '2026-03-02T20:00:00.000Z',
    closedCause: 'long ago',
  }),
];

function open(options: RenderAppOptions = {}) {
  onTestFinished(replaceDeviceClock(() => clockAt('17:26:40')));
  const server = new FakeServer()
    .on('GET', '/api/terminals', [terminal])
    .on('GET', '/api/turns/:id', new FakeRefusal('turn.unknown'))
    .on('GET', '/api/alerts', ({ query }: FakeRequest) => {
      const state = query.get('state');
      return alerts.filter((alert) =>
        state === null ? ['raised', 'taken', 'set-aside'].includes(alert.state) : alert.state === state,
      );
    })
    .on('POST', '/api/alerts/:id/taking', { ...alerts[0], state: 'taken' })
    .on('POST', '/api/alerts/:id/setting-aside', { ...alerts[0], state: 'set-aside' })
    .on('POST', '/api/alerts/:id/closing', { ...alerts[2], state: 'closed' });
  return renderApp(<AlertsPage />, { server, path: '/alerts', route: '/alerts', ...options });
}

const row = (subject: string) => screen.findByRole('row', { name: new RegExp(subject) });

describe('the page of alerts', () => {
  it('stands in groups, each line read out as time, where, what, what to do, who', async () => {
    open();
    expect(await row('Track 3, train 1742')).toHaveAccessibleName(
      'Act soon, 17:25, Track 3, train 1742. Cab brake check not recorded, latest 17:27. Ask if it is made, or send a second engineer to the leaving cab. dispatcher, engineer P. Varga. nobody has it.',
    );
    const groups = screen.getAllByRole('rowheader').map((header) => header.textContent ?? '');
    expect(groups.filter((text) => /^(Nobody|Taken|Cleared|Closed)/.test(text))).toEqual([
      'Nobody has it1',
      'Taken1',
      'Cleared, waiting for a cause1',
      'Closed today1, the latest first',
    ]);
  });

  it('takes with T and sets aside with S, a reason and half an hour at most', async () => {
    const { user, server } = open();
    (await row('Track 3, train 1742')).focus();
    await user.keyboard('t');
    await waitFor(() =>
      expect(server.sent('POST', '/api/alerts/:id/taking')[0]?.params).toEqual({ id: 'a-1' }),
    );
    await user.keyboard('s');
    await waitFor(() => expect(screen.getByLabelText('Until')).toHaveFocus());
    await user.click(screen.getByRole('button', { name: 'Set aside' }));
    expect(screen.getByText('Give the reason')).toBeVisible();
    expect(server.sent('POST', '/api/alerts/:id/setting-aside')).toEqual([]);
    await user.type(screen.getByLabelText('Reason'), 'second engineer is coming');
    await user.click(screen.getByRole('button', { name: 'Set aside' }));
    await waitFor(() => expect(server.sent('POST', '/api/alerts/:id/setting-aside')).toHaveLength(1));
    const body = server.sent('POST', '/api/alerts/:id/setting-aside')[0]?.body as {
      until: string;
      reason: string;
    };
    expect(body).toEqual({ until: iso('17:36'), reason: 'second engineer is coming' });
  });

  it('closes a cleared alert only with its cause', async () => {
    const { user, server } = open();
    await user.click(within(await row('Track 2, train 1628')).getByRole('button', { name: 'Name cause' }));
    const cause = await screen.findByLabelText('Cause');
    await waitFor(() => expect(cause).toHaveFocus());
    await user.click(screen.getByRole('button', { name: 'Close with this cause' }));
    expect(screen.getByText('Name the cause', { selector: 'div' })).toBeVisible();
    await user.type(cause, 'Late inbound');
    await user.click(screen.getByRole('button', { name: 'Close with this cause' }));
    await waitFor(() =>
      expect(server.sent('POST', '/api/alerts/:id/closing')[0]?.body).toEqual({ cause: 'Late inbound' }),
    );
  });

  it('moves with arrows, has one stop of the Tab key, and shows what is asked for', async () => {
    const { user } = open();
    const first = await row('Track 3, train 1742');
    first.focus();
    await user.keyboard('{ArrowDown}');
    expect(await row('Track 4, train 1644')).toHaveFocus();
    expect(screen.getAllByRole('row').filter((one) => one.tabIndex === 0)).toHaveLength(1);
    await user.click(screen.getByRole('radio', { name: 'Waiting for a cause, 1' }));
    await waitFor(() => expect(first).not.toBeInTheDocument());
    expect(await row('Track 2, train 1628')).toBeVisible();
  });

  it('says why taking did not work', async () => {
    const { user, server } = open();
    server.refuse('POST', '/api/alerts/:id/taking', 'alert.not_standing');
    (await row('Track 3, train 1742')).focus();
    await user.keyboard('t');
    expect(await screen.findByText('This alert no longer stands.')).toBeVisible();
  });

  it('shows an auditor everything and lets them do nothing', async () => {
    open({ person: aPersonWith('auditor') });
    await row('Track 3, train 1742');
    for (const name of ['Take', 'Name cause', 'Set aside']) {
      expect(screen.queryByRole('button', { name })).not.toBeInTheDocument();
    }
  });
});
