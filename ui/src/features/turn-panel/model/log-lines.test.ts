import type { WireCorrection, WireEntry } from '@stubpost/shared';
import { logLines } from './log-lines';

const zone = 'America/New_York';
const iso = (clock: string): string => `2026-03-03T${clock}.000Z`;
const ortiz = { id: 'p-1', name: 'A. Ortiz' };
const reyes = { personId: 'p-2', name: 'L. Reyes' };

let made = 0;
function entry(id: string, fields: Partial<WireEntry> & Record<string, unknown>): WireEntry {
  made += 1;
  return {
    ...{ sequence: made, hash: 'h', id, kind: 'step-done', step: 'cab-brake-check' },
    ...{ receivedAt: iso('22:25:02'), source: 'by-hand', by: ortiz },
    ...fields,
  };
}
const check = entry('check', { observedAt: iso('22:25:00') });
const corrected = entry('fix', {
  ...{ kind: 'corrected', step: undefined, target: 'check', reason: 'misread' },
  ...{ observedAt: iso('22:22:41'), madeAt: iso('23:02:10') },
});
const takenBack = entry('back', {
  ...{ kind: 'withdrawn', step: undefined, target: 'check', reason: 'wrong train' },
  observedAt: iso('23:02:10'),
});
const state = (change: WireEntry, fields: Partial<WireCorrection>): WireCorrection => ({
  ...{ entryId: change.id, target: 'check', kind: 'corrected', what: 'cab-brake-check' },
  ...{ oldAt: iso('22:25:00'), newAt: iso('22:22:41'), oldReading: null, newReading: null },
  ...{ by: { personId: 'p-1', name: 'A. Ortiz' }, reason: 'misread', askedAt: iso('23:02:10') },
  state: 'waiting',
  ...fields,
});
const decided = { decidedBy: reyes, decidedAt: iso('23:10:00') };

function lineOf(id: string, entries: readonly WireEntry[], corrections: readonly WireCorrection[] = []) {
  const labels = new Map([['cab-brake-check', 'Cab brake check']]);
  const line = logLines(entries, { labels, zone, corrections }).find((each) => each.entry.id === id);
  if (line === undefined) throw new Error(`no line for ${id}`);
  const { time, replaced, isWithdrawn, remarks, words } = line;
  return { time, replaced, isWithdrawn, remarks, words };
}

describe('a line of the log', () => {
  it('says when an entry came in that was more than a minute on its way', () => {
    const late = entry('late', { observedAt: iso('22:25:00'), receivedAt: iso('22:26:01') });
    const context = { labels: new Map<string, string>(), zone, corrections: [] };
    expect(logLines([check, late], context).map(({ cameIn }) => cameIn)).toEqual(['17:26:01', null]);
  });

  it('shows the time that counts, the one it replaced, who corrected it and why', () => {
    expect(lineOf('check', [check, corrected])).toEqual({
      time: '17:22:41',
      replaced: ['17:25:00'],
      isWithdrawn: false,
      remarks: ['corrected 18:02:10 by A. Ortiz: misread'],
      words: 'Cab brake check',
    });
    expect(lineOf('fix', [check, corrected]).words).toBe(
      'Correction of cab brake check, 17:25:00 by hand, to 17:22:41: misread',
    );
  });

  it('keeps its time while a correction waits, and when it was declined', () => {
    expect(lineOf('check', [check, corrected], [state(corrected, {})])).toMatchObject({
      time: '17:25:00',
      replaced: [],
      remarks: ['correction to 17:22:41 asked for 18:02:10 by A. Ortiz: misread. It waits for a supervisor'],
    });
    const no = state(corrected, { ...decided, state: 'declined', declinedBecause: 'the recorder agrees' });
    expect(lineOf('check', [check, corrected], [no])).toMatchObject({
      time: '17:25:00',
      remarks: [
        'correction to 17:22:41 asked for 18:02:10 by A. Ortiz: misread. Declined 18:10:00 by L. Reyes: the recorder agrees',
      ],
    });
  });

  it('keeps the count that was corrected beside the one that counts', () => {
    const set = entry('set', { step: 'handbrake-set', observedAt: iso('22:20:00'), reading: { count: 1 } });
    const recount = entry('recount', {
      ...{ kind: 'corrected', step: undefined, target: 'set', reason: 'counted again' },
      ...{ reading: { count: 2 }, madeAt: iso('22:21:10') },
    });
    const context = { labels: new Map([['handbrake-set', 'Handbrake set']]), zone, corrections: [] };
    expect(logLines([set, recount], context)[1]).toMatchObject({
      ...{ time: '17:20:00', replaced: [], words: 'Handbrake set, 2', replacedWords: ['Handbrake set, 1'] },
      remarks: ['corrected 17:21:10 by A. Ortiz: counted again'],
    });
  });

  it('names who approved a correction', () => {
    const yes = state(corrected, { ...decided, state: 'approved' });
    expect(lineOf('check', [check, corrected], [yes])).toMatchObject({
      time: '17:22:41',
      replaced: ['17:25:00'],
      remarks: ['corrected 18:02:10 by A. Ortiz: misread. Approved 18:10:00 by L. Reyes'],
    });
  });

  it('is struck by a withdrawal with effect only, and not when that was taken back in turn', () => {
    expect(lineOf('check', [check, takenBack]).isWithdrawn).toBe(true);
    expect(lineOf('check', [check, takenBack], [state(takenBack, { kind: 'withdrawn' })]).isWithdrawn).toBe(
      false,
    );
    const again = entry('again', { kind: 'withdrawn', target: 'back', observedAt: iso('23:02:15') });
    expect(lineOf('check', [check, takenBack, again]).isWithdrawn).toBe(false);
    expect(lineOf('back', [check, takenBack, again]).isWithdrawn).toBe(true);
  });

  it.each<[string, Partial<WireEntry> & Record<string, unknown>, string]>([
    ['agreed', { target: 'check' }, 'Agrees with cab brake check, 17:25:00 by hand'],
    [
      'disagreed',
      { target: 'check', reason: 'not tested' },
      'Does not agree with cab brake check, 17:25:00 by hand: not tested',
    ],
    ['ruled', { target: 'check', considered: [] }, 'Ruled: cab brake check, 17:25:00 by hand counts'],
    [
      'correction-approved',
      { target: 'fix' },
      'Approves: correction of cab brake check, 17:25:00 by hand, to 17:22:41: misread',
    ],
    ['defect', { car: '1412', cause: 'door', note: 'leaf 2' }, 'Bad order, car 1412, door: leaf 2'],
    ['defect', { car: null, cause: 'heating' }, 'Bad order, the set, heating'],
    [
      'tied-up',
      { handbrakes: { count: 2, cars: ['1', '2'] }, checks: ['lights'], offAir: true },
      'Tied up, 2 handbrakes set: 1, 2; looked after: lights; cut off from air',
    ],
  ])('says in words what is %s: %j', (kind, fields, words) => {
    const said = entry('said', { kind, step: undefined, observedAt: iso('23:00:00'), ...fields });
    expect(lineOf('said', [check, corrected, said]).words).toBe(words);
  });
});
