import type { ReactNode } from 'react';
import { useEntryQueue } from '../api/use-entry-queue';
import styles from './phone-foot.module.css';
import { seenByDeskAt, sentState } from '../model/sent-state';
import { SentStrip } from './sent-strip';
import { useTurnScene } from './turn-context';

/** The foot of the turn page: the bar, and under it where the entries are. */
export function Foot({ children, onPhone }: { children: ReactNode; onPhone: () => void }) {
  const { state } = useEntryQueue();
  const { turn, entries } = useTurnScene();
  return (
    <div className={styles.foot}>
      {children}
      <SentStrip state={sentState(state, seenByDeskAt(turn, entries))} zone={turn.zone} onOpen={onPhone} />
    </div>
  );
}
