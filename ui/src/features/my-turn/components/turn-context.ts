import type { CrewRole, Instant, PlanStep, WireEntry, WireTurn } from '@stubpost/shared';
import { createContext, useContext } from 'react';
import type { KnownTurn } from '../model/known-turn';
import type { EntryDraft } from '../model/entry-draft';

/** The person with the phone, as far as this turn is concerned. */
export interface Me {
  id: string;
  name: string;
  /** Job on this turn; null for somebody who is not on it. */
  role: CrewRole | null;
  /** Jobs the person may have at this terminal. */
  roles: CrewRole[];
}

/** How something is recorded besides its content. */
export interface RecordOptions {
  /** In the words of the bar. */
  label: string;
  /** When it happened, if the person said that it was before the touch. */
  earlier?: Instant | null;
}

/** What a recorded entry left behind: enough to show it and take it back. */
export interface Recorded {
  entryId: string;
  label: string;
  observedAt: Instant;
  /** The touch by the phone's own clock, for the ten seconds of Undo. */
  touchedAt: Instant;
}

/** Everything the parts of the turn page share. */
export interface TurnScene {
  /** The turn of this second, with the entries under way. */
  turn: WireTurn;
  steps: readonly PlanStep[];
  handbrakes: KnownTurn['handbrakes'];
  releases: KnownTurn['releases'];
  entries: readonly WireEntry[];
  now: Instant;
  me: Me;
  marker: string | null;
  /** When a later train with this person as its engineer came in; null when none has. */
  nextArrivalAt: Instant | null;
  /** When the service last told this turn. */
  toldAt: Instant;
  /** Settles when the entry is kept on the phone, not when it is sent. */
  record: (draft: EntryDraft, options: RecordOptions) => Promise<Recorded>;
}

export const TurnSceneContext = createContext<TurnScene | null>(null);

/** The turn page's shared knowledge. */
export function useTurnScene(): TurnScene {
  const scene = useContext(TurnSceneContext);
  if (scene === null) throw new Error('This part belongs on the page of a turn');
  return scene;
}
