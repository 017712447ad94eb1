import type { EntryDraft } from '../model/entry-draft';
import type { Place } from './place';

/** Where the buttons of the page lead. */
export interface ActWays {
  /** Records, shows it done on the bar and goes to the next act. */
  onRecord: (draft: EntryDraft, label: string, earlier: number | null) => void;
  onGo: (place: Place) => void;
}
