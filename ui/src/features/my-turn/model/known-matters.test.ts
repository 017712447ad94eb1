import type { RecordEntryRequest } from '@stubpost/shared';
import { at, aWireTurn, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { knownTurn } from './known-turn';
import { asWireEntry } from './wire-entries';

const ortiz = { id: 'p-ortiz', name: 'Ortiz' };
const desk = { id: 'p-hal', name: 'Halvorsen' };
const id = (digit: number): string => `00000000-0000-4000-8000-00000000000${digit}`;
const base = (digit: number, clock: string) => ({
  id: id(digit),
  observedAt: at(clock),
  source: 'by-hand' as const,
});

const radio: RecordEntryRequest = {
  ...base(1, '17:22'),
  source: 'by-radio',
  saidBy: 'Lindqvist',
  kind: 'step-done',
  step: 'cab-brake-check',
};
const asked = {
  ...withDone(
    aWireTurn(),
    { 'cab-brake-check': '17:22' },
    { source: 'by-radio', entryId: id(1), by: 'Halvorsen', saidBy: 'Lindqvist' },
  ),
  asksAgreement: [
    { entryId: id(1), step: 'cab-brake-check', at: at('17:22'), saidBy: 'Lindqvist', by: 'Halvorsen' },
  ],
};
const know = (turn: typeof asked | ReturnType<typeof aWireTurn>, waiting: RecordEntryRequest[]) =>
  knownTurn({ turn, plan: pushPullPlan, entries: [asWireEntry(radio, desk)], waiting, writer: ortiz }).turn;

describe('a turn with entries under way', () => {
  it('asks no more for what was answered', () => {
    expect(
      know(asked, [{ ...base(2, '17:23'), kind: 'agreed', target: id(1) }]).asksAgreement,
    ).toBeUndefined();
  });

  it('puts a step that the crew does not agree with in question', () => {
    const turn = know(asked, [
      { ...base(2, '17:23'), kind: 'disagreed', target: id(1), reason: 'Not made yet' },
    ]);
    expect(turn.inQuestion?.[0]).toMatchObject({
      step: 'cab-brake-check',
      objections: [{ reason: 'Not made yet', by: 'Ortiz' }],
    });
  });

  it('shows a defect and a briefing at once', () => {
    const turn = know(asked, [
      { ...base(2, '17:23'), kind: 'defect', car: '1406', cause: 'door' },
      { ...base(3, '17:24'), kind: 'briefing' },
    ]);
    expect(turn.defects).toMatchObject([{ car: '1406', cause: 'door', by: 'Ortiz' }]);
    expect(turn.briefedBy).toEqual(['p-ortiz']);
  });

  it('keeps the reliefs that the service told and takes the answer of this person to one', () => {
    const relief = {
      entryId: id(7),
      at: at('17:20'),
      as: 'conductor' as const,
      out: { personId: 'p-cas', name: 'Castellane' },
      in: { personId: 'p-ortiz', name: 'Ortiz' },
      faceToFace: false,
      awaits: 'p-ortiz',
    };
    const turn = know({ ...asked, reliefs: [relief] }, [
      { ...base(2, '17:23'), kind: 'agreed', target: id(7) },
    ]);
    expect(turn.reliefs).toEqual([{ ...relief, faceToFace: true, awaits: null }]);
  });

  it('has nobody in the job that was handed over until the receipt says who, and the writer in one taken over', () => {
    const handOver = { ...base(2, '17:23'), kind: 'relief', as: 'conductor', faceToFace: true } as const;
    expect(know(asked, [{ ...handOver, out: 'p-ortiz', in: 'p-cas' }]).crew).toEqual([]);
    expect(know({ ...asked, crew: [] }, [{ ...handOver, out: 'p-cas', in: 'p-ortiz' }]).crew).toEqual([
      { as: 'conductor', personId: 'p-ortiz', name: 'Ortiz' },
    ]);
  });
});
