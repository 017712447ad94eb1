import type { WireEntry, WireTurn } from '@stubpost/shared';
import { fireEvent, screen, within } from '@testing-library/react';
import { asWireEntry } from '../model/wire-entries';
import { at, aWireTurn, withDone } from '../testing/a-wire-turn';
import { button, conductor, openTurn, pass, secured, sent, standingClock, touch } from '../testing/turn-page';

standingClock();

const id = (digit: number): string => `00000000-0000-4000-8000-00000000000${digit}`;
const desk = { id: 'p-hal', name: 'Halvorsen' };
const radioEntry: WireEntry = asWireEntry(
  {
    id: id(1),
    kind: 'step-done',
    step: 'cab-brake-check',
    observedAt: at('17:22'),
    source: 'by-radio',
    saidBy: 'Lindqvist',
  },
  desk,
);
const byRadio: WireTurn = {
  ...withDone(
    secured,
    { 'cab-brake-check': '17:22' },
    { source: 'by-radio', saidBy: 'Lindqvist', by: 'Halvorsen', entryId: id(1) },
  ),
  asksAgreement: [
    { entryId: id(1), step: 'cab-brake-check', at: at('17:22'), saidBy: 'Lindqvist', by: 'Halvorsen' },
  ],
};
const ownSet: WireEntry = asWireEntry(
  {
    id: id(2),
    kind: 'step-done',
    step: 'handbrake-set',
    observedAt: at('17:19:52'),
    source: 'by-hand',
    reading: { count: 2, cars: ['1408', '1412'] },
  },
  conductor,
);
const ownSecured = withDone(
  aWireTurn(),
  { 'handbrake-set': '17:19:52' },
  { entryId: id(2), reading: { count: 2, cars: ['1408', '1412'] } },
);
const left = (turn: WireTurn): WireTurn => ({
  ...turn,
  outbound: turn.outbound && { ...turn.outbound, actualDepartureAt: at('17:22') },
});

describe('a step from the radio', () => {
  it('asks the crew, and one touch agrees', async () => {
    const app = await openTurn(byRadio, conductor, [radioEntry]);
    const ask = screen.getByRole('region', { name: 'Cab brake check, by radio' });
    expect(ask).toHaveTextContent('By radio, 17:22 – agree?');
    expect(ask).toHaveTextContent('Said by Lindqvist. Written by Halvorsen.');
    await touch('Agree');
    expect(sent(app)[0]).toMatchObject({ kind: 'agreed', target: id(1) });
    expect(screen.queryByRole('region', { name: 'Cab brake check, by radio' })).toBeNull();
  });

  it('that is not so gives both accounts: the objection with its reason, and the time by the crew', async () => {
    const app = await openTurn(byRadio, conductor, [radioEntry]);
    await touch('Not so');
    expect(button('Not so')).toBeDisabled();
    fireEvent.change(screen.getByLabelText('When it was made, if it was'), { target: { value: '1720' } });
    await touch('Not so');
    await pass(200);
    expect(sent(app)).toEqual([
      expect.objectContaining({
        kind: 'step-done',
        step: 'cab-brake-check',
        source: 'entered-later',
        observedAt: at('17:20'),
      }),
      expect.objectContaining({ kind: 'disagreed', target: id(1), reason: 'Other time: 17:20:00' }),
    ]);
  });

  it('is not asked of somebody who is not on the turn', async () => {
    await openTurn({ ...byRadio, crew: [{ as: 'conductor', personId: 'p-cas', name: 'Castellane' }] });
    expect(screen.queryByText(/agree\?/)).toBeNull();
  });
});

describe('a step in question', () => {
  it('shows both accounts and that the desk rules', async () => {
    await openTurn({
      ...withDone(secured, { 'cab-brake-check': '17:21' }, { state: 'in-question' }),
      inQuestion: [
        {
          step: 'cab-brake-check',
          accounts: [
            { entryId: 'a', at: at('17:21'), source: 'by-hand', by: 'Ortiz', saidBy: null },
            { entryId: 'b', at: at('17:24'), source: 'by-radio', by: 'Halvorsen', saidBy: 'Lindqvist' },
          ],
        },
      ],
    });
    await touch(/Cab brake check: in question/);
    const question = screen.getByRole('region', { name: 'In question' });
    const accounts = within(question).getAllByRole('listitem');
    expect(accounts[0]).toHaveTextContent('17:21:00 by hand, Ortiz');
    expect(accounts[1]).toHaveTextContent('17:24:00 by radio, said by Lindqvist, written by Halvorsen');
    expect(question).toHaveTextContent('The desk rules which one counts');
  });
});

