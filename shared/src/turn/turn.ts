import type { CalendarDate, Instant } from '../lib/instant';

/** `turn` has an arrival and a departure, `first-out` no arrival, `tie-up` no departure. */
export const TURN_KINDS = ['turn', 'first-out', 'tie-up'] as const;
export type TurnKind = (typeof TURN_KINDS)[number];

/** Life of a turn in order; the words on screen are its glossary terms. */
export const TURN_STATES = [
  'scheduled',
  'inbound',
  'arrived',
  'secured',
  'ends-changed',
  'crew-in-cab',
  'ready',
  'departed',
  'tested',
  'closed',
  'annulled',
] as const;
export type TurnState = (typeof TURN_STATES)[number];

/** How a turn stands against its plan at one moment. */
export const HEALTHS = ['on-plan', 'tight', 'short', 'late', 'no-word'] as const;
export type Health = (typeof HEALTHS)[number];

/** How one step stands at one moment. */
export const STEP_STATES = [
  'not-due',
  'due',
  'done',
  'overdue',
  'not-needed',
  'blocked',
  'withdrawn',
  'in-question',
] as const;
export type StepState = (typeof STEP_STATES)[number];

/** What is fixed about a turn before anything has happened. */
export interface PlannedTurn {
  id: string;
  kind: TurnKind;
  serviceDate: CalendarDate;
  /** Whether the train goes back the way it came; null when unknown, which is read as yes. */
  reverses: boolean | null;
  inboundTrain: string | null;
  outboundTrain: string | null;
  scheduledArrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  /** Track label and set label as planned; entries may change both. */
  track: string | null;
  set: string | null;
}
