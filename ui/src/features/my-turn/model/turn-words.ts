import type { CrewRole, Health, TurnState } from '@stubpost/shared';

/** Life of a turn in the words of the trade. */
export const stateWords: Record<TurnState, string> = {
  scheduled: 'Scheduled',
  inbound: 'Inbound',
  arrived: 'Arrived',
  secured: 'Secured',
  'ends-changed': 'Ends changed',
  'crew-in-cab': 'Crew in cab',
  ready: 'Ready',
  departed: 'Departed',
  tested: 'Tested',
  closed: 'Closed',
  annulled: 'Annulled',
};

/** Plan health where somebody must act; the others carry no flag. */
export const healthWords: Record<Health, string> = {
  'on-plan': 'On plan',
  tight: 'Tight',
  short: 'Short',
  late: 'Late',
  'no-word': 'No word',
};

/** Jobs on a turn, as they stand inside a sentence. */
export const roleWords: Record<CrewRole, string> = { conductor: 'conductor', engineer: 'engineer' };
