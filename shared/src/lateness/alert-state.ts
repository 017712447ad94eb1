import { ok, refused, type Result } from '../lib/result';
import type { AlertState } from './finding';

/** Where an alert stands, and whether somebody has it. Taking and clearing are independent of one another. */
export interface AlertStanding {
  state: AlertState;
  taken: boolean;
}

/**
 * What can happen to an alert. `take`, `set-aside` and `close` are acts of a person; `clear` is the condition going
 * away, `return` the end of the time it was set aside for.
 */
export const ALERT_EVENTS = ['take', 'set-aside', 'return', 'clear', 'close'] as const;
export type AlertEvent = (typeof ALERT_EVENTS)[number];

/** Why something cannot happen to an alert. */
export interface AlertRefusal {
  code: 'alert.not_standing' | 'alert.still_standing';
}

/** The standing of an alert that was just raised. */
export const raisedAlert: AlertStanding = { state: 'raised', taken: false };

/**
 * What becomes of an alert. One that stands is raised, taken or set aside. Taking it, also one that was set aside or
 * has cleared meanwhile, keeps the name; setting aside hides it until it returns to what it was, raised or taken;
 * clearing ends any of the three. Only a cleared alert is closed, by naming its cause. A condition that comes back
 * after it cleared is a new alert, so a cleared one never stands again. Refused: `alert.not_standing` for what needs
 * a standing alert, `alert.still_standing` for closing one.
 */
export function alertAfter(
  { state, taken }: AlertStanding,
  event: AlertEvent,
): Result<AlertStanding, AlertRefusal> {
  const isStanding = state === 'raised' || state === 'taken' || state === 'set-aside';
  switch (event) {
    case 'take':
      if (state === 'closed') return refused({ code: 'alert.not_standing' });
      return ok({ state: isStanding ? 'taken' : state, taken: true });
    case 'set-aside':
      return isStanding ? ok({ state: 'set-aside', taken }) : refused({ code: 'alert.not_standing' });
    case 'return':
      if (state !== 'set-aside') return refused({ code: 'alert.not_standing' });
      return ok({ state: taken ? 'taken' : 'raised', taken });
    case 'clear':
      return isStanding ? ok({ state: 'cleared', taken }) : refused({ code: 'alert.not_standing' });
    case 'close':
      if (state === 'cleared') return ok({ state: 'closed', taken });
      return refused({ code: isStanding ? 'alert.still_standing' : 'alert.not_standing' });
  }
}
