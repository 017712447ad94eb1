import type { Instant } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';
import type { QueueState } from '../model/entry-queue';
import { OnPhoneSign, OnwardSign, OpenSign, SeenSign, SentSign } from './phone-icons';
import styles from './phone-foot.module.css';

/** The states an entry passes through, as one strip shows them for all entries of this phone. */
export type SentState =
  | { kind: 'refused'; count: number }
  | { kind: 'on-phone'; count: number }
  | { kind: 'sent'; at: Instant }
  | { kind: 'seen'; at: Instant }
  | { kind: 'none' };

/** The one thing to say about the entries of this phone: what needs the person first, then what is not sent, then the newest. */
export function sentState(state: QueueState, seenAt: Instant | null): SentState {
  const refused = state.waiting.filter((entry) => entry.refusal !== null).length;
  if (refused > 0) return { kind: 'refused', count: refused };
  if (state.waiting.length > 0) return { kind: 'on-phone', count: state.waiting.length };
  if (state.sentAt === null) return { kind: 'none' };
  return seenAt !== null && seenAt >= state.sentAt
    ? { kind: 'seen', at: seenAt }
    : { kind: 'sent', at: state.sentAt };
}

/** Where the entries are: on the phone, sent, or seen by the desk. Neutral, never a colour: being without a signal is no fault. */
export function SentStrip({ state, zone, onOpen }: { state: SentState; zone: string; onOpen: () => void }) {
  const { sign, words, isWeighty } = stripWords(state, zone);
  return (
    <button type="button" className={styles.sent} onClick={onOpen}>
      {sign}
      {isWeighty ? <b>{words}</b> : <span>{words}</span>}
      <span className={styles.push}>
        <OnwardSign size={22} />
      </span>
    </button>
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
