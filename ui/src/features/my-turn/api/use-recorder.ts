import type { Instant } from '@stubpost/shared';
import { useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import { v4 as makeId } from 'uuid';
import type { Outbox } from '../../../lib/outbox/outbox';
import { usePerson } from '../../../lib/session';
import { clockOffsetMilliseconds, isClockCompared, readDeviceClock, readNow } from '../../../lib/use-now';
import { aboutTurn } from './about-turn';
import { requestOf, type EntryDraft } from '../model/entry-draft';

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

/**
 * Records on a turn: an entry with an id of its own and the time of the touch. Settles when the phone has kept it; the
 * bar changes after that and never before.
 */
export function useRecorder({ add }: Pick<Outbox, 'add'>, turnId: string) {
  const client = useQueryClient();
  const personId = usePerson().id;
  return useCallback(
    async (
      draft: EntryDraft,
      { label, earlier = null }: { label: string; earlier?: Instant | null },
    ): Promise<Made> => {
      const deviceTime = readDeviceClock();
      const now = readNow();
      const payload = requestOf(draft, {
        id: makeId(),
        now,
        earlier,
        serverAheadMilliseconds: clockOffsetMilliseconds(),
      });
      await add({
        personId,
        turn: turnId,
        label,
        about: aboutTurn(client, turnId),
        payload,
        deviceTime,
        clockOffset: payload.clockOffsetMilliseconds ?? 0,
        clockBasis: isClockCompared() ? 'compared' : 'remembered',
        tzOffset: new Date(deviceTime).getTimezoneOffset(),
      });
      pulse();
      return {
        entryId: payload.id,
        label,
        observedAt: earlier ?? now,
        touchedAt: readDeviceClock(),
      };
    },
    [add, client, personId, turnId],
  );
}
