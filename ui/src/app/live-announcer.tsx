import type { WireTurn } from '@stubpost/shared';
import { useEffect } from 'react';
import { announce, announceActNow } from '../lib/announcer';
import { onLiveMessage } from '../lib/live';
import { formatTime } from '../lib/time-display';

const trainOf = (turn: WireTurn): string => turn.outbound?.train ?? turn.inbound?.train ?? 'without number';

/** One sentence for whatever changed since the last one: how many turns, and how the latest now stands. */
export function changeWords(changed: ReadonlyMap<string, WireTurn>, zone: string): string {
  const latest = [...changed.values()].at(-1);
  if (latest === undefined) return '';
  const count = changed.size === 1 ? '1 turn changed' : `${changed.size} turns changed`;
  const { readyAt } = latest.forecast;
  const stand =
    readyAt === null ? latest.state.replaceAll('-', ' ') : `now ready ${formatTime(readyAt, zone)}`;
  return `${count}; train ${trainOf(latest)} ${stand}`;
}

/** Tells people who listen to the page what came over the stream: changes together and seldom, "Act now" at once. */
export function LiveAnnouncer({ zone }: { zone: string }) {
  useEffect(() => {
    const changed = new Map<string, WireTurn>();
    const known = new Set<string>();
    const stop = onLiveMessage((message) => {
      if (message.kind === 'turn') {
        changed.delete(message.turn.id);
        changed.set(message.turn.id, message.turn);
        announce(() => {
          const words = changeWords(changed, zone);
          changed.clear();
          return words;
        }, 'turns');
      }
      if (message.kind === 'alert') {
        const { alert } = message;
        if (alert.priority !== 'act-now' || alert.state !== 'raised' || known.has(alert.id)) return;
        known.add(alert.id);
        announceActNow(`Act now. ${alert.subject}. ${alert.text}. ${alert.action}`);
      }
    });
    return () => void stop();
  }, [zone]);
  return null;
}
