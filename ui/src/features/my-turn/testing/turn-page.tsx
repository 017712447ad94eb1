import {
  shippedThresholds,
  type RecordEntryRequest,
  type SignedInPerson,
  type WireEntry,
  type WireTerminalSettings,
  type WireTurn,
} from '@stubpost/shared';
import { act, fireEvent, screen } from '@testing-library/react';
import { afterEach, beforeEach, vi } from 'vitest';
import { FakeServer, type FakeRequest } from '../../../testing/fake-server';
import { renderApp, type RenderedApp } from '../../../testing/render-app';
import { TieUpScreen } from '../components/tie-up-screen';
import { TurnScreen } from '../components/turn-screen';
import { knownTurn } from '../model/known-turn';
import { asWireEntry } from '../model/wire-entries';
import { at, aWireTurn, ms, pushPullPlan, withDone } from './a-wire-turn';

/** The conductor of `aWireTurn`. */
export const conductor: SignedInPerson = {
  id: 'p-ortiz',
  name: 'Ortiz',
  roles: [{ role: 'conductor', terminal: 'HBR' }],
};
export const engineer: SignedInPerson = {
  id: 'p-lind',
  name: 'Lindqvist',
  roles: [{ role: 'engineer', terminal: 'HBR' }],
};
const plan = { ...pushPullPlan, terminal: 'HBR', createdAt: at('0:00'), createdBy: null };
/** The train of `aWireTurn` with its handbrakes set. */
export const secured = withDone(
  aWireTurn(),
  { 'handbrake-set': '17:19:52' },
  { reading: { count: 2, cars: ['1408', '1412'] } },
);

/** Bodies of answers are read in real turns of the loop, whatever the clock says. */
const settle = async (): Promise<void> => {
  for (let turn = 0; turn < 5; turn += 1) await new Promise((resolve) => setImmediate(resolve));
};
/** Lets so much time pass, in steps, so that one answer can lead to the next question. */
export const pass = async (milliseconds: number): Promise<void> => {
  const steps = 5;
  for (let step = 0; step < steps; step += 1) {
    await act(async () => {
      await settle();
      await vi.advanceTimersByTimeAsync(milliseconds / steps);
      await settle();
    });
  }
};

/** A service that takes every entry and gives the turn as it then stands, worked out as the phone does it. */
function takingServer(turn: WireTurn, told: WireEntry[], person: SignedInPerson): FakeServer {
  const taken: RecordEntryRequest[] = [];
  const standing = (): WireTurn => {
    const known = knownTurn({ turn, plan: pushPullPlan, entries: told, waiting: taken, writer: conductor });
    return { ...known.turn, version: turn.version + taken.length };
  };
  return new FakeServer()
    .on('GET', '/api/session', { person })
    .on('GET', '/api/turns/:id', standing)
    .on('GET', '/api/turns/:id/entries', () => [
      ...told,
      ...taken.map((each) => asWireEntry(each, conductor)),
    ])
    .on('GET', '/api/plans/:id', plan)
    .on('GET', '/api/terminals', [])
    .on('GET', '/api/board', { now: at('17:22:41'), terminal: 'HBR', turns: [] })
    .on('POST', '/api/turns/:id/entries', ({ body }: FakeRequest) => {
      taken.push(body as RecordEntryRequest);
      return { sequence: taken.length, hash: 'h', turn: standing() };
    });
}

const settings: WireTerminalSettings = {
  terminal: 'HBR',
  version: 1,
  thresholds: shippedThresholds,
  briefingRequired: false,
  changedAt: null,
  changedBy: null,
};

/** The page of a turn, or of its tie-up, at 17:22:41, longer than a second after it came up. */
export async function openTurn(
  turn: WireTurn,
  person: SignedInPerson = conductor,
  entries: WireEntry[] = [],
  { briefingRequired = false, isTieUp = false }: { briefingRequired?: boolean; isTieUp?: boolean } = {},
) {
  const server = takingServer(turn, entries, person).on('GET', '/api/terminals/:code/settings', {
    ...settings,
    briefingRequired,
  });
  const Page = isTieUp ? TieUpScreen : TurnScreen;
  const app = renderApp(<Page turnId={turn.id} />, { person, server });
  await pass(4000);
  return app;
}

/** What was sent, in order. */
export const sent = (app: RenderedApp): RecordEntryRequest[] =>
  app.server.sent('POST', '/api/turns/:id/entries').map(({ body }) => body as RecordEntryRequest);
export const button = (name: RegExp | string) => screen.getByRole('button', { name });
/** Touches a button by its name. */
export const touch = async (name: RegExp | string) => {
  fireEvent.click(button(name));
  await pass(50);
};

/** 17:22:37 on the clock, standing still but for `pass`. */
export function standingClock(): void {
  beforeEach(() => {
    vi.useFakeTimers({
      now: ms('17:22:37'),
      toFake: ['setTimeout', 'clearTimeout', 'setInterval', 'clearInterval', 'Date'],
    });
    window.scrollTo = () => undefined;
  });
  afterEach(() => {
    vi.useRealTimers();
  });
}
