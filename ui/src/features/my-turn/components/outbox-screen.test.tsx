import type { RecordEntryRequest, SignedInPerson } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { createOutboxStore } from '../../../lib/outbox/outbox-store';
import { createTallyBook } from '../../../lib/outbox/outbox-tally';
import { anOutboxEntry } from '../../../testing/an-outbox';
import { FakeServer } from '../../../testing/fake-server';
import { renderApp } from '../../../testing/render-app';
import { aWireTurn } from '../testing/a-wire-turn';
import { OutboxScreen } from './outbox-screen';

const conductor: SignedInPerson = {
  id: 'p-ortiz',
  name: 'Ortiz',
  roles: [{ role: 'conductor', terminal: 'HBR' }],
};
const turn = { ...aWireTurn(), id: 't' };

const aServer = (): FakeServer =>
  new FakeServer()
    .on('GET', '/api/session', { person: conductor })
    .on('GET', '/api/terminals', [])
    .on('GET', '/api/turns/:id', turn)
    .on('GET', '/api/turns/:id/entries', []);

/** Entries that an earlier page left behind, and the count of them. */
async function leftBehind(...ids: string[]): Promise<void> {
  const store = createOutboxStore();
  for (const id of ids) {
    const entry = await store.add(anOutboxEntry({}, id));
    createTallyBook(localStorage).opened('p-ortiz', [entry]);
  }
}

describe('/my/outbox', () => {
  it('says what is on the phone while there is no answer, and sends it at a touch', async () => {
    await leftBehind('a', 'b');
    const server = aServer().refuse('POST', '/api/turns/:id/entries', 'server.busy');
    const { user } = renderApp(<OutboxScreen />, { person: conductor, server });
    const list = await screen.findByRole('list', { name: 'Entries made on this phone' });
    expect(within(list).getAllByText('on phone')).toHaveLength(2);
    expect(await screen.findByText(/^No answer since .* Next try in \d+ s/)).toBeVisible();
    expect(screen.getByText(/Count kept apart agrees: 2 of 2 on this phone/)).toBeVisible();
    let sequence = 48_360;
    server.on('POST', '/api/turns/:id/entries', () => ({ sequence: (sequence += 1), hash: 'h', turn }));
    await user.click(screen.getByRole('button', { name: /Try now/ }));
    expect(await screen.findByText('Train 1742, no. 48,362')).toBeVisible();
    expect(within(list).getAllByText('sent')).toHaveLength(2);
    const order = server
      .sent('POST', '/api/turns/:id/entries')
      .map(({ body }) => (body as RecordEntryRequest).id);
    expect(order.slice(-2)).toEqual(['a', 'b']);
  });

  it('shows why an entry was not taken, and keeps the reason in the list when it was read', async () => {
    await leftBehind('a');
    const server = aServer().refuse('POST', '/api/turns/:id/entries', 'entry.not_yours');
    const { user } = renderApp(<OutboxScreen />, { person: conductor, server });
    await user.click(await screen.findByRole('button', { name: 'I have read it' }));
    expect(await screen.findByText('not taken, read')).toBeVisible();
    expect(screen.getByText(/^Not taken: /)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'I have read it' })).toBeNull();
  });

  it('counts what waits of another person, and shows nothing of it', async () => {
    await createOutboxStore().add(anOutboxEntry({ personId: 'p-else', label: 'Their secret' }, 'x'));
    renderApp(<OutboxScreen />, { person: conductor, server: aServer() });
    expect(await screen.findByText(/1 entry of another person waits on this phone/)).toBeVisible();
    expect(screen.queryByText('Their secret')).toBeNull();
  });

  it('says which entries are lost', async () => {
    createTallyBook(localStorage).opened('p-ortiz', [anOutboxEntry({ label: 'Cab brake check' })]);
    const server = aServer().on('POST', '/api/turns/:id/entries', { sequence: 1, hash: 'h', turn });
    renderApp(<OutboxScreen />, { person: conductor, server });
    const notice = (await screen.findByText('1 entry is lost.')).closest('[role="alert"]');
    expect(notice).toHaveTextContent('Cab brake check, 22:22:41, Train 1742');
    await waitFor(() =>
      expect(server.sent('POST', '/api/turns/:id/entries')[0]?.body).toMatchObject({ kind: 'note' }),
    );
  });
});
