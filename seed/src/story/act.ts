import type { CrewRole, EntrySource, Instant, Reading } from '@stubpost/shared';

/** Who writes an act down: the crew's own phone, the desk, or a feed. */
export type Teller = 'conductor' | 'engineer' | 'desk' | 'feed';

/** What an act says; the same words as the entries it becomes. */
export type ActContent =
  | { kind: 'set'; set: string }
  | { kind: 'crew'; person: string; as: CrewRole }
  | { kind: 'expected-arrival'; expectedAt: Instant }
  | { kind: 'arrival' }
  | { kind: 'step-done'; step: string; reading?: Reading }
  | { kind: 'departure' }
  | { kind: 'cannot-do'; step: string; reason: string }
  | { kind: 'note'; note: string }
  /** The crew's word to a step that the desk wrote by radio. */
  | { kind: 'agreed'; step: string }
  /** What a step's time should have been. */
  | { kind: 'corrected'; step: string; correctedAt: Instant; reason: string };

/** One act of a story: what happened when, and when and by whom it is written down. */
export interface Act {
  observedAt: Instant;
  /** When the entry reaches the server. */
  toldAt: Instant;
  teller: Teller;
  source: EntrySource;
  saidBy?: string;
  content: ActContent;
}

/** A turn as the story needs it. */
export interface StoryTurn {
  id: string;
  terminal: string;
  serviceDate: string;
  kind: 'turn' | 'first-out' | 'tie-up';
  inboundTrain: string | null;
  outboundTrain: string | null;
  scheduledArrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  /** The block of the timetable that the turn belongs to. */
  block: string | null;
}

/** What one set does on one day: its turns in order, its crews by shift, and its units' numbers. */
export interface SetDay {
  set: string;
  cars: readonly string[];
  turns: readonly StoryTurn[];
  /** Keys of the people of the first and the second shift. */
  shifts: ReadonlyArray<{ conductor: string; engineer: string; engineerName: string }>;
}

/** The acts of one turn. */
export interface TurnStory {
  turnId: string;
  /** The conductor and engineer on it, for the acts told by hand. */
  crew: { conductor: string; engineer: string };
  acts: Act[];
}
