import type { RecordEntryRequest, SignedInPerson, WireTurn } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach } from 'vitest';
import { replaceDeviceClock } from '../../../lib/use-now';
import { FakeServer, type FakeRequest } from '../../../testing/fake-server';
import { renderApp } from '../../../testing/render-app';
import { at, aWireTurn, ms, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { MyTurnsScreen } from './my-turns-screen';

const conductor: SignedInPerson = {
  id: 'p-ortiz',
  name: 'Ortiz',
  roles: [{ role: 'conductor', terminal: 'HBR' }],
};
const plan = { ...pushPullPlan, terminal: 'HBR', createdAt: at('0:00'), createdBy: null };
const terminal = (code: string, name: string) => ({
  id: code,
  version: 1,
  code,
  name,
  zone: 'America/New_York',
  tracks: [],
});
const mine = withDone(aWireTurn(), { 'handbrake-set': '17:19:52' });
const free = aWireTurn({
  id: '0c3c9a5e-6f5a-4b57-9f1f-5c9c2b7c8a02',
  crew: [],
  track: '5',
  state: 'scheduled',
  inbound: { train: '1751', scheduledArrivalAt: at('17:50'), expectedArrivalAt: null, actualArrivalAt: null },
  outbound: {
    train: '1752',
    scheduledDepartureAt: at('18:12'),
    heldUntil: null,
    holdReason: null,
    expectedDepartureAt: null,
    actualDepartureAt: null,
  },
});

function serverWith(turns: WireTurn[]): FakeServer {
  return new FakeServer()
    .on('GET', '/api/terminals', [terminal('HBR', 'Harbor Terminal'), terminal('CAM', 'Cameron')])
    .on('GET', '/api/board', ({ query }: FakeRequest) => ({
      now: at('17:22:41'),
      terminal: query.get('terminal') ?? '',
      turns,
    }))
    .on('GET', '/api/plans/:id', plan);
}

let putBack: () => void;
beforeEach(() => {
  putBack = replaceDeviceClock(() => ms('17:22:41'));
  sessionStorage.clear();
});
afterEach(() => {
  putBack();
});

describe('my turns', () => {
  it('come first, and the foot opens the one at hand with its next step', async () => {
    const { server } = renderApp(<MyTurnsScreen />, { person: conductor, server: serverWith([free, mine]) });
    const list = await screen.findByRole('list', { name: 'My turns' });
    expect(within(list).getByRole('link')).toHaveTextContent('17:18 to 17:40, Track 3');
    expect(within(list).getByText('1 of 8 done')).toBeVisible();
    expect(await screen.findByRole('link', { name: /Open train 1742.*Cab brake check/ })).toHaveAttribute(
      'href',
      `/my/turn/${mine.id}`,
    );
    expect(screen.getByText('Tue 3 Mar')).toBeVisible();
    // Only the terminals where the person is crew are asked for, two hours either way.
    expect(
      server
        .sent('GET', '/api/board')
        .map(({ query }) => [query.get('terminal'), query.get('from'), query.get('to')]),
    ).toEqual([['HBR', at('15:20'), at('19:30')]]);
  });

  it('grow by one with one touch', async () => {
    const server = serverWith([free]).on('POST', '/api/turns/:id/entries', ({ body }: FakeRequest) => {
      const { as } = body as RecordEntryRequest & { as: 'conductor' };
      return {
        sequence: 1,
        hash: 'h',
        turn: { ...free, version: 9, crew: [{ as, personId: 'p-ortiz', name: 'Ortiz' }] },
      };
    });
    const { user } = renderApp(<MyTurnsScreen />, { person: conductor, server });
    expect(await screen.findByText('You have no turn yet. Take one below.')).toBeVisible();
    await user.click(
      await screen.findByRole('button', { name: 'I have this turn, train 1752, as conductor' }),
    );
    const list = await screen.findByRole('list', { name: 'My turns' });
    expect(within(list).getByRole('link')).toHaveTextContent('17:50 to 18:12, Track 5');
    await waitFor(() => {
      expect(screen.getByText(/All sent/)).toBeVisible();
    });
    expect(server.sent('POST', '/api/turns/:id/entries')[0]?.body).toMatchObject({
      kind: 'crew',
      person: 'p-ortiz',
      as: 'conductor',
      source: 'by-hand',
    });
  });

  it('are not offered where somebody has the job already', async () => {
    const taken = { ...free, crew: [{ as: 'conductor' as const, personId: 'p-else', name: 'Osei' }] };
    renderApp(<MyTurnsScreen />, { person: conductor, server: serverWith([taken]) });
    expect(await screen.findByText('Osei')).toBeVisible();
    expect(screen.queryByRole('button', { name: /I have this turn/ })).toBeNull();
  });

  it('say in words when there are none', async () => {
    renderApp(<MyTurnsScreen />, { person: conductor, server: serverWith([]) });
    expect(await screen.findByText('No turns at Harbor Terminal in the next two hours.')).toBeVisible();
  });

  it('say when the boards could not be read, and ask again', async () => {
    const server = serverWith([mine]).refuse('GET', '/api/board', 'server.fault');
    const { user } = renderApp(<MyTurnsScreen />, { person: conductor, server });
    const retry = await screen.findByRole('button', { name: 'Retry' });
    server.on('GET', '/api/board', { now: at('17:22:41'), terminal: 'HBR', turns: [mine] });
    await user.click(retry);
    expect(await screen.findByRole('list', { name: 'My turns' })).toBeVisible();
  });
});
