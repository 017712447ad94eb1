import { Link } from 'react-router-dom';
import { formatClock } from '../../../lib/time-display';
import type { SentState } from '../model/sent-state';
import { OnPhoneSign, OnwardSign, OpenSign, SeenSign, SentSign } from './phone-icons';
import styles from './phone-foot.module.css';

/** Where the entries are: on the phone, sent, or seen by the desk. Neutral, never a colour: being without a signal is no fault. */
export function SentStrip({ state, zone }: { state: SentState; zone: string }) {
  return (
    <Link className={styles.sent} to="/my/outbox">
      <SentWords state={state} zone={zone} />
      <span className={styles.push}>
        <OnwardSign size={22} />
      </span>
    </Link>
  );
}

/** The sign and the words of the strip. */
export function SentWords({ state, zone }: { state: SentState; zone: string }) {
  const { sign, words, isWeighty } = stripWords(state, zone);
  return (
    <>
      {sign}
      {isWeighty ? <b>{words}</b> : <span>{words}</span>}
    </>
  );
}

function stripWords(state: SentState, zone: string) {
  switch (state.kind) {
    case 'refused':
      return { sign: <OpenSign />, words: `Not taken (${state.count}): read why`, isWeighty: true };
    case 'on-phone':
      return { sign: <OnPhoneSign />, words: `On phone, not sent (${state.count})`, isWeighty: true };
    case 'sent':
      return { sign: <SentSign />, words: `All sent ${formatClock(state.at, zone)}`, isWeighty: false };
    case 'seen':
      return {
        sign: <SeenSign />,
        words: `All sent, seen by desk ${formatClock(state.at, zone)}`,
        isWeighty: false,
      };
    case 'none':
      return { sign: <OnPhoneSign />, words: 'Nothing waits on this phone', isWeighty: false };
  }
}
