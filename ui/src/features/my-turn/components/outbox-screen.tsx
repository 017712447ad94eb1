import { formatClock } from '../../../lib/time-display';
import { clockWords } from '../../../lib/clock-words';
import { useOthersWaiting } from '../../../lib/outbox/use-others-waiting';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { useTerminalChoice } from '../../../lib/terminal-choice';
import { clockOffsetMilliseconds, isClockCompared, useNow } from '../../../lib/use-now';
import { useSeenByDesk } from '../api/use-seen-by-desk';
import { outboxLines, outboxStanding, type OutboxStanding } from '../model/outbox-lines';
import { sentState } from '../model/sent-state';
import { LostNotice, UnkeptNotice } from './outbox-notices';
import { OutboxList } from './outbox-list';
import styles from './phone-parts.module.css';
import footStyles from './phone-foot.module.css';
import { PhoneStorage } from './phone-storage';
import { SentWords } from './sent-strip';

/** `/my/outbox`: what is on this phone, what has gone and how it stands, and whether the phone keeps it. */
export function OutboxScreen() {
  const outbox = useOutbox();
  const { state } = outbox;
  const now = useNow();
  const zone = useTerminalChoice().terminal?.zone ?? 'UTC';
  const lines = outboxLines(state, useSeenByDesk(state.sent));
  const unsent = state.waiting.filter(({ refusal }) => refusal === null).length;
  return (
    <div className={styles.page}>
      <div className={styles.main}>
        <div>
          <h1>Outbox</h1>
          <p role="status">{standingWords(outboxStanding(state, now), zone)}</p>
        </div>
        <UnkeptNotice isUnkept={state.storage === 'refused'} />
        <LostNotice lost={state.lost} zone={zone} onRead={outbox.forgetLost} />
        {lines.length > 0 && (
          <OutboxList lines={lines} zone={zone} onRead={(id) => void outbox.dismiss(id)} />
        )}
        <Counts here={state.waiting.length} counted={outbox.counted()} />
        <PhoneStorage />
      </div>
      <div className={footStyles.foot}>
        {unsent > 0 && (
          <button
            type="button"
            className={`${footStyles.bar} ${footStyles.hollow}`}
            onClick={() => void outbox.poke()}
          >
            <span>{unsent} on phone</span>
            <b>Try now</b>
          </button>
        )}
        <p className={footStyles.sent}>
          <SentWords state={sentState(state, null)} zone={zone} />
        </p>
      </div>
    </div>
  );
}

function standingWords(standing: OutboxStanding, zone: string): string {
  switch (standing.kind) {
    case 'needs-sign-in':
      return 'Your sign-in has ended. Everything is kept; it goes when you sign in again.';
    case 'no-answer': {
      const next =
        standing.nextTrySeconds === null || standing.nextTrySeconds === 0
          ? 'Trying now'
          : `Next try in ${standing.nextTrySeconds} s`;
      return `No answer since ${formatClock(standing.since, zone)}. ${next}; also on signal and on opening.`;
    }
    case 'sending':
      return 'Sending.';
    case 'refused':
      return 'Nothing more to send. What was not taken stands below, with the reason.';
    case 'all-sent':
      return `All sent ${formatClock(standing.at, zone)}.`;
    case 'nothing':
      return 'Nothing was recorded on this phone in the last two days.';
  }
}

/** The count kept apart, the clock, and whether others have entries here. */
function Counts({ here, counted }: { here: number; counted: number }) {
  const others = useOthersWaiting();
  return (
    <p>
      {countWords(here, counted)} {clockSentence()}
      {others > 0 && ` ${othersWords(others)}`}
    </p>
  );
}

function countWords(here: number, counted: number): string {
  return here === counted
    ? `Count kept apart agrees: ${here} of ${counted} on this phone.`
    : `Count kept apart says ${counted}, here are ${here}; compared anew at the next start.`;
}

function clockSentence(): string {
  const words = clockWords(clockOffsetMilliseconds());
  if (words !== null) return `Phone clock ${words}; every entry carries that.`;
  return isClockCompared()
    ? 'Phone clock right within 2 s.'
    : 'Phone clock not compared since the app was opened.';
}

/** Says how many entries of others wait here, and nothing of what is in them. */
function othersWords(count: number): string {
  return count === 1
    ? '1 entry of another person waits on this phone; it stays theirs and goes when they sign in here.'
    : `${count} entries of another person wait on this phone; they stay theirs and go when that person signs in here.`;
}
