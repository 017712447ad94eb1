import { parseInstant, type Instant } from '@stubpost/shared';
import { useCallback } from 'react';
import { v4 as makeId } from 'uuid';
import { clockOffsetMilliseconds, readDeviceClock, readNow } from '../../../lib/use-now';
import { requestOf, type EntryDraft } from '../model/entry-draft';
import type { EntryQueue } from '../model/entry-queue';

/** What was recorded: its id, its words, its time. */
interface Made {
  entryId: string;
  label: string;
  observedAt: Instant;
  /** The touch by the phone's own clock. */
  touchedAt: Instant;
}

/** A short pulse for the thumb: 40 ms. Phones without one, or told not to, stay still. */
function pulse(): void {
  if ('vibrate' in navigator) navigator.vibrate(40);
}

/** Records on a turn: the entry is kept on the phone at once, with an id of its own and the time of the touch. */
export function useRecorder(queue: EntryQueue, turnId: string) {
  return useCallback(
    (draft: EntryDraft, { label, earlier = null }: { label: string; earlier?: Instant | null }): Made => {
      const recording = {
        id: makeId(),
        now: readNow(),
        earlier,
        serverAheadMilliseconds: clockOffsetMilliseconds(),
      };
      const request = requestOf(draft, recording);
      queue.add({ turnId, request, label });
      pulse();
      return {
        entryId: request.id,
        label,
        observedAt: parseInstant(request.observedAt) ?? recording.now,
        touchedAt: readDeviceClock(),
      };
    },
    [queue, turnId],
  );
}