describe('after the departure', () => {
  it('a record is corrected by asking, with the time as it should be and never the plan’s', async () => {
    const app = await openTurn(left(ownSecured), conductor, [ownSet]);
    await touch(/All steps/);
    await touch(/Handbrake set/);
    expect(screen.queryByRole('button', { name: 'Withdraw' })).toBeNull();
    await touch('Ask for correction');
    const time = screen.getByLabelText('Made at, if the time is wrong');
    expect(time).toHaveValue('');
    await touch('Misread');
    expect(button('Ask for it')).toBeDisabled();
    fireEvent.change(time, { target: { value: '172010' } });
    await touch('Ask for it');
    expect(sent(app)[0]).toMatchObject({
      kind: 'corrected',
      target: id(2),
      observedAt: at('17:20:10'),
      madeAt: expect.stringMatching(/^2026-03-03T22:22:41/) as string,
      reason: 'Misread',
    });
  });

  it('shows what was asked for beside what stands, and who decided', async () => {
    const turn: WireTurn = {
      ...left(ownSecured),
      corrections: [
        {
          entryId: 'c',
          target: id(2),
          kind: 'corrected',
          what: 'handbrake-set',
          oldAt: at('17:19:52'),
          newAt: at('17:20:10'),
          oldReading: null,
          newReading: null,
          by: { personId: 'p-ortiz', name: 'Ortiz' },
          reason: 'Misread',
          askedAt: at('17:22'),
          state: 'declined',
          decidedBy: { personId: 'p-rey', name: 'Reyes' },
          decidedAt: at('17:22:30'),
          declinedBecause: 'Heard at 17:19',
        },
      ],
    };
    await openTurn(turn, conductor, [ownSet]);
    await touch(/All steps/);
    await touch(/Handbrake set/);
    const corrections = screen.getByRole('region', { name: 'Corrections' });
    expect(corrections).toHaveTextContent('17:19:52 17:20:10');
    expect(corrections).toHaveTextContent('Declined 17:22:30 by Reyes: Heard at 17:19.');
  });
});

describe('a defect', () => {
  it('is three touches on its page: car, cause, send', async () => {
    const app = await openTurn(secured);
    await touch('Defect');
    expect(screen.getByText('waits for the car')).toBeVisible();
    await touch('1406');
    await touch('Door');
    await touch(/Defect: 1406 door/);
    expect(sent(app)[0]).toMatchObject({ kind: 'defect', car: '1406', cause: 'door' });
    expect(screen.getByText(/^Done/)).toBeVisible();
  });

  it('of no single car names none', async () => {
    const app = await openTurn(secured);
    await touch('Defect');
    await touch('Whole set');
    await touch('Heating');
    await touch(/Defect: set: heating/);
    expect(sent(app)[0]).toMatchObject({ kind: 'defect', car: null, cause: 'heating' });
  });
});

describe('a relief', () => {
  it('names who takes over, and whether face to face', async () => {
    const app = await openTurn(secured);
    app.server.on('GET', '/api/crew', [
      { id: 'p-cas', name: 'Castellane', as: ['conductor'] },
      { id: 'p-osei', name: 'Osei', as: ['engineer'] },
    ]);
    await touch('Hand over');
    await pass(200);
    expect(screen.queryByRole('button', { name: 'Osei' })).toBeNull();
    await touch('Castellane');
    await touch('Face to face');
    expect(sent(app)[0]).toMatchObject({
      kind: 'relief',
      out: 'p-ortiz',
      in: 'p-cas',
      as: 'conductor',
      faceToFace: true,
    });
  });

  it('is confirmed by the other on their own phone, who sees how the train stands', async () => {
    const app = await openTurn({
      ...secured,
      securement: { set: 2, released: 0, carsStillSet: ['1408', '1412'], unsecuredSince: null },
      reliefs: [
        {
          entryId: id(5),
          at: at('17:22'),
          as: 'conductor',
          out: { personId: 'p-cas', name: 'Castellane' },
          in: { personId: 'p-ortiz', name: 'Ortiz' },
          faceToFace: false,
          awaits: 'p-ortiz',
        },
      ],
    });
    const ask = screen.getByRole('region', { name: 'Relief' });
    expect(ask).toHaveTextContent('2 set, cars 1408 and 1412');
    await touch('Yes, face to face');
    expect(sent(app)[0]).toMatchObject({ kind: 'agreed', target: id(5) });
  });

  it('asks the one who was relieved, although the job is somebody else’s now', async () => {
    const app = await openTurn({
      ...secured,
      crew: [{ as: 'conductor', personId: 'p-cas', name: 'Castellane' }],
      reliefs: [
        {
          entryId: id(6),
          at: at('17:22'),
          as: 'conductor',
          out: { personId: 'p-ortiz', name: 'Ortiz' },
          in: { personId: 'p-cas', name: 'Castellane' },
          faceToFace: false,
          awaits: 'p-ortiz',
        },
      ],
    });
    expect(screen.getByText(/Castellane took over from you as conductor/)).toBeVisible();
    await touch('No, not face to face');
    expect(sent(app)[0]).toMatchObject({ kind: 'disagreed', target: id(6), reason: 'Not face to face' });
  });

  it('is what taking a turn from somebody is', async () => {
    const app = await openTurn({
      ...secured,
      crew: [{ as: 'conductor', personId: 'p-cas', name: 'Castellane' }],
    });
    await touch('Not face to face');
    await pass(200);
    expect(sent(app)[0]).toMatchObject({ kind: 'relief', out: 'p-cas', in: 'p-ortiz', faceToFace: false });
    expect(screen.getByRole('region', { name: 'Next step' })).toBeVisible();
  });
});

