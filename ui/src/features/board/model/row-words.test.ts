import {
  aWireAlert,
  aWireTurn,
  clockAt,
  entryAt,
  fixedSettings,
  wirePlan,
  type WireTurnParts,
} from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { rowWords } from './row-words';

const words = (clock: string, parts: WireTurnParts): string => {
  const now = clockAt(clock);
  return rowWords(turnAt(aWireTurn(parts, now), { plan: wirePlan, settings: fixedSettings }, now), now);
};
const arrived = entryAt('arrival', '17:04:10');
const handbrake = entryAt('step-done', '17:05:30', { step: 'handbrake-set' });

describe('a row read out', () => {
  it.each<[string, string, WireTurnParts, string]>([
    [
      'short',
      '17:14:30',
      { entries: [arrived, handbrake, entryAt('note', '17:13', { note: 'x' })], alerts: [aWireAlert()] },
      'Track 3, train 1742, secured, in since 17:04, leaves 17:20, short by 1 minute, cab brake check not recorded, was due 17:10. 1 alert, not taken.',
    ],
    [
      'far off',
      '16:00',
      {},
      'Track 3, train 1742, scheduled, due in 17:00, leaves 17:20, 11 minutes to spare.',
    ],
    [
      'left',
      '17:25',
      { entries: [arrived, handbrake, entryAt('departure', '17:21')] },
      'Track 3, train 1742, secured, in since 17:04, left 17:21, running brake test not recorded, due 17:25.',
    ],
    [
      'annulled',
      '17:00',
      { entries: [entryAt('annulled', '16:55', { reason: 'no crew' })] },
      'Track 3, train 1742, annulled: no crew.',
    ],
    [
      'late, no track',
      '17:24',
      { planned: { track: null }, entries: [arrived, handbrake] },
      'No track yet, train 1742, secured, in since 17:04, leaves 17:20, late 4 minutes, cab brake check not recorded, was due 17:10.',
    ],
  ])('%s', (_name, clock, parts, expected) => {
    expect(words(clock, parts)).toBe(expected);
  });

  it('has no signs in it that are read out as their names', () => {
    expect(words('17:14:30', { entries: [arrived, handbrake] })).not.toMatch(/[+−–~→]/);
  });
});
