import type { ReactNode } from 'react';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import styles from './phone-foot.module.css';
import { seenByDeskAt, sentState } from '../model/sent-state';
import { SentStrip } from './sent-strip';
import { useTurnScene } from './turn-context';

/** The foot of the turn page: the bar, and under it where the entries are. */
export function Foot({ children }: { children: ReactNode }) {
  const { state } = useOutbox();
  const { turn, entries } = useTurnScene();
  return (
    <div className={styles.foot}>
      {children}
      <SentStrip state={sentState(state, seenByDeskAt(turn, entries))} zone={turn.zone} />
    </div>
  );
}
