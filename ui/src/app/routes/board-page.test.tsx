import type { Entry, WireAlert, WireTurn } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { onTestFinished } from 'vitest';
import { replaceDeviceClock } from '../../lib/use-now';
import { FakeRefusal, FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderRoutes, type RenderAppOptions } from '../../testing/render-app';
import { aWireAlert, aWireTurn, clockAt, entryAt, madeUuid, wirePlan } from '../../testing/wire-turn';
import { BoardPage } from './board-page';

const now = clockAt('17:10:00');
const terminal = {
  id: 'terminal-1',
  version: 1,
  code: 'VAR',
  name: 'Varrow Street Terminal',
  zone: 'America/New_York',
  tracks: [
    { label: '3', cars: 10, markers: [{ cars: 5, label: '5' }] },
    { label: '4', cars: 4 },
  ],
};
const settings = {
  terminal: 'VAR',
  version: 0,
  thresholds: {
    onTimeSeconds: 59,
    onTimeInclusive: true,
    runningTestMinutes: 20,
    noWordMinutes: 3,
    raiseHoldSeconds: 30,
    clearHoldSeconds: 10,
    clearSlackSeconds: 60,
  },
  briefingRequired: false,
  changedAt: null,
  changedBy: null,
};

const secured = [
  entryAt('arrival', '17:04:10'),
  entryAt('step-done', '17:05:30', { step: 'handbrake-set', reading: { count: 2, cars: ['2235', '4107'] } }),
];
const lateAlert = aWireAlert({ id: 'alert-1', turnId: 'turn-1' });

interface World {
  turns: WireTurn[];
  alerts: WireAlert[];
}

/** A turn that stands on track 3 with its handbrake set, and one that comes in later. */
function world(entries: readonly Entry[] = secured, alerts: WireAlert[] = [lateAlert]): World {
  return {
    turns: [
      aWireTurn({ planned: { id: 'turn-1' }, entries, alerts }, now),
      aWireTurn(
        {
          planned: {
            id: 'turn-2',
            inboundTrain: '1745',
            outboundTrain: '1756',
            track: '4',
            set: '44',
            scheduledArrivalAt: clockAt('17:40'),
            scheduledDepartureAt: clockAt('18:00'),
          },
          crew: [],
        },
        now,
      ),
    ],
    alerts,
  };
}

function serverOf({ turns, alerts }: World): FakeServer {
  const one = ({ params }: FakeRequest) =>
    turns.find((turn) => turn.id === params['id']) ?? new FakeRefusal('turn.unknown');
  return new FakeServer()
    .on('GET', '/api/terminals', [terminal])
    .on('GET', '/api/terminals/:code/settings', settings)
    .on('GET', '/api/board', { now: new Date(now).toISOString(), terminal: 'VAR', turns })
    .on('GET', '/api/plans/:id', wirePlan)
    .on('GET', '/api/alerts', alerts)
    .on('GET', '/api/turns/:id', one)
    .on('GET', '/api/turns/:id/entries', [])
    .on('GET', '/api/crew', [{ id: 'p-quist', name: 'Q. Quist', as: ['engineer'] }])
    .on('GET', '/api/sets', [])
    .on('POST', '/api/turns/:id/entries', ({ params }: FakeRequest) => ({
      sequence: 48231,
      hash: 'h',
      turn: turns.find((turn) => turn.id === params['id']),
    }))
    .on('POST', '/api/alerts/:id/taking', { ...lateAlert, state: 'taken', takenBy: 'R. Dispatcher' });
}

function open(server: FakeServer, options: RenderAppOptions = {}) {
  onTestFinished(replaceDeviceClock(() => now));
  const routes = [
    { path: '/board/:terminal', element: <BoardPage /> },
    { path: '/turns/:turnId', element: <BoardPage /> },
  ];
  return renderRoutes(routes, { path: '/board/VAR?view=table', server, ...options });
}

const row = (train: string) => screen.findByRole('row', { name: new RegExp(`train ${train},`) });
const sentEntries = (server: FakeServer) =>
  server.sent('POST', '/api/turns/:id/entries').map((request) => request.body as Record<string, unknown>);

