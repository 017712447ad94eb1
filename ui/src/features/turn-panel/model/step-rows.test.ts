import type { Entry } from '@stubpost/shared';
import { aWireTurn, clockAt, entryAt, fixedSettings, wirePlan } from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { stepGroups } from './step-rows';

const groupsAt = (clock: string, entries: Entry[]) => {
  const now = clockAt(clock);
  return stepGroups(turnAt(aWireTurn({ entries }, now), { plan: wirePlan, settings: fixedSettings }, now));
};
const rowsAt = (clock: string, entries: Entry[]) => groupsAt(clock, entries).flatMap((group) => group.rows);
const arrived = entryAt('arrival', '17:04:10');
const handbrake = entryAt('step-done', '17:05:30', { step: 'handbrake-set', reading: { count: 2 } });

describe('the steps of a turn', () => {
  it('stand in two groups with the times they are counted from', () => {
    expect(groupsAt('17:08', [arrived]).map((group) => group.heading)).toEqual([
      'From the arrival, 17:04:10 (scheduled 17:00)',
      'From the departure, 17:20',
    ]);
    const held = entryAt('hold', '17:06', { until: clockAt('17:26') });
    expect(groupsAt('17:08', [arrived, held])[1]?.heading).toBe(
      'From the departure, held to 17:26 (scheduled 17:20)',
    );
  });

  it('say when they were done, how it is known, and who has to do the next', () => {
    const [first, second] = rowsAt('17:08', [arrived, handbrake]);
    expect(first).toMatchObject({
      name: 'Handbrake set, 2',
      done: '17:05:30',
      known: 'by hand, Tolland',
      isNext: false,
    });
    expect(second).toMatchObject({ isEstimate: true, known: 'Varga to do', isNext: true });
  });

  it('name the speaker of a relayed step', () => {
    const relayed = entryAt('step-done', '17:07', {
      step: 'cab-brake-check',
      source: 'by-radio',
      saidBy: 'Q. Quist',
    });
    expect(rowsAt('17:08', [arrived, handbrake, relayed])[1]?.known).toBe('by radio, Quist');
  });

  it('say first that a step is in question, since the column is narrow', () => {
    const check = { step: 'cab-brake-check' };
    const relayed = entryAt('step-done', '17:07', { ...check, source: 'by-radio', saidBy: 'Q. Quist' });
    const own = entryAt('step-done', '17:09', check);
    expect(rowsAt('17:10', [arrived, handbrake, relayed, own])[1]?.known).toBe(
      'in question, by hand, Tolland',
    );
  });

  it('say what is overdue, withdrawn, impossible, or has no record', () => {
    expect(rowsAt('17:13', [arrived, handbrake, entryAt('note', '17:12', { note: 'x' })])[1]?.done).toBe(
      'overdue',
    );
    const back = entryAt('withdrawn', '17:06', { target: handbrake.id, reason: 'wrong train' });
    expect(rowsAt('17:06:10', [arrived, handbrake, back])[0]).toMatchObject({
      done: '–',
      known: 'withdrawn',
    });
    const cannot = entryAt('cannot-do', '17:06', { step: 'cab-brake-check', reason: 'cab locked' });
    expect(rowsAt('17:07', [arrived, handbrake, cannot])[1]).toMatchObject({ done: 'cannot' });
    expect(rowsAt('17:07', [arrived, handbrake, cannot])[1]?.remarks[0]).toContain('cab locked');
    expect(rowsAt('17:22', [arrived, handbrake, entryAt('departure', '17:21')])[1]?.done).toBe('no record');
  });

  it('leave the running test until the train has left', () => {
    const last = (clock: string, entries: Entry[]) => rowsAt(clock, entries).at(-1);
    expect(last('17:08', [arrived])).toMatchObject({ done: '–', known: 'after leaving', latest: '–' });
    expect(last('17:22', [arrived, entryAt('departure', '17:21')])?.known).toBe('Varga to do');
  });
});
