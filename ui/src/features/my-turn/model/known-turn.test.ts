import type { RecordEntryRequest, WireEntry } from '@stubpost/shared';
import { at, aWireTurn, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { knownTurn } from './known-turn';
import { asWireEntry } from './wire-entries';

const writer = { id: 'p-ortiz', name: 'Ortiz' };
let made = 0;
const anId = (): string => `00000000-0000-4000-8000-${String((made += 1)).padStart(12, '0')}`;
type Reading = { count?: number; cars?: string[] };
const stepDone = (step: string, clock: string, reading?: Reading): RecordEntryRequest => ({
  id: anId(),
  kind: 'step-done',
  observedAt: at(clock),
  source: 'by-hand',
  step,
  ...(reading === undefined ? {} : { reading }),
});
const told = (...requests: RecordEntryRequest[]): WireEntry[] =>
  requests.map((request) => asWireEntry(request, writer));
const know = (waiting: RecordEntryRequest[], entries: WireEntry[] = [], turn = aWireTurn()) =>
  knownTurn({ turn, plan: pushPullPlan, entries, waiting, writer });
const stepOf = (known: ReturnType<typeof know>, key: string) =>
  known.turn.steps.find((step) => step.key === key);

describe('a turn with entries under way', () => {
  it('shows a step as done before there is a receipt', () => {
    const request = stepDone('cab-brake-check', '17:23:08');
    expect(stepOf(know([request]), 'cab-brake-check')).toMatchObject({
      state: 'done',
      doneAt: at('17:23:08'),
      by: 'Ortiz',
      entryId: request.id,
    });
    expect(know([request]).turn.lastHeardAt).toBe(at('17:23:08'));
  });

  it('shows it as open again once it is taken back, sent or not', () => {
    const request = stepDone('cab-brake-check', '17:23:08');
    const back: RecordEntryRequest = {
      id: anId(),
      kind: 'withdrawn',
      observedAt: at('17:23:12'),
      source: 'by-hand',
      target: request.id,
      reason: 'same hand',
    };
    expect(stepOf(know([request, back]), 'cab-brake-check')?.doneAt).toBeNull();
    const turn = withDone(aWireTurn(), { 'cab-brake-check': '17:23:08' }, { entryId: request.id });
    expect(stepOf(know([back], told(request), turn), 'cab-brake-check')?.state).toBe('withdrawn');
  });

  it('leaves the service’s word alone where nothing is under way, even while the entries are old', () => {
    const turn = withDone(aWireTurn(), { 'handbrake-set': '17:20' });
    expect(know([], [], turn).turn).toEqual(turn);
    expect(stepOf(know([stepDone('cab-brake-check', '17:23')], [], turn), 'handbrake-set')?.state).toBe(
      'done',
    );
  });

  it('keeps a release with a smaller count open and names the car', () => {
    const set = stepDone('handbrake-set', '17:20', { count: 2, cars: ['1408', '1412'] });
    const one = stepDone('handbrake-released', '17:36', { count: 1, cars: ['1408'] });
    const known = know([one], told(set));
    expect(stepOf(known, 'handbrake-released')?.doneAt).toBeNull();
    expect(known.handbrakes).toMatchObject({ set: 2, released: 1, carsStillSet: ['1412'] });
    const rest = know(
      [one, stepDone('handbrake-released', '17:36:30', { count: 1, cars: ['1412'] })],
      told(set),
    );
    expect(stepOf(rest, 'handbrake-released')).toMatchObject({ state: 'done', doneAt: at('17:36:30') });
  });

  it('shows an arrival, a departure and the crew under way', () => {
    const coming = aWireTurn({
      crew: [],
      inbound: {
        train: '1741',
        scheduledArrivalAt: at('17:18'),
        expectedArrivalAt: null,
        actualArrivalAt: null,
      },
    });
    const { turn } = know(
      [
        {
          id: anId(),
          kind: 'crew',
          observedAt: at('17:10'),
          source: 'by-hand',
          person: 'p-ortiz',
          as: 'conductor',
        },
        { id: anId(), kind: 'arrival', observedAt: at('17:18:20'), source: 'by-hand' },
        { id: anId(), kind: 'departure', observedAt: at('17:40:05'), source: 'by-hand' },
      ],
      [],
      coming,
    );
    expect(turn.inbound?.actualArrivalAt).toBe(at('17:18:20'));
    expect(turn.outbound?.actualDepartureAt).toBe(at('17:40:05'));
    expect(turn.crew).toEqual([{ as: 'conductor', personId: 'p-ortiz', name: 'Ortiz' }]);
  });

  it('knows no handbrakes until the entries are here, and which steps take them off', () => {
    const loading = { turn: aWireTurn(), plan: pushPullPlan, entries: undefined, waiting: [], writer };
    expect(knownTurn(loading).handbrakes).toBeNull();
    expect([...know([]).releases]).toEqual(['handbrake-released']);
  });
});