describe('the board as a table', () => {
  it('reads each turn out in words', async () => {
    open(serverOf(world()));
    expect(await row('1742')).toHaveAccessibleName(
      'Track 3, train 1742, secured, in since 17:04, leaves 17:20, 3 minutes to spare, cab brake check not recorded, due 17:10. 1 alert, not taken.',
    );
    expect(await row('1756')).toHaveAccessibleName(/inbound, due in 17:40, leaves 18:00/);
  });

  it('has one stop of the Tab key, and arrows move inside it', async () => {
    const { user } = open(serverOf(world()));
    const [first, second] = [await row('1742'), await row('1756')];
    expect(screen.getAllByRole('row').filter((one) => one.tabIndex === 0)).toEqual([first]);
    first.focus();
    await user.keyboard('{ArrowDown}');
    await waitFor(() => expect(second).toHaveFocus());
    await user.keyboard('{ArrowUp}{ArrowRight}');
    await waitFor(() => expect(document.activeElement).toHaveTextContent('17:05:30'));
  });

  it('opens the panel with Enter and gives the focus back with Escape', async () => {
    const { user, router } = open(serverOf(world()));
    (await row('1742')).focus();
    await user.keyboard('{Enter}');
    const panel = await screen.findByRole('dialog', { name: /Train 1742/ });
    expect(router.state.location.pathname).toBe('/turns/turn-1');
    await waitFor(() => expect(within(panel).getByRole('heading', { name: /Train 1742/ })).toHaveFocus());
    await user.keyboard('{Escape}');
    await waitFor(async () => expect(await row('1742')).toHaveFocus());
    expect(router.state.location.search).toBe('?view=table');
  });

  it('says how many match when the filter hides all, and clears it', async () => {
    const { user } = open(serverOf(world()), { path: '/board/VAR?view=table&q=9999' });
    expect(await screen.findByText('0 of 2 turns match.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Clear filter' }));
    expect(await row('1742')).toBeVisible();
  });

  it('says that no turns are planned', async () => {
    open(serverOf({ turns: [], alerts: [] }));
    expect(await screen.findByText('No turns planned at this terminal for Tue 3 Mar.')).toBeVisible();
  });

  it('says why the list cannot be read, and asks again', async () => {
    const server = serverOf(world()).refuse('GET', '/api/board', 'server.fault');
    const { user } = open(server);
    expect(await screen.findByText(/could not do this/)).toBeVisible();
    server.on('GET', '/api/board', {
      now: new Date(now).toISOString(),
      terminal: 'VAR',
      turns: world().turns,
    });
    await user.click(screen.getByRole('button', { name: 'Retry' }));
    expect(await row('1742')).toBeVisible();
  });
});

