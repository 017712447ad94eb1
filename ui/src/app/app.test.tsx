import type { WireAlert, WireTerminal } from '@stubpost/shared';
import { act, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { FakeEventSource } from '../testing/fake-event-source';
import { FakeServer } from '../testing/fake-server';
import { aPersonWith, renderRoutes, type RenderAppOptions } from '../testing/render-app';
import { aWireAlert, aWireTurn, clockAt } from '../testing/wire-turn';
import { setPreferences } from '../lib/preferences';
import { routes } from './router';

const terminals: WireTerminal[] = [
  { id: 't-1', version: 1, code: 'HBR', name: 'Quarry Street', zone: 'America/New_York', tracks: [] },
  { id: 't-2', version: 1, code: 'CAM', name: 'Camden Pier', zone: 'America/New_York', tracks: [] },
];

function aServer(alerts: WireAlert[] = []): FakeServer {
  return new FakeServer()
    .on('GET', '/api/terminals', terminals)
    .on('GET', '/api/alerts', alerts)
    .on('GET', '/api/demo', { demo: true, state: 'ready', people: [] })
    .on('GET', '/api/setup', { needed: false })
    .on('GET', '/api/health', { status: 'ok', version: '0.1.0', schema: 'x', lastSweepAt: null });
}

const open = (path: string, options: RenderAppOptions = {}) =>
  renderRoutes(routes, { ...options, server: options.server ?? aServer(), path });

async function theStream(): Promise<FakeEventSource> {
  await waitFor(() => expect(FakeEventSource.all).not.toHaveLength(0));
  return FakeEventSource.last();
}

describe('the way in', () => {
  test('leads somebody who is not signed in to the sign-in page and back', async () => {
    const server = aServer().refuse('GET', '/api/session', 'session.missing');
    const { router } = open('/people?person=7', { person: null, server });
    await waitFor(() => expect(router.state.location.pathname).toBe('/sign-in'));
    expect(router.state.location.search).toBe('?back=%2Fpeople%3Fperson%3D7');
  });

  test('leads to the set-up when the installation is empty', async () => {
    const server = aServer()
      .refuse('GET', '/api/session', 'session.missing')
      .on('GET', '/api/setup', { needed: true });
    const { router } = open('/', { person: null, server });
    await waitFor(() => expect(router.state.location.pathname).toBe('/welcome'));
  });

  test('says which role has a page that is not one’s own', async () => {
    open('/people');
    expect(
      await screen.findByText('Only a person with the role administrator can open this page.'),
    ).toBeInTheDocument();
  });

  test('asks to sign in again when the session ended elsewhere', async () => {
    const server = aServer().refuse('GET', '/api/people', 'session.missing');
    const { router } = open('/people', { server, person: aPersonWith('administrator') });
    await waitFor(() => expect(router.state.location.pathname).toBe('/sign-in'));
  });

  test('has words for an address without a page', async () => {
    open('/no-such-page');
    expect(await screen.findByRole('heading', { name: 'No page here' })).toBeInTheDocument();
  });
});

describe('the bars of the desk', () => {
  const names = (): string[] =>
    within(screen.getByRole('navigation', { name: 'Pages' }))
      .getAllByRole('link')
      .map(({ textContent }) => textContent ?? '');

  test.each([
    ['dispatcher', ['Board', 'Alerts', 'Roster', 'History', 'Corrections', 'Timetables', 'Set-up', 'Help']],
    [
      'auditor',
      ['Board', 'Alerts', 'History', 'Corrections', 'Check the log', 'Timetables', 'Set-up', 'Help'],
    ],
    ['analyst', ['Board', 'Alerts', 'History', 'Timetables', 'Set-up', 'Help']],
    ['inspector', ['Board', 'Alerts', 'History', 'Set-up', 'Help']],
    [
      'administrator',
      [
        'Board',
        'Alerts',
        'Roster',
        'History',
        'Check the log',
        'Timetables',
        'Set-up',
        'People',
        'Messages',
        'Help',
      ],
    ],
  ] as const)('name the pages that a %s may open, help last', async (role, expected) => {
    open('/me', { person: aPersonWith(role) });
    await screen.findByRole('heading', { name: 'Me' });
    expect(names()).toEqual(expected);
  });

  test('stand in their order and say that this is a demo', async () => {
    open('/me', {
      server: aServer([aWireAlert({ state: 'raised' }), aWireAlert({ id: 'a-2', state: 'taken' })]),
    });
    expect(await screen.findByText('Demo: railroad, people and times are invented')).toBeInTheDocument();
    expect(await screen.findByText('1 not taken')).toBeInTheDocument();
    const banner = screen.getAllByRole('banner')[0];
    const order = [
      /Quarry Street/,
      /\d+ \w{3}/,
      /\d\d:\d\d:\d\d/,
      /2 alerts/,
      /Find train/,
      /R\. Dispatcher, dispatcher/,
    ];
    const text = banner?.textContent ?? '';
    const places = order.map((words) => text.search(words));
    expect(places).toEqual([...places].sort((a, b) => a - b));
    expect(places).not.toContain(-1);
  });

  test('go from terminal to terminal and remember the last', async () => {
    const { user } = open('/me');
    await user.selectOptions(await screen.findByLabelText('Terminal'), 'Camden Pier');
    await waitFor(() => expect(FakeEventSource.last().url).toBe('/api/live?terminal=CAM'));
    expect(localStorage.getItem('stubpost.terminal')).toBe('CAM');
    expect(FakeEventSource.all.filter(({ isClosed }) => !isClosed)).toHaveLength(1);
  });

  test('offer only the terminals of one’s roles', async () => {
    open('/me', { person: aPersonWith('dispatcher', 'CAM') });
    expect(await screen.findByText('Camden Pier')).toBeInTheDocument();
    expect(screen.queryByLabelText('Terminal')).not.toBeInTheDocument();
  });

  test('find with Ctrl-K, arrows and Enter', async () => {
    const server = aServer().on('GET', '/api/find', [
      {
        turnId: 'a',
        terminal: 'HBR',
        serviceDate: '2026-03-03',
        text: '1742 leaves 17:40',
        matched: 'train',
        at: '2026-03-03T22:40:00.000Z',
      },
      {
        turnId: 'b',
        terminal: 'HBR',
        serviceDate: '2026-03-03',
        text: '1744 leaves 18:10',
        matched: 'train',
        at: '2026-03-03T23:10:00.000Z',
      },
    ]);
    const { user, router } = open('/me', { server });
    await screen.findByText('Find train, set, car, person or track');
    await user.keyboard('{Control>}k{/Control}');
    await user.type(await screen.findByRole('combobox', { name: /^Train, set/ }), '174');
    expect(await screen.findByText('2 turns')).toHaveRole('status');
    await user.keyboard('{ArrowDown}');
    expect(screen.getByRole('option', { name: /1744/ })).toHaveAttribute('aria-selected', 'true');
    await user.keyboard('{Enter}');
    await waitFor(() => expect(router.state.location.pathname).toBe('/turns/b'));
  });

  test('give the focus back when find is closed', async () => {
    const { user } = open('/me');
    const signOut = await screen.findByRole('button', { name: 'Sign out' });
    await screen.findByText('Find train, set, car, person or track');
    signOut.focus();
    await user.keyboard('{Control>}k{/Control}');
    expect(await screen.findByRole('combobox', { name: /^Train, set/ })).toHaveFocus();
    await user.keyboard('{Escape}');
    await waitFor(() => expect(signOut).toHaveFocus());
  });

  test('open the keys with "?", unless letters are switched off', async () => {
    const { user, router } = open('/me');
    await screen.findByRole('heading', { name: 'Me' });
    act(() => setPreferences({ letterKeys: false }));
    await user.keyboard('?');
    expect(router.state.location.pathname).toBe('/me');
    act(() => setPreferences({ letterKeys: true }));
    await user.keyboard('?');
    await waitFor(() => expect(router.state.location.pathname).toBe('/keys'));
  });

  test('say that the page is live, and read changes out together', async () => {
    open('/me');
    expect(await screen.findByText('Connecting')).toBeInTheDocument();
    const stream = await theStream();
    act(() => stream.emit('beat'));
    expect(await screen.findByText('Live')).toBeInTheDocument();
    const turn = aWireTurn({ terminal: 'HBR' }, clockAt('16:55'));
    act(() => {
      stream.emit('turn', turn);
      stream.emit('turn', { ...turn, id: 'turn-2' });
    });
    const polite = document.querySelector('[data-region="polite"]');
    await waitFor(() =>
      expect(polite).toHaveTextContent(/^2 turns changed; train 1742 now ready \d\d:\d\d$/),
    );
    expect(document.querySelector('[data-region="act-now"]')).toBeEmptyDOMElement();
  });

  test('read "Act now" out at once and once, without moving the focus', async () => {
    open('/me');
    const stream = await theStream();
    const alert = aWireAlert({
      priority: 'act-now',
      state: 'raised',
      subject: 'Track 3, train 1742',
      text: 'Unsecured',
      action: 'Call the conductor',
    });
    const focused = document.activeElement;
    act(() => stream.emit('alert', alert));
    const region = document.querySelector('[data-region="act-now"]');
    expect(region).toHaveTextContent('Act now. Track 3, train 1742. Unsecured. Call the conductor');
    expect(document.activeElement).toBe(focused);
  });
});

describe('the phone', () => {
  test('has no live timeline and the way back on top', async () => {
    open('/me', { person: aPersonWith('conductor') });
    expect(await screen.findByRole('link', { name: 'My turns' })).toHaveAttribute('href', '/my');
    expect(screen.queryByRole('navigation', { name: 'Pages' })).not.toBeInTheDocument();
    expect(await screen.findByText('Demo')).toBeInTheDocument();
  });
});

describe('help', () => {
  test.each([
    ['/help', 'Help'],
    ['/keys', 'Keys'],
    ['/accessibility', 'Accessibility'],
  ])('%s can be read without a sign-in and stands at the foot of every page', async (path, title) => {
    const server = aServer().refuse('GET', '/api/session', 'session.missing');
    open(path, { person: null, server });
    expect(await screen.findByRole('heading', { level: 1, name: title })).toBeInTheDocument();
    const foot = screen.getByRole('contentinfo');
    expect(within(foot).getByRole('link', { name: title })).toBeInTheDocument();
  });

  test('switches single letters off on the keys page', async () => {
    const { user } = open('/keys');
    await user.click(await screen.findByLabelText('Single-letter keys work in this browser'));
    expect(screen.getAllByText('switched off').length).toBeGreaterThan(0);
  });

  test('carries the caution', async () => {
    open('/help');
    expect(await screen.findByText(/never tells anyone that a train may move safely/)).toBeInTheDocument();
  });
});
