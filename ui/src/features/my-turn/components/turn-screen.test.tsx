import type { RecordEntryRequest } from '@stubpost/shared';
import { act, fireEvent, screen, within } from '@testing-library/react';
import { patchTurn } from '../../../lib/live-patch';
import { FakeRefusal } from '../../../testing/fake-server';
import { asWireEntry } from '../model/wire-entries';
import { at, aWireTurn, ms, withDone } from '../testing/a-wire-turn';
import {
  button,
  conductor,
  engineer,
  openTurn,
  pass,
  secured,
  sent,
  standingClock,
  touch,
} from '../testing/turn-page';

standingClock();

describe('the bar', () => {
  it('records the next step by hand at the moment of the touch, shows it done and what comes after', async () => {
    const app = await openTurn(secured);
    expect(screen.getByRole('heading', { name: 'Cab brake check' })).toBeVisible();
    await touch(/Record now/);
    expect(sent(app)).toEqual([
      expect.objectContaining({
        kind: 'step-done',
        step: 'cab-brake-check',
        source: 'by-hand',
        observedAt: at('17:22:41'),
      }),
    ]);
    expect(screen.getByText('Done 17:22:41')).toBeVisible();
    expect(within(screen.getByRole('region', { name: 'After this' })).getByRole('heading')).toHaveTextContent(
      'Ends changed',
    );
  });

  it('takes no touch for a second after the step under it changed by itself', async () => {
    const app = await openTurn(secured);
    const byRadio = withDone(
      secured,
      { 'cab-brake-check': '17:22' },
      { source: 'by-radio', saidBy: 'Lindqvist', by: 'Halvorsen' },
    );
    act(() => {
      patchTurn(app.client, { ...byRadio, version: 4 }, ms('17:22:41'));
    });
    await pass(0);
    await touch(/Ends changed/);
    expect(sent(app)).toEqual([]);
    expect(screen.getByText('Cab brake check by radio, 17:22:00, said by Lindqvist')).toBeVisible();
    await pass(1000);
    await touch(/Ends changed/);
    expect(sent(app)).toHaveLength(1);
  });

  it('offers Undo for ten seconds, deaf for the first, and sends the withdrawal of the same entry', async () => {
    const app = await openTurn(secured);
    await touch(/Record now/);
    await touch(/Undo/);
    expect(sent(app)).toHaveLength(1);
    await pass(1200);
    await touch(/Undo/);
    const [done, undone] = sent(app);
    expect(undone).toMatchObject({ kind: 'withdrawn', target: done?.id, reason: 'withdrawn by same hand' });
    expect(screen.queryByRole('button', { name: /Undo/ })).toBeNull();
  });

  it('goes on to the next step after ten seconds, again deaf for a second', async () => {
    const app = await openTurn(secured);
    await touch(/Record now/);
    await pass(10_000);
    await touch(/Ends changed/);
    expect(sent(app)).toHaveLength(1);
    await pass(1000);
    await touch(/Ends changed/);
    expect(sent(app)[1]).toMatchObject({ step: 'ends-changed' });
  });
});

describe('entries that are not sent', () => {
  it('stay on the phone, are counted, and are tried again with the same id', async () => {
    const app = await openTurn(secured);
    app.server.on('POST', '/api/turns/:id/entries', new FakeRefusal('server.busy'));
    await touch(/Record now/);
    expect(screen.getByRole('link', { name: /On phone, not sent \(1\)/ })).toHaveAttribute(
      'href',
      '/my/outbox',
    );
    app.server.on('POST', '/api/turns/:id/entries', { sequence: 1, hash: 'h', turn: secured });
    await pass(1100);
    const ids = sent(app).map(({ id }) => id);
    expect(ids).toHaveLength(2);
    expect(new Set(ids).size).toBe(1);
    await pass(200);
    expect(screen.getByRole('link', { name: /All sent/ })).toBeVisible();
  });
});

describe('counts and readings', () => {
  it('waits for the cars and sends their number', async () => {
    const app = await openTurn(aWireTurn());
    expect(screen.getByText('waits for the cars')).toBeVisible();
    await touch('1412');
    await touch('1408');
    await touch(/Set: 1408 and 1412/);
    expect(sent(app)[0]).toMatchObject({
      step: 'handbrake-set',
      reading: { count: 2, cars: ['1408', '1412'] },
    });
  });

  it('has no pressure before one is typed, and can say that there is no reading', async () => {
    const tillEnds = withDone(secured, { 'cab-brake-check': '17:21', 'ends-changed': '17:22' });
    const late = {
      ...tillEnds,
      outbound:
        tillEnds.outbound === null ? null : { ...tillEnds.outbound, scheduledDepartureAt: at('17:27') },
    };
    const app = await openTurn(late);
    expect(screen.getByText('nothing yet')).toBeInTheDocument();
    expect(screen.getByText('waits for the reading')).toBeVisible();
    for (const digit of ['1', '1', '0']) await touch(digit);
    await touch('Erase');
    await touch('0');
    await touch(/In leaving cab: 110 psi/);
    expect(sent(app)[0]).toMatchObject({ step: 'engineer-in-cab', reading: { brakePipePsi: 110 } });
  });

  it('asks for a release a second time in another place, as a record, and keeps a smaller count open', async () => {
    const inCab = withDone(secured, {
      'cab-brake-check': '17:20',
      'ends-changed': '17:21',
      'engineer-in-cab': '17:22',
    });
    const set: RecordEntryRequest = {
      id: '00000000-0000-4000-8000-000000000001',
      kind: 'step-done',
      step: 'handbrake-set',
      observedAt: at('17:19:52'),
      source: 'by-hand',
      reading: { count: 2, cars: ['1408', '1412'] },
    };
    const app = await openTurn(inCab, conductor, [asWireEntry(set, conductor)]);
    app.server.on('POST', '/api/turns/:id/entries', new FakeRefusal('server.busy'));
    await touch(/1408/);
    await touch(/Released: 1408/);
    expect(sent(app)).toEqual([]);
    expect(screen.getByText(/does not say that the train may move safely/)).toBeVisible();
    await pass(1000);
    await touch(/Released: 1 handbrake, car 1408/);
    expect(sent(app)[0]).toMatchObject({ step: 'handbrake-released', reading: { count: 1, cars: ['1408'] } });
    await pass(10_500);
    expect(screen.getByRole('heading', { name: '1 of 2 handbrakes released' })).toBeVisible();
    expect(screen.getByText(/Car 1412 still set\./)).toBeVisible();
    expect(button(/Released: 1412/)).toBeVisible();
    await touch('Release it');
    expect(button(/Released: 1 handbrake, car 1412/)).toBeVisible();
  });
});

