import { longestSetAsideMinutes } from '@stubpost/shared';
import { aWireAlert, clockAt } from '../../../testing/wire-turn';
import { alertStory, holderWords, stripHolder, untilChoices } from './alert-words';

const zone = 'America/New_York';
const iso = (clock: string): string => new Date(clockAt(clock)).toISOString();

describe('who has an alert', () => {
  it.each([
    [{}, 'nobody', 'not taken'],
    [{ state: 'taken', takenBy: 'R. Hallam', takenAt: iso('17:24') }, 'you', 'taken by you 17:24'],
    [
      { state: 'taken', takenBy: 'N. Brandt', takenAt: iso('17:24') },
      'N. Brandt',
      'taken by N. Brandt 17:24',
    ],
    [
      { state: 'set-aside', takenBy: 'R. Hallam', takenAt: iso('17:14'), setAsideUntil: iso('17:35') },
      'till 17:35',
      'set aside till 17:35',
    ],
  ] as const)('%j', (state, who, strip) => {
    const alert = aWireAlert({ ...state });
    expect(holderWords(alert, zone, 'R. Hallam').who).toBe(who);
    expect(stripHolder(alert, zone, 'R. Hallam')).toBe(strip);
  });
});

describe('the story of an alert', () => {
  it('is told from the oldest moment on', () => {
    const alert = aWireAlert({
      state: 'closed',
      takenBy: 'R. Hallam',
      takenAt: iso('17:26:05'),
      clearedAt: iso('17:31'),
      closedAt: iso('17:40'),
      closedCause: 'Late inbound',
    });
    expect(alertStory(alert, zone, 'R. Hallam').map(({ clock, words }) => `${clock} ${words}`)).toEqual([
      '17:25:20 raised',
      '17:26:05 taken by you',
      '17:31:00 cleared',
      '17:40:00 closed: Late inbound',
    ]);
  });
});

describe('times for setting aside', () => {
  it('lie ahead, half an hour at most', () => {
    const now = clockAt('17:26:40');
    const choices = untilChoices(now, zone);
    expect(choices.map((choice) => choice.words)).toEqual([
      '17:31, 5 min',
      '17:36, 10 min',
      '17:41, 15 min',
      '17:46, 20 min',
      '17:56, 30 min',
    ]);
    expect(Math.max(...choices.map((choice) => choice.at)) - now).toBeLessThanOrEqual(
      longestSetAsideMinutes * 60_000,
    );
  });
});
