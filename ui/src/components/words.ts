import type { AlertCause, EntrySource, Health, Priority, Role, StepState, TurnState } from '@stubpost/shared';

/** Words on screen for the tokens of the interface. One word, one meaning, on every page. */
export const TURN_STATE_WORDS: Record<TurnState, string> = {
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

export const HEALTH_WORDS: Record<Health, string> = {
  'on-plan': 'On plan',
  tight: 'Tight',
  short: 'Short',
  late: 'Late',
  'no-word': 'No word',
};

export const STEP_STATE_WORDS: Record<StepState, string> = {
  'not-due': 'Not due',
  due: 'Due',
  done: 'Done',
  overdue: 'Overdue',
  'not-needed': 'Not needed',
  blocked: 'Blocked',
  withdrawn: 'Withdrawn',
  'in-question': 'In question',
};

export const SOURCE_WORDS: Record<EntrySource, string> = {
  'by-hand': 'by hand',
  'by-feed': 'by feed',
  'by-radio': 'by radio',
  'entered-later': 'entered later',
};

export const PRIORITY_WORDS: Record<Priority, string> = {
  'act-now': 'Act now',
  'act-soon': 'Act soon',
  watch: 'Watch',
};

export const ALERT_CAUSE_WORDS: Record<AlertCause, string> = {
  'late-departure': 'Late departure',
  unsecured: 'Unsecured',
  'no-required-record': 'No required record',
  'running-test': 'Running test',
  'blue-signal': 'Blue signal up',
  'no-word': 'No word',
  crew: 'Engineer not aboard',
  feed: 'Feed silent',
  sweep: 'Alerts not watched',
};

export const ROLE_WORDS: Record<Role, string> = {
  conductor: 'Conductor',
  engineer: 'Engineer',
  dispatcher: 'Dispatcher',
  supervisor: 'Supervisor',
  inspector: 'Inspector',
  planner: 'Planner',
  analyst: 'Analyst',
  auditor: 'Auditor',
  administrator: 'Administrator',
};
