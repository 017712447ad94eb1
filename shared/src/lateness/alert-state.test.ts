import { describe, expect, it } from 'vitest';
import { ALERT_EVENTS, alertAfter, raisedAlert, type AlertEvent, type AlertStanding } from './alert-state';
import { ALERT_STATES } from './finding';

const after = (...events: AlertEvent[]): AlertStanding | string =>
  events.reduce<AlertStanding | string>((standing, event) => {
    if (typeof standing === 'string') return standing;
    const next = alertAfter(standing, event);
    return next.ok ? next.value : next.error.code;
  }, raisedAlert);

/*
 * The transitions of ISA-18.2 as second-hand sources quote them, in our words: raise to unacknowledged; acknowledge;
 * clear from either; acknowledge what has cleared; shelve from any standing state and back to what it was.
 */
describe('what becomes of an alert', () => {
  it.each<[name: string, events: AlertEvent[], result: AlertStanding | string]>([
    ['taken is had by somebody', ['take'], { state: 'taken', taken: true }],
    ['cleared before anybody took it is cleared, not taken', ['clear'], { state: 'cleared', taken: false }],
    ['cleared after it was taken keeps who had it', ['take', 'clear'], { state: 'cleared', taken: true }],
    ['taken after it cleared stays cleared', ['clear', 'take'], { state: 'cleared', taken: true }],
    ['taken from somebody by somebody else stays taken', ['take', 'take'], { state: 'taken', taken: true }],
    ['set aside untaken comes back untaken', ['set-aside', 'return'], { state: 'raised', taken: false }],
    [
      'set aside after it was taken comes back taken',
      ['take', 'set-aside', 'return'],
      { state: 'taken', taken: true },
    ],
    [
      'set aside and taken before its time stands as taken',
      ['set-aside', 'take'],
      { state: 'taken', taken: true },
    ],
    [
      'set aside may be set aside for longer',
      ['set-aside', 'set-aside'],
      { state: 'set-aside', taken: false },
    ],
    ['cleared while it is set aside is cleared', ['set-aside', 'clear'], { state: 'cleared', taken: false }],
    ['closed after it cleared is closed', ['take', 'clear', 'close'], { state: 'closed', taken: true }],
    ['closed while it stands is refused', ['take', 'close'], 'alert.still_standing'],
    ['set aside after it cleared is refused', ['clear', 'set-aside'], 'alert.not_standing'],
    ['that was not set aside does not come back', ['return'], 'alert.not_standing'],
    ['cleared twice is refused', ['clear', 'clear'], 'alert.not_standing'],
    ['closed twice is refused', ['clear', 'close', 'close'], 'alert.not_standing'],
    ['taken after it was closed is refused', ['clear', 'close', 'take'], 'alert.not_standing'],
  ])('%s', (_, events, result) => {
    expect(after(...events)).toEqual(result);
  });

  it('reaches every state, and none stands again after it cleared', () => {
    const reached = new Map<string, AlertStanding>([[JSON.stringify(raisedAlert), raisedAlert]]);
    for (const standing of reached.values()) {
      for (const event of ALERT_EVENTS) {
        const next = alertAfter(standing, event);
        if (!next.ok) continue;
        reached.set(JSON.stringify(next.value), next.value);
        if (standing.state === 'cleared') expect(['cleared', 'closed']).toContain(next.value.state);
      }
    }
    expect(new Set([...reached.values()].map(({ state }) => state))).toEqual(new Set(ALERT_STATES));
  });
});