describe('acts of the desk', () => {
  it.each([
    ['the table', '/board/VAR?view=table', () => row('1742')],
    ['the picture', '/board/VAR', () => row('1742')],
    [
      'the panel',
      '/turns/turn-1?terminal=VAR&view=table',
      () => screen.findByRole('heading', { name: /Train 1742/ }),
    ],
  ])('relay a step by radio from %s in at most five keystrokes', async (_place, path, start) => {
    const server = serverOf(world());
    const { user } = open(server, { path });
    const pressed: string[] = [];
    const count = (event: KeyboardEvent): number => pressed.push(event.key);
    document.addEventListener('keydown', count, true);
    onTestFinished(() => document.removeEventListener('keydown', count, true));
    (await start()).focus();
    await user.keyboard('r');
    const when = await screen.findByLabelText('When it happened');
    await waitFor(() => expect(when).toHaveFocus());
    expect(when).toHaveValue('');
    await user.keyboard('2{Enter}');
    await waitFor(() => expect(sentEntries(server)).toHaveLength(1));
    expect(pressed.length).toBeLessThanOrEqual(5);
    expect(sentEntries(server)[0]).toMatchObject({
      kind: 'step-done',
      step: 'cab-brake-check',
      source: 'by-radio',
      saidBy: 'M. Tolland',
      observedAt: '2026-03-03T22:08:00.000Z',
    });
    expect(await screen.findByText(/recorded, no. 48,231/)).toBeVisible();
    expect(screen.queryByRole('dialog', { name: 'Relay a step' })).not.toBeInTheDocument();
  });

  it('relay what happened just now with R and Enter alone', async () => {
    const server = serverOf(world());
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('r');
    await waitFor(() => expect(screen.getByLabelText('When it happened')).toHaveFocus());
    await user.keyboard('{Enter}');
    await waitFor(() => expect(sentEntries(server)).toHaveLength(1));
    expect(sentEntries(server)[0]).toMatchObject({ observedAt: new Date(now).toISOString() });
  });

  it('send an entry again with the same id when no answer came', async () => {
    const server = serverOf(world());
    let tries = 0;
    const turn = world().turns[0];
    server.on('POST', '/api/turns/:id/entries', () => {
      tries += 1;
      return tries < 2 ? new FakeRefusal('server.fault') : { sequence: 7, hash: 'h', turn };
    });
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('n');
    await user.type(await screen.findByRole('textbox', { name: 'Note' }), 'door 3 slow');
    await user.click(screen.getByRole('button', { name: 'Record' }));
    await waitFor(() => expect(sentEntries(server)).toHaveLength(2));
    const [first, second] = sentEntries(server);
    expect(second).toEqual(first);
  });

  it('keep the id when the person tries again after the page gave up, and take a new one for other words', async () => {
    const server = serverOf(world()).refuse('POST', '/api/turns/:id/entries', 'server.busy');
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('n');
    await user.type(await screen.findByRole('textbox', { name: 'Note' }), 'door 3 slow');
    await user.click(screen.getByRole('button', { name: 'Record' }));
    await user.click(await screen.findByRole('button', { name: 'Try again' }, { timeout: 8000 }));
    await screen.findByRole('button', { name: 'Try again' }, { timeout: 8000 });
    const ids = new Set(sentEntries(server).map((body) => body['id']));
    expect(ids.size).toBe(1);
    server.on('POST', '/api/turns/:id/entries', { sequence: 8, hash: 'h', turn: world().turns[0] });
    await user.type(screen.getByRole('textbox', { name: 'Note' }), '!');
    await user.click(screen.getByRole('button', { name: 'Record' }));
    await waitFor(() => expect(sentEntries(server).some((body) => !ids.has(body['id']))).toBe(true));
  }, 30_000);

  it('ask a second time, elsewhere, before handbrakes are recorded as released', async () => {
    const server = serverOf(world());
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('r');
    await user.selectOptions(await screen.findByLabelText('Step'), 'handbrake-released');
    await user.click(screen.getByLabelText('2235'));
    await user.click(screen.getByLabelText('4107'));
    screen.getByLabelText('When it happened').focus();
    await user.keyboard('{Enter}');
    const bar = await screen.findByRole('button', {
      name: 'Release 2 handbrakes, cars 2235 and 4107, train 1742, track 3',
    });
    expect(sentEntries(server)).toEqual([]);
    await user.click(bar);
    await waitFor(() => expect(sentEntries(server)).toHaveLength(1));
    expect(sentEntries(server)[0]).toMatchObject({ reading: { count: 2, cars: ['2235', '4107'] } });
  });

  it('take an alert with T and do nothing with it when the person may not', async () => {
    const server = serverOf(world());
    const { user, unmount } = open(server);
    (await row('1742')).focus();
    await user.keyboard('t');
    await waitFor(() => expect(server.sent('POST', '/api/alerts/:id/taking')).toHaveLength(1));
    unmount();
    const other = serverOf(world());
    const again = open(other, { person: aPersonWith('planner') });
    (await row('1742')).focus();
    await again.user.keyboard('tr');
    expect(other.sent('POST', '/api/alerts/:id/taking')).toEqual([]);
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
  });

  it('say why an alert could not be taken', async () => {
    const server = serverOf(world()).refuse('POST', '/api/alerts/:id/taking', 'alert.not_standing');
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('t');
    expect(await screen.findByText('This alert no longer stands.')).toBeVisible();
  });

  it('are taken back within ten seconds by the same hand', async () => {
    const server = serverOf(world());
    const { user } = open(server);
    (await row('1742')).focus();
    await user.keyboard('n');
    await user.type(await screen.findByRole('textbox', { name: 'Note' }), 'wrong train');
    await user.click(screen.getByRole('button', { name: 'Record' }));
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() => expect(sentEntries(server)).toHaveLength(2));
    const [note, undo] = sentEntries(server);
    expect(undo).toMatchObject({ kind: 'withdrawn', target: note?.['id'] });
    expect(await screen.findByText('Taken back.')).toBeVisible();
  });

  it('enter an extra turn, which then is open', async () => {
    const server = serverOf(world());
    const extra = aWireTurn({ planned: { id: madeUuid(), outboundTrain: '9742' }, extra: true }, now);
    server.on('POST', '/api/turns', extra).on('GET', '/api/turns/:id', extra);
    const { user, router } = open(server);
    await user.click(await screen.findByRole('button', { name: 'Extra turn' }));
    await user.type(await screen.findByLabelText('Inbound train'), '9731');
    await user.type(screen.getByLabelText('Arrives'), '1715');
    await user.type(screen.getByLabelText('Outbound train'), '9742');
    await user.type(screen.getByLabelText('Leaves'), '17:30');
    await user.click(screen.getByRole('button', { name: 'Add turn' }));
    await waitFor(() => expect(router.state.location.pathname).toBe(`/turns/${extra.id}`));
    expect(server.sent('POST', '/api/turns')[0]?.body).toMatchObject({
      inbound: { train: '9731', scheduledArrivalAt: '2026-03-03T22:15:00.000Z' },
      outbound: { train: '9742', scheduledDepartureAt: '2026-03-03T22:30:00.000Z' },
    });
  });
});

