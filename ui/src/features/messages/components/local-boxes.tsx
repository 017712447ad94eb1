import type { WireBoxItem } from '@stubpost/shared';
import { useState } from 'react';
import { formatStamp } from '../../../lib/time-display';
import { CHANNEL_WORDS } from './message-words';
import styles from './messages.module.css';

const titleOf = ({ channel, subject, text }: WireBoxItem): string => (channel === 'sms' ? text : subject);

/** Messages that ended here for want of a real service, as their readers would have got them. */
export function LocalBoxes({ items, zone }: { items: readonly WireBoxItem[]; zone: string }) {
  const [openId, setOpenId] = useState<string | null>(null);
  const opened = items.find(({ id }) => id === openId) ?? items[0];
  if (opened === undefined) return <p>The boxes are empty.</p>;
  return (
    <div className={styles.boxes}>
      <ul className={styles.items} aria-label="Messages in the boxes">
        {items.map((item) => (
          <li key={item.id}>
            <button type="button" aria-pressed={item.id === opened.id} onClick={() => setOpenId(item.id)}>
              <b>{item.to}</b>
              <span className="muted small">
                {CHANNEL_WORDS[item.channel]}, {formatStamp(item.receivedAt, zone)}
              </span>
              <span className={styles.first}>{titleOf(item)}</span>
            </button>
          </li>
        ))}
      </ul>
      <article className={styles.message} aria-label="The message">
        <h3>{opened.channel === 'sms' ? `${opened.text.length} of 160 characters` : opened.subject}</h3>
        <p className="muted small">
          To {opened.to}, {formatStamp(opened.receivedAt, zone)}
        </p>
        <p className={styles.text}>{opened.text}</p>
      </article>
    </div>
  );
}