describe('out of order', () => {
  it('shuts the bar with its reason and records all the same when it has happened', async () => {
    const app = await openTurn(secured);
    await touch(/All steps/);
    await touch(/Ends changed/);
    expect(screen.getByText('waits for: Cab brake check')).toBeVisible();
    expect(screen.queryByRole('button', { name: /Record now/ })).toBeNull();
    await touch('It has happened: record it');
    await touch(/Record now/);
    expect(sent(app)[0]).toMatchObject({ step: 'ends-changed' });
  });

  it('names a blue signal', async () => {
    const ready = withDone(secured, { 'cab-brake-check': '17:20', 'ends-changed': '17:21' });
    await openTurn({ ...ready, blueSignal: { since: at('17:10'), by: 'Marsh' } });
    expect(screen.getByText('blue signal up')).toBeVisible();
    expect(screen.getByText(/up since 17:10:00, Marsh/)).toBeVisible();
    expect(screen.queryByRole('group', { name: /Number pad/ })).toBeNull();
    await touch('It has happened: record it');
    expect(screen.getByRole('group', { name: /Number pad/ })).toBeVisible();
  });

  it('records an act for earlier with the time the person gives', async () => {
    const app = await openTurn(secured);
    await touch('Earlier');
    expect(screen.getByText('waits for the time')).toBeVisible();
    fireEvent.change(screen.getByLabelText(/Or the time/), { target: { value: '1721' } });
    await touch(/Record for earlier/);
    expect(sent(app)[0]).toMatchObject({ source: 'entered-later', observedAt: at('17:21') });
  });
});

describe('the engineer’s phone', () => {
  it('records nothing at the controls, shows no facts, and says who can', async () => {
    const turn = withDone(
      aWireTurn({
        crew: [
          { as: 'engineer', personId: 'p-lind', name: 'Lindqvist' },
          { as: 'conductor', personId: 'p-ortiz', name: 'Ortiz' },
        ],
      }),
      { 'engineer-in-cab': '17:22' },
    );
    await openTurn(turn, engineer);
    expect(screen.getByRole('heading', { name: 'No entry from this phone at the controls' })).toBeVisible();
    expect(screen.getByText('Conductor Ortiz records it')).toBeVisible();
    expect(screen.queryByRole('button', { name: /Record now/ })).toBeNull();
    expect(screen.queryByText(/to spare/)).toBeNull();
  });
});

describe('other ways', () => {
  it('takes the turn in one touch', async () => {
    const app = await openTurn(aWireTurn({ crew: [] }));
    await touch(/I have this turn/);
    expect(sent(app)[0]).toMatchObject({ kind: 'crew', person: 'p-ortiz', as: 'conductor' });
    expect(screen.getByRole('region', { name: 'Next step' })).toBeVisible();
  });

  it('says why a step cannot be done, and sends a note', async () => {
    const app = await openTurn(secured);
    await touch('Can’t do');
    expect(screen.queryByRole('button', { name: 'Waiting for the conductor' })).toBeNull();
    await touch('Waiting for the engineer');
    await touch('Send to desk');
    expect(sent(app)[0]).toMatchObject({
      kind: 'cannot-do',
      step: 'cab-brake-check',
      reason: 'Waiting for the engineer',
    });
    await touch('Desk');
    fireEvent.change(screen.getByLabelText('What the desk should know'), {
      target: { value: 'Door 3 slow' },
    });
    await touch('Send to desk');
    expect(sent(app)[1]).toMatchObject({ kind: 'note', note: 'Door 3 slow' });
  });

  it('withdraws one’s own entry with a reason, and only one’s own', async () => {
    const own = withDone(
      aWireTurn(),
      { 'handbrake-set': '17:19:52' },
      { entryId: '00000000-0000-4000-8000-000000000001' },
    );
    const entry = asWireEntry(
      {
        id: '00000000-0000-4000-8000-000000000001',
        kind: 'step-done',
        step: 'handbrake-set',
        observedAt: at('17:19:52'),
        source: 'by-hand',
      },
      conductor,
    );
    const app = await openTurn(own, conductor, [entry]);
    await touch(/^Withdraw/);
    await touch('Wrong train');
    await touch('Withdraw it');
    expect(sent(app)[0]).toMatchObject({ kind: 'withdrawn', target: entry.id, reason: 'Wrong train' });
  });

  it('offers no Withdraw for an entry of somebody else', async () => {
    await openTurn(secured);
    expect(screen.getByText(/Handbrake set 17:19:52/)).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Withdraw/ })).toBeNull();
  });
});
