import { useCallback, useRef, useState } from 'react';
import { announceOwnAct } from '../../../lib/announcer';
import { formatClock } from '../../../lib/time-display';
import type { EntryDraft } from '../model/entry-draft';
import { useTurnScene, type RecordOptions, type Recorded } from './turn-context';

const undoReason = 'withdrawn by same hand';

/**
 * Records acts, says each to whoever listens to the page, and keeps the newest for the ten seconds of Undo. The bar
 * changes once the entry is kept on the phone; until then further touches do nothing.
 */
export function useDone() {
  const { turn, record } = useTurnScene();
  const [done, setDone] = useState<Recorded | null>(null);
  const isKeeping = useRef(false);
  const endUndo = useCallback(() => setDone(null), []);

  const say = async (draft: EntryDraft, options: RecordOptions): Promise<Recorded> => {
    const recorded = await record(draft, options);
    announceOwnAct(`${recorded.label}, ${formatClock(recorded.observedAt, turn.zone)}, on phone`);
    return recorded;
  };
  const once = async (work: () => Promise<void>): Promise<void> => {
    if (isKeeping.current) return;
    isKeeping.current = true;
    await work().finally(() => {
      isKeeping.current = false;
    });
  };

  return {
    done,
    endUndo,
    /** Records one act, with its place for Undo; `then` runs when it is kept. */
    keep: (draft: EntryDraft, options: RecordOptions, then: () => void): void =>
      void once(async () => {
        setDone(await say(draft, options));
        then();
      }),
    /** Records one or more entries that belong together, without a place for Undo. */
    keepQuietly: (acts: readonly (RecordOptions & { draft: EntryDraft })[], then: () => void): void =>
      void once(async () => {
        for (const { draft, ...options } of acts) await say(draft, options);
        setDone(null);
        then();
      }),
    undo: (): void =>
      void once(async () => {
        if (done !== null)
          await say(
            { kind: 'withdrawn', target: done.entryId, reason: undoReason },
            { label: `Undo: ${done.label}` },
          );
        setDone(null);
      }),
  };
}