describe('the panel of a turn', () => {
  it('opens by its address alone, over the board of its terminal', async () => {
    const { router } = open(serverOf(world()), { path: '/turns/turn-1' });
    expect(await screen.findByRole('dialog', { name: /Train 1742/ })).toBeVisible();
    expect(router.state.location.search).toBe('?terminal=VAR');
  });

  it('keeps what is being typed while somebody else’s entry comes in', async () => {
    const { user, client } = open(serverOf(world()), { path: '/turns/turn-1?terminal=VAR&view=table' });
    const panel = await screen.findByRole('dialog', { name: /Train 1742/ });
    await user.click(within(panel).getByRole('button', { name: 'Note' }));
    await user.type(await screen.findByRole('textbox', { name: 'Note' }), 'half a sen');
    const later = aWireTurn(
      {
        planned: { id: 'turn-1' },
        entries: [...secured, entryAt('step-done', '17:08', { step: 'cab-brake-check' })],
      },
      now,
    );
    client.setQueryData(['turns', 'detail', 'turn-1'], later);
    await waitFor(() => expect(within(panel).getByText('17:08:00')).toBeInTheDocument());
    expect(screen.getByRole('textbox', { name: 'Note' })).toHaveValue('half a sen');
  });

  it('shows two accounts side by side, and records which one counts', async () => {
    const radio = entryAt('step-done', '17:08:00', {
      ...{ step: 'cab-brake-check', source: 'by-radio', saidBy: 'P. Varga' },
    });
    const twice = [...secured, entryAt('step-done', '17:06:10', { step: 'cab-brake-check' }), radio];
    const server = serverOf(world(twice));
    const { user } = open(server, { path: '/turns/turn-1?terminal=VAR&view=table' });
    const block = await screen.findByRole('region', { name: 'In question' });
    expect(block).toHaveTextContent(
      'Two times for cab brake check: 17:06:10 by hand (M. Tolland), 17:08:00 by radio (P. Varga). Which one?',
    );
    await user.click(within(block).getByRole('button', { name: /17:08:00 by radio/ }));
    await waitFor(() => expect(sentEntries(server)).toHaveLength(1));
    expect(sentEntries(server)[0]).toMatchObject({
      kind: 'ruled',
      target: radio.id,
      considered: [twice[2]?.id, radio.id],
    });
    expect(await screen.findByText(/Ruling recorded/)).toBeVisible();
  });

  it('asks for a correction once the train has left, old beside new', async () => {
    const check = entryAt('step-done', '17:06:10', { step: 'cab-brake-check' });
    const server = serverOf(world([...secured, check, entryAt('departure', '17:09:30')]));
    const { user } = open(server, { path: '/turns/turn-1?terminal=VAR&view=table' });
    await user.click(await screen.findByRole('button', { name: /Cab brake check, ask for correction/ }));
    const form = await screen.findByRole('dialog', { name: 'Ask for a correction' });
    expect(within(form).getByText('17:06:10')).toBeVisible();
    await user.type(within(form).getByLabelText('Should be'), '1705');
    await user.selectOptions(within(form).getByLabelText('Reason'), 'wrong time');
    await user.click(within(form).getByRole('button', { name: 'Ask for it' }));
    await waitFor(() => expect(sentEntries(server)).toHaveLength(1));
    expect(sentEntries(server)[0]).toMatchObject({
      kind: 'corrected',
      target: check.id,
      observedAt: '2026-03-03T22:05:00.000Z',
      madeAt: new Date(now).toISOString(),
      reason: 'wrong time',
    });
  });

  it('never has a time in a form when it opens', async () => {
    const { user } = open(serverOf(world([])), { path: '/turns/turn-1?terminal=VAR&view=table' });
    await user.click(await screen.findByRole('button', { name: 'Arrived' }));
    expect(await screen.findByLabelText('When it happened')).toHaveValue('');
  });

  it('offers an inspector blue signals and nothing of the desk’s', async () => {
    open(serverOf(world()), {
      path: '/turns/turn-1?terminal=VAR&view=table',
      person: aPersonWith('inspector'),
    });
    expect(await screen.findByRole('button', { name: 'Put up' })).toBeVisible();
    for (const name of ['Left', 'Hold', 'Annul', 'Move track', 'Relay by radio']) {
      expect(screen.queryByRole('button', { name })).not.toBeInTheDocument();
    }
  });
});
