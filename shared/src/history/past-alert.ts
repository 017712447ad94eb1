import type { Instant } from '../lib/instant';
import type { AlertCause, Priority } from '../lateness/finding';

/** An alert as its quality is measured: what it said, what people did about it, and what became of its train. */
export interface PastAlert {
  cause: AlertCause;
  /** As it stood last. */
  priority: Priority;
  /** What it stands on; one cause on one subject is one alert at a time. */
  subjectId: string;
  /** The train it is about, by which it comes back on other days; null when it is about none. */
  train: string | null;
  raisedAt: Instant;
  /** When somebody took it, the last one to do so; null when nobody did. */
  takenAt: Instant | null;
  /** When its cause was gone; null while it stands. */
  clearedAt: Instant | null;
  /** What became of the train; null when it is about none, or it has no departure. */
  departure: PastDepartureOfTurn | null;
}

/** How a train left, as far as it is recorded. */
export interface PastDepartureOfTurn {
  scheduledAt: Instant;
  /** The latest order to leave later; null without one. */
  heldUntil: Instant | null;
  /** Null while it has not left, or nobody recorded that it did. */
  leftAt: Instant | null;
  annulled: boolean;
}