describe('the safety briefing', () => {
  it('comes before a step from the cab where the terminal asks for it, and the step follows', async () => {
    const app = await openTurn(secured, conductor, [], { briefingRequired: true });
    expect(screen.getByText(/The safety briefing comes first/)).toBeVisible();
    await touch(/Briefing, all agreed/);
    expect(sent(app)[0]).toMatchObject({ kind: 'briefing' });
    await pass(10_500);
    await pass(1500);
    await touch(/Record now/);
    expect(sent(app)[1]).toMatchObject({ step: 'cab-brake-check' });
  });

  it('does not come before a step on the ground', async () => {
    await openTurn(aWireTurn(), conductor, [], { briefingRequired: true });
    expect(screen.queryByText(/safety briefing/)).toBeNull();
  });
});

describe('the phone of somebody who is not of a crew', () => {
  const inspector = {
    id: 'p-ans',
    name: 'Ansell',
    roles: [{ role: 'inspector' as const, terminal: 'HBR' }],
  };
  const dispatcher = { ...desk, roles: [{ role: 'dispatcher' as const, terminal: 'HBR' }] };

  it('puts a blue signal up with one bar', async () => {
    const app = await openTurn(secured, inspector);
    await touch(/Blue signal up/);
    expect(sent(app)[0]).toMatchObject({ kind: 'blue-signal-up' });
  });

  it('takes a blue signal down only with a second bar in another place', async () => {
    const app = await openTurn({ ...secured, blueSignal: { since: at('17:10'), by: 'Ansell' } }, inspector);
    await touch(/Blue signal down/);
    expect(sent(app)).toEqual([]);
    const second = screen.getByRole('region', { name: 'Second touch' });
    fireEvent.click(within(second).getByRole('button', { name: /Blue signal taken down, track 3/ }));
    await pass(200);
    expect(sent(app)[0]).toMatchObject({ kind: 'blue-signal-down' });
  });

  it('annuls with a reason and a second bar, and can go back from it', async () => {
    const app = await openTurn(secured, dispatcher);
    await touch('Annul');
    await touch('Equipment failed');
    await touch('Go on');
    await touch(/^Nothing is recorded yet.*Not yet, go back/);
    expect(sent(app)).toEqual([]);
    await touch('Annul');
    await touch('Equipment failed');
    await touch('Go on');
    await touch(/Annulled: train 1742. Equipment failed/);
    await pass(200);
    expect(sent(app)[0]).toMatchObject({ kind: 'annulled', reason: 'Equipment failed' });
  });
});

describe('for somebody who listens to the page', () => {
  const polite = () => document.querySelector('[data-region="polite"]');

  it('an act of one’s own is said at once, and so is its Undo', async () => {
    await openTurn(secured);
    await touch(/Record now/);
    expect(polite()).toHaveTextContent('Cab brake check, 17:22:41, on phone');
    await pass(1200);
    await touch(/Undo/);
    expect(polite()).toHaveTextContent(/^Undo: Cab brake check, 17:22:4\d, on phone$/);
  });

  it('the focus stays with what was done, and goes on to what is next', async () => {
    await openTurn(secured);
    button(/Record now/).focus();
    await touch(/Record now/);
    expect(document.activeElement).toHaveTextContent('Done 17:22:41');
    await pass(11_000);
    await pass(50);
    expect(screen.getByRole('heading', { name: 'Ends changed' })).toHaveFocus();
    await touch(/All steps/);
    expect(screen.getByRole('heading', { name: 'All steps' })).toHaveFocus();
    await touch('Back');
    expect(screen.getByRole('heading', { name: 'Ends changed' })).toHaveFocus();
  });
});
