import { aWireTurn, clockAt, entryAt, fixedSettings, wirePlan } from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { squeezeOf, squeezeWords } from './squeeze';
import type { Entry } from '@stubpost/shared';

const typicalOf = (key: string): number =>
  wirePlan.steps.find((step) => step.key === key)?.typicalSeconds ?? 0;
const planned = { scheduledArrivalAt: clockAt('17:14'), scheduledDepartureAt: clockAt('17:34') };
const at = (clock: string, entries: Entry[]) => {
  const now = clockAt(clock);
  const turn = turnAt(aWireTurn({ planned, entries }, now), { plan: wirePlan, settings: fixedSettings }, now);
  return { turn, squeeze: squeezeOf(turn, typicalOf, now) };
};
const inLate = [entryAt('arrival', '17:19:10'), entryAt('step-done', '17:20:45', { step: 'handbrake-set' })];

describe('the squeeze of a turn', () => {
  it('has the timetable’s time between: 20 minutes less 520 s of work', () => {
    const { squeeze } = at('17:00:00', []);
    const { after, before } = squeeze?.scheduled ?? { after: { to: 0 }, before: { from: 0 } };
    expect((before.from - after.to) / 1000).toBe(1200 - 520);
  });

  it('spares as much as the turn’s slack says, while the steps follow one another', () => {
    for (const clock of ['17:20:50', '17:22:00', '17:25:00', '17:28:30']) {
      const { turn, squeeze } = at(clock, inLate);
      expect(squeeze?.spareSeconds).toBe(turn.slackSeconds);
    }
  });

  it('shows what both kinds of work claim once they overlap', () => {
    const { squeeze } = at('17:30:00', inLate);
    expect(squeeze?.spareSeconds).toBeLessThan(0);
    const overlap = squeeze?.overlap ?? { from: 0, to: 0 };
    expect((overlap.to - overlap.from) / 1000).toBeCloseTo(-(squeeze?.spareSeconds ?? 0), 0);
  });

  it('tells recorded work from time without a record', () => {
    const { squeeze } = at('17:23:00', inLate);
    expect(squeeze?.done).toEqual({ from: clockAt('17:19:10'), to: clockAt('17:20:45') });
    expect(squeeze?.unrecorded).toEqual({ from: clockAt('17:20:45'), to: clockAt('17:23') });
  });

  it('is none for a train that left or was annulled', () => {
    expect(at('17:40:00', [...inLate, entryAt('departure', '17:36:00')]).squeeze).toBeNull();
    expect(at('17:00:00', [entryAt('annulled', '16:55')]).squeeze).toBeNull();
  });
});

describe('the sentence of the squeeze', () => {
  it.each([
    [-170, '3 min more work than there is time'],
    [-1, '1 min more work than there is time'],
    [500, '8 min to spare'],
  ])('%i s: %s', (seconds, words) => {
    expect(squeezeWords(seconds)).toBe(words);
  });
});
