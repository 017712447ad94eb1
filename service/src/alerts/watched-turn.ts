import type { CalendarDate, TurnFacts } from '@stubpost/shared';

/** A turn as the alerts look at it. */
export interface WatchedTurn {
  turnId: string;
  terminalCode: string;
  /** IANA zone in which times are told. */
  zone: string;
  serviceDate: CalendarDate;
  facts: TurnFacts;
}
