import type { EntryDraft } from '../model/entry-draft';
import type { EntryToWithdraw } from './last-entry';
import type { ActOnPage } from './use-act';

/** Where the buttons of the page lead. */
export interface ActWays {
  onRecord: (draft: EntryDraft, label: string, earlier: number | null) => void;
  /** To the second touch of a release. */
  onSecond: (page: ActOnPage) => void;
  onSteps: () => void;
  onCannotDo: () => void;
  onNote: () => void;
  onTellDesk: (words: string) => void;
  onWithdraw: (entry: EntryToWithdraw) => void;
  onPhone: () => void;
}
