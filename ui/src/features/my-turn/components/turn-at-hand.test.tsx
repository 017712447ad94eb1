import type { SignedInPerson, WireTurn } from '@stubpost/shared';
import { screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { replaceDeviceClock } from '../../../lib/use-now';
import { FakeServer } from '../../../testing/fake-server';
import { renderRoutes } from '../../../testing/render-app';
import { at, aWireTurn, ms, pushPullPlan } from '../testing/a-wire-turn';
import { TurnAtHand } from './turn-at-hand';

const conductor: SignedInPerson = {
  id: 'p-ortiz',
  name: 'Ortiz',
  roles: [{ role: 'conductor', terminal: 'HBR' }],
};

function open(turns: WireTurn[]): void {
  const server = new FakeServer()
    .on('GET', '/api/terminals', [
      { id: 'HBR', version: 1, code: 'HBR', name: 'Harbor', zone: 'America/New_York', tracks: [] },
    ])
    .on('GET', '/api/board', { now: at('17:22:41'), terminal: 'HBR', turns })
    .on('GET', '/api/plans/:id', {
      ...pushPullPlan,
      terminal: 'HBR',
      createdAt: at('0:00'),
      createdBy: null,
    });
  const routes = [
    { path: '/my/turn', element: <TurnAtHand /> },
    { path: '/my/turn/:turnId', element: <p>One turn</p> },
    { path: '/my', element: <p>All turns</p> },
  ];
  renderRoutes(routes, { person: conductor, server, path: '/my/turn' });
}

describe('the way to the turn at hand', () => {
  let putBack: () => void;
  beforeEach(() => {
    putBack = replaceDeviceClock(() => ms('17:22:41'));
  });
  afterEach(() => putBack());

  it('leads to the turn one has', async () => {
    open([aWireTurn()]);
    expect(await screen.findByText('One turn')).toBeVisible();
  });

  it('leads to the list when one has none', async () => {
    open([aWireTurn({ crew: [] })]);
    expect(await screen.findByText('All turns')).toBeVisible();
  });
});
